import { memo } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { filmForces, type FilmForce } from "#app/lib/film-forces.ts";
import { turnFront } from "#app/lib/stack-order.ts";
import { percentWords, type Estimated } from "#app/lib/stack-words.ts";

interface Props {
  estimated: Estimated;
  /** of the films, in the order of the request */
  names: readonly string[];
}

const forceWords = (force: number) =>
  formatQuantity(force, "forcePerLength", { unit: "N/m", significant: 3, trim: true, sign: true });
const senseWords = (force: number) => (force === 0 ? "no force" : force > 0 ? "tension" : "compression");

/** Which film pulls how much: force per width of wafer of each, its share of what bends the wafer, and their sums. */
export const FilmForces = memo(function FilmForces({ estimated, names }: Props) {
  const { films: forces, front, back, net } = filmForces(estimated);
  if (forces.length === 0) return null;
  const films = turnFront(forces.map((film, index) => ({ ...film, name: names[index] })));
  const largest = Math.max(...films.map(({ force }) => Math.abs(force)));
  return (
    <section className="border-t border-line px-4 py-3 tablet:px-6" aria-labelledby="forces">
      <h3 id="forces" className="font-semibold">
        Film forces, 25&nbsp;°C
      </h3>
      <div className="mt-1 overflow-x-auto" tabIndex={0} role="region" aria-label="Film forces">
        <table className="table">
          <caption className="sr-only">
            Force of each film per width of wafer, top to bottom as the cut shows them
          </caption>
          <thead>
            <tr>
              <th scope="col">Film</th>
              <th scope="col" className="max-tablet:hidden">
                <span className="sr-only">Drawn</span>
              </th>
              <th scope="col" className="num">
                Force per width
              </th>
              <th scope="col" className="num">
                Bends
              </th>
            </tr>
          </thead>
          <tbody>
            {films.map((film, index) => (
              <tr key={index}>
                <th scope="row" className="font-normal">
                  {film.name}
                  <span className="block text-label text-quiet">
                    {film.side === "front" ? "device side" : "back side"}
                  </span>
                </th>
                <td className="w-32 max-tablet:hidden">
                  <ForceBar force={film.force} largest={largest} />
                </td>
                <td className="text-right whitespace-nowrap">
                  {noBreak(forceWords(film.force))}
                  <span className="block text-label text-quiet">{senseWords(film.force)}</span>
                </td>
                <td className="text-right">{bendWords(film)}</td>
              </tr>
            ))}
            <tr className="font-semibold">
              <th scope="row" className="font-semibold">
                Device side, less back side
              </th>
              <td className="max-tablet:hidden" />
              <td className="text-right whitespace-nowrap">{noBreak(forceWords(net))}</td>
              <td className="text-right font-normal">{net === 0 ? "balanced" : directionWords(net)}</td>
            </tr>
          </tbody>
        </table>
      </div>
      <p className="mt-1 text-label text-quiet">
        {noBreak(`Device side ${forceWords(front)}, back side ${forceWords(back)}.`)} Thin films bend the wafer by the
        difference; each film’s share is of all that bends, whichever way.
      </p>
    </section>
  );
});

const directionWords = (bends: number) => (bends > 0 ? "edges up" : "edges down");

function bendWords({ share, bends }: FilmForce): string {
  return share === null || bends === 0 ? "not at all" : `${percentWords(100 * share)}, ${directionWords(bends)}`;
}

const BAR = { width: 120, height: 14 };

/** Compression to the left of the middle, tension to the right. */
function ForceBar({ force, largest }: { force: number; largest: number }) {
  const middle = BAR.width / 2;
  const length = largest === 0 ? 0 : (Math.abs(force) / largest) * (middle - 2);
  return (
    <svg width={BAR.width} height={BAR.height} viewBox={`0 0 ${BAR.width} ${BAR.height}`} aria-hidden="true">
      <rect
        x={force < 0 ? middle - length : middle}
        y="2.5"
        width={length}
        height={BAR.height - 5}
        fill={force < 0 ? "var(--raised)" : "var(--silicon)"}
        stroke="var(--silicon)"
      />
      <path d={`M${middle} 0V${BAR.height}`} stroke="var(--ink)" />
    </svg>
  );
}
