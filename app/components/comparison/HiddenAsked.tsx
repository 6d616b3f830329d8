import { comparisonFields, type ComparisonAsked } from "#app/lib/comparison/asked.ts";

/** What a form keeps of a comparison's address besides its own fields. */
export function HiddenAsked({ asked, without }: { asked: ComparisonAsked; without: readonly string[] }) {
  const kept = [["of", asked.ids.join(",")] as const, ...comparisonFields(asked)];
  return kept.map(([name, value]) =>
    value === "" || without.includes(name) ? null : <input key={name} type="hidden" name={name} value={value} />,
  );
}
