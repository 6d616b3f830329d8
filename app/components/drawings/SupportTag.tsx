import type { SupportClass } from "#app/engine/vocabulary.ts";
import { SUPPORT_SIGNS } from "./severity.ts";
import { Swatch } from "./Swatch.tsx";

export interface SupportTagProps {
  support: SupportClass;
}

/** A support class as hatch and word, for tables, lists and the legend of a sheet. */
export function SupportTag({ support }: SupportTagProps) {
  const sign = SUPPORT_SIGNS[support];
  return (
    <span className="inline-flex items-center gap-1.5">
      <Swatch level={sign.level} />
      <span className={support === "bare" ? "" : "font-semibold"}>{sign.word}</span>
    </span>
  );
}
