import type { FloorSheet } from "#app/schemas/floor-view.ts";

/** What always stands beside a sheet: what hurts people, and that it replaces nothing. */
export function FloorCautions({ cautions }: Pick<FloorSheet, "cautions">) {
  return (
    <section aria-label="Always">
      <h2 className="text-lead font-semibold">Always</h2>
      <ul className="mt-1 list-disc pl-5">
        {cautions.map(({ sign, text }) => (
          <li key={sign}>{text}</li>
        ))}
      </ul>
    </section>
  );
}
