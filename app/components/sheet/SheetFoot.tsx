import type { ReactNode } from "react";
import { Cautions } from "#app/components/cautions/Cautions.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { SheetView } from "#app/lib/sheet-view.ts";
import { WriteIn } from "./WriteIn.tsx";

/** What the hands need beside the steps: room for the carrier and the tape that are really used, and the cautions. */
export function SheetFoot({ sheet }: { sheet: SheetView }) {
  const { bonds, tapes } = sheet;
  return (
    <>
      {bonds.length + tapes.length > 0 ? (
        <section className="keep-whole border-b-[0.25mm] border-ink px-[3mm] py-[1.2mm]" aria-label="Carrier and tape">
          {bonds.map(({ steps, face, carrier, material, debond }) => (
            <Line key={steps}>
              <span>
                <strong>{carrier}</strong>, {material}
                {face ? `, ${face}` : ""}; debond {noBreak(debond)}
              </span>
              <WriteIn label="Carrier number" width="32mm" />
            </Line>
          ))}
          {tapes.map((tape) => (
            <Line key={tape}>
              <WriteIn label={tape} strong width="38mm" />
              <WriteIn label="on since" width="32mm" />
              <WriteIn label="days at most" width="16mm" />
            </Line>
          ))}
        </section>
      ) : null}
      <section className="keep-whole px-[3mm] py-[0.8mm] [&_li]:py-0" aria-labelledby="cautions">
        <h2 id="cautions" className="sr-only">
          Cautions
        </h2>
        <Cautions compact />
      </section>
    </>
  );
}

function Line({ children }: { children: ReactNode }) {
  return <p className="flex flex-wrap justify-between gap-x-[4mm] gap-y-[1mm] not-first:pt-[1mm]">{children}</p>;
}
