import { Swatch } from "#app/components/drawings/Swatch.tsx";
import type { BatchPlan } from "#app/lib/scan-import/plan.ts";
import type { ImportResult } from "#app/lib/scan-import/results.ts";
import { ImportOutcome } from "./ImportOutcome.tsx";
import { refusalKey } from "./use-import.ts";

interface Props {
  plan: BatchPlan;
  results: readonly ImportResult[];
  refused: ReadonlyMap<string, string>;
  /** files are on their way */
  sending: boolean;
}

/** What came of the files that were sent, what will come of those that are ready, and which stay for what reason. */
export function ImportList({ plan: { items, staying }, results, refused, sending }: Props) {
  return (
    <ul aria-label="Files of the import">
      {results.map((result) => (
        <ImportOutcome key={result.key} result={result} sending={sending} />
      ))}
      {items.map(({ files, label, words }) => {
        const reasons = files.flatMap((file) => {
          const reason = refused.get(refusalKey(file));
          return reason === undefined ? [] : [withFile(file.file.name, reason)];
        });
        return (
          <Row key={files.map(({ key }) => key).join(" ")} level={reasons.length === 0 ? null : "stop"}>
            <b className="font-semibold">{label}</b>
            {": "}
            <span className="text-quiet">{words}</span>
            {reasons.map((reason) => (
              <span key={reason} className="block">{`Refused: ${reason}`}</span>
            ))}
          </Row>
        );
      })}
      {staying.map(({ file, why }) => (
        <Row key={file.key} level={null}>
          <span className="text-quiet">
            {file.file.name} {why}
          </span>
        </Row>
      ))}
    </ul>
  );
}

/** The reason, with the file where it does not name it. */
const withFile = (name: string, reason: string) => (reason.includes(name) ? reason : `${name}: ${reason}`);

function Row({ level, children }: { level: "stop" | null; children: React.ReactNode }) {
  return (
    <li className="flex gap-3 border-t border-line py-2 first:border-0">
      <span className="mt-0.5 w-[22px] flex-none">{level && <Swatch level={level} />}</span>
      <p className="min-w-0 wrap-anywhere">{children}</p>
    </li>
  );
}
