import { useEffect, useState } from "react";
import { timeWords } from "#app/lib/floor/time-words.ts";
import { minuteOf } from "#app/lib/minute-of.ts";

/** Shown on a page that this device kept: how old it is, and that nobody could tell whether it still counts. */
export function KeptNotice({ checkedAt }: { checkedAt: string }) {
  const [age, setAge] = useState<string | null>(null);
  useEffect(() => {
    const tell = () => setAge(timeWords((Date.now() - Date.parse(checkedAt)) / 1000));
    tell();
    const timer = setInterval(tell, 60_000);
    return () => clearInterval(timer);
  }, [checkedAt]);
  return (
    <div role="alert" className="kept-only mb-4 border-2 border-stop bg-raised p-4 text-lead">
      <p className="font-semibold text-stop">No connection: whether this sheet is still current could not be checked</p>
      <p>
        It is as it was at {minuteOf(checkedAt)}
        {age !== null && `, ${age} ago`}. A newer revision, a hold or a stop may have come since: call the shift lead
        before you start a step. What you enter is kept here and sent when the connection is back.
      </p>
    </div>
  );
}
