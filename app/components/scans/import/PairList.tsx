import { Link } from "react-router";
import { Swatch } from "#app/components/drawings/Swatch.tsx";
import type { BatchPairs } from "#app/lib/scan-import/pairs.ts";
import { pairKey, type KeptPair } from "./use-import.ts";

interface Props {
  planned: BatchPairs;
  kept: readonly KeptPair[];
  refused: ReadonlyMap<string, string>;
}

/** The pairs as they will be made, what came of those that were sent, and which files stay for what reason. */
export function PairList({ planned: { pairs, staying }, kept, refused }: Props) {
  return (
    <ul aria-label="Pairs and files that stay">
      {kept.map(({ id, label, files, already }) => (
        <Row key={`${id} ${files.join(" ")}`} level="clear">
          <Link to={`/scans/${id}`} className="link">
            {label}
          </Link>
          {already ? " was in already, so it is not kept twice: " : " is in: "}
          <span className="text-quiet">{files.join(" and ")}</span>
        </Row>
      ))}
      {pairs.map((pair) => {
        const reason = refused.get(pairKey(pair));
        return (
          <Row key={pairKey(pair)} level={reason === undefined ? null : "stop"}>
            <b className="font-semibold">{pair.label}</b>
            {": "}
            <span className="text-quiet">{`${pair.before.file.name} before, ${pair.after.file.name} after the film`}</span>
            {reason !== undefined && <span className="block">{`Refused: ${reason}`}</span>}
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

function Row({ level, children }: { level: "clear" | "stop" | null; children: React.ReactNode }) {
  return (
    <li className="flex gap-3 border-t border-line py-2 first:border-0">
      <span className="mt-0.5 w-[22px] flex-none">{level && <Swatch level={level} />}</span>
      <p className="min-w-0 wrap-anywhere">{children}</p>
    </li>
  );
}
