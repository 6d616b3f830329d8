import { Notice } from "#app/components/ui/Notice.tsx";
import type { KeptDraft } from "#app/lib/drafts.ts";

interface Props {
  draft: KeptDraft;
  /** of the stack as it is saved now */
  version: number | null;
  /** how many others there are */
  more: number;
  onTake: () => void;
  onForget: () => void;
}

/** What an earlier visit has left unsaved, to be taken up or thrown away. */
export function DraftOffer({ draft: { at, version: ofDraft }, version, more, onTake, onForget }: Props) {
  return (
    <Notice kind="caution" title={`Found a draft from ${whenWords(at)}, not saved`}>
      {ofDraft !== version && <p>The stack has been saved since; whoever saves the draft is shown what differs.</p>}
      {more > 0 && <p>{more === 1 ? "There is an older one too." : `There are ${more} older ones too.`}</p>}
      <div className="mt-2 flex flex-wrap gap-2">
        <button type="button" className="btn" onClick={onTake}>
          Take it up
        </button>
        <button type="button" className="btn" onClick={onForget}>
          Throw it away
        </button>
      </div>
    </Notice>
  );
}

/** As the person's clock and calendar show it: '10:32' today, '2026-12-01 10:32' before. */
function whenWords(at: string): string {
  const then = new Date(at);
  const day = (date: Date) => date.toLocaleDateString("sv-SE");
  const time = then.toLocaleTimeString("sv-SE", { hour: "2-digit", minute: "2-digit" });
  return day(then) === day(new Date()) ? time : `${day(then)} ${time}`;
}
