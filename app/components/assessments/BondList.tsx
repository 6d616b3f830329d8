import { noBreak } from "#app/components/drawings/no-break.ts";
import type { BondView } from "#app/lib/assessment-view.ts";
import { DetailList } from "./DetailList.tsx";

/** What joins the wafer to a carrier, and over which steps. */
export function BondList({ bonds }: { bonds: readonly BondView[] }) {
  return (
    <div className="space-y-3">
      {bonds.map(({ steps, face, carrier, material, thickness, limit, release }) => (
        <DetailList key={steps}>
          <dt>Over</dt>
          <dd>{noBreak(steps)}</dd>
          {face ? (
            <>
              <dt>Face</dt>
              <dd>{face}</dd>
            </>
          ) : null}
          <dt>Carrier</dt>
          <dd>{noBreak(carrier)}</dd>
          <dt>Bonding material</dt>
          <dd>
            {noBreak(material)}, {thickness}; takes {limit}
          </dd>
          <dt>Debond</dt>
          <dd>{release}</dd>
        </DetailList>
      ))}
    </div>
  );
}
