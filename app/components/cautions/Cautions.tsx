import { CautionSign } from "#app/components/method/CautionSign.tsx";
import { CAUTIONS } from "#app/lib/cautions.ts";

/**
 * The cautions that stand on the sheet, under every assessment and on the method page. `compact` is for paper and for narrow
 * places: smaller signs, the size of the text around it.
 */
export function Cautions({ compact = false }: { compact?: boolean }) {
  return (
    <ul
      aria-label="Cautions"
      className={compact ? "columns-2 gap-6 max-tablet:columns-1 print:columns-2" : "grid gap-x-8 wide:grid-cols-2"}
    >
      {CAUTIONS.map(({ sign, text }) => (
        <li
          key={sign}
          className={
            compact ? "keep-whole flex items-start gap-2 py-0.5" : "flex items-center gap-4 border-t border-line py-3"
          }
        >
          <CautionSign sign={sign} size={compact ? 18 : 36} />
          <span>{text}</span>
        </li>
      ))}
    </ul>
  );
}
