import { Link } from "react-router";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { TrialHead } from "#app/schemas/trial.ts";

/** Why nothing here can be tried on a copy, where a person might expect to. A role that may not sees what was found and no more. */
export function TrialBarred({ head }: { head: TrialHead }) {
  if (head.barred !== "out of date") return null;
  return (
    <Notice kind="caution" title="This assessment is out of date">
      What stands here rests on what it was run with. To try a change on a copy,{" "}
      <Link to={`/assessments/${head.id}`} className="link">
        run it again
      </Link>{" "}
      first.
    </Notice>
  );
}
