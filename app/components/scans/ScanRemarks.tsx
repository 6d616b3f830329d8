import { Swatch } from "#app/components/drawings/Swatch.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { ScanRemark } from "#app/lib/scan-remarks.ts";

/** What stands against the figures of a scan, or that nothing does. */
export function ScanRemarks({ remarks }: { remarks: ScanRemark[] }) {
  const cautioned = remarks.some(({ level }) => level === "caution");
  return (
    <section aria-labelledby="remarks">
      <h2 id="remarks" className="font-semibold">
        How far to trust it
      </h2>
      <ul className="mt-1 max-w-240">
        {!cautioned && (
          <Remark level="clear">The shape is a parabola, and nothing else stands against the figures.</Remark>
        )}
        {remarks.map(({ level, text }) => (
          <Remark key={text} level={level === "caution" ? "caution" : null}>
            {noBreak(text)}
          </Remark>
        ))}
      </ul>
    </section>
  );
}

/** A note has neither hatch nor level: it bears on nothing. */
function Remark({ level, children }: { level: "clear" | "caution" | null; children: string }) {
  return (
    <li className="flex gap-3 border-t border-line py-2 first:border-0">
      <span className="mt-0.5 w-[22px] flex-none">{level && <Swatch level={level} />}</span>
      <p>
        {level === "caution" && <b className="text-caution">Caution. </b>}
        {children}
      </p>
    </li>
  );
}
