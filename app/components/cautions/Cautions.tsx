import { CautionSign, type CautionSignName } from "#app/components/method/CautionSign.tsx";

/** What always stands beside an estimate: first that it is one, then what hurts people. */
const CAUTIONS: readonly { sign: CautionSignName; text: string }[] = [
  {
    sign: "estimate",
    text: "Estimates support, never replace, qualified process engineering and the site’s own procedures and safety rules. Follow local codes and licensed or qualified practice.",
  },
  { sign: "shards", text: "Thin silicon breaks into razor-sharp shards: protect eyes and hands." },
  { sign: "blade", text: "Blades and grinders: guards closed, hands out." },
  { sign: "heat", text: "Hot plates and hot chucks burn, also after they are switched off." },
  { sign: "solvent", text: "Solvents: ventilate, and keep sparks and flames away." },
  { sign: "laser", text: "Laser debond only enclosed and interlocked." },
  { sign: "vacuum", text: "When vacuum is lost the wafer lets go: know what holds it then." },
  { sign: "run card", text: "A carrier, tape or gripper never replaces the run card." },
];

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
