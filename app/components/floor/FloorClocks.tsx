import { Swatch } from "#app/components/drawings/Swatch.tsx";
import { clockState, type Clock } from "#app/lib/floor/clocks.ts";
import { timeWords } from "#app/lib/floor/time-words.ts";
import { minuteOf } from "#app/lib/minute-of.ts";

const LEVELS = { clear: "clear", caution: "caution", "do not run": "stop" } as const;

/** The clocks that run for a lot, each against its red line, as they stood when the page was made. */
export function FloorClocks({ clocks, now }: { clocks: readonly Clock[]; now: string }) {
  if (clocks.length === 0) return null;
  return (
    <section className="mt-4" aria-label="Clocks">
      <h2 className="text-lead font-semibold">Clocks</h2>
      <ul className="border-t border-line">
        {clocks.map((clock) => {
          const { passed, left, level } = clockState(clock, new Date(now));
          return (
            <li key={clock.name} className="flex flex-wrap items-center gap-x-3 border-b border-line py-2 text-lead">
              <Swatch level={LEVELS[level]} />
              <span>{clock.name}</span>
              <b>{timeWords(passed)}</b>
              <span className={level === "do not run" ? "font-semibold text-stop" : "text-quiet"}>
                {left < 0
                  ? `${timeWords(left)} beyond its red line: call the shift lead`
                  : `red line at ${minuteOf(new Date(Date.parse(clock.since) + clock.limit * 1000).toISOString())}, ${timeWords(left)} left`}
              </span>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
