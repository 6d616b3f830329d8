import { noBreak } from "#app/components/drawings/no-break.ts";
import type { ComparedSensitivity } from "#app/schemas/comparison.ts";

/** The inputs of each that move its warp most, as bars with words. */
export function Sensitivities({ of }: { of: readonly ComparedSensitivity[] }) {
  return (
    <div className="mt-2 grid gap-x-8 gap-y-4 tablet:grid-cols-2 wide:grid-cols-3">
      {of.map(({ letter, name, remark, lines }) => (
        <section key={letter} aria-label={`${letter} ${name}`} className="keep-whole">
          <h3>
            <b>{letter}</b> {name}
          </h3>
          {remark === null ? null : <p className="text-quiet">{remark}</p>}
          <ul>
            {lines.map(({ input, tolerance, moves, share }) => (
              <li key={input} className="py-1">
                {noBreak(`${input} ${tolerance} moves it by ${moves}`)}
                <span className="mt-0.5 block h-2 border-l border-ink" aria-hidden="true">
                  <span className="block h-2 bg-silicon" style={{ width: `${(share * 100).toFixed(1)}%` }} />
                </span>
              </li>
            ))}
          </ul>
        </section>
      ))}
    </div>
  );
}
