import { HatchBox } from "#app/components/drawings/HatchBox.tsx";
import type { HatchLevel } from "#app/components/drawings/severity.ts";
import type { Kit } from "./kit.ts";

const SIGN = { width: 5.2, height: 3.3 };

/** A small sample of a hatch; always beside its word. */
export function Sign({ kit: { Drawing }, level }: { kit: Kit; level: HatchLevel }) {
  return (
    <Drawing {...SIGN}>
      <svg viewBox="0 0 22 14" aria-hidden="true">
        <HatchBox level={level} x={0} y={0} width={22} height={14} scale={0.8} />
      </svg>
    </Drawing>
  );
}
