import type { ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";

/** What a form keeps of a comparison's address besides its own fields. */
export function HiddenAsked({ asked, without }: { asked: ComparisonAsked; without: readonly string[] }) {
  const { ids, at, scale, from, to, tool, only, query } = asked;
  const kept = {
    of: ids.join(","),
    at,
    scale: scale === "log" ? "" : scale,
    from,
    to,
    tool,
    only: only ? "differences" : "",
    q: query,
  };
  return Object.entries(kept).map(([name, value]) =>
    value === "" || without.includes(name) ? null : <input key={name} type="hidden" name={name} value={value} />,
  );
}
