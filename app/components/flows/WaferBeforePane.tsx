import type { WaferBefore } from "#app/lib/flow-wafer-before.ts";

/** The wafer as the step finds it, beside the step's form: what there is to remove, grind or heat. */
export function WaferBeforePane({ wafer, number }: { wafer: WaferBefore | null; number: number }) {
  return (
    <aside className="frame self-start p-4 tablet:p-6 wide:sticky wide:top-4" aria-labelledby="before-head">
      <h2 id="before-head" className="font-semibold">
        The wafer before step {number}
      </h2>
      {wafer ? (
        <dl className="mt-2 space-y-3">
          {wafer.slots === null ? null : <Part label="As it comes in">{wafer.slots}</Part>}
          <Part label="Device side, outermost first">
            <Films films={wafer.front} />
          </Part>
          <Part label="Silicon">{wafer.silicon}</Part>
          <Part label="Back side, from the silicon outwards">
            <Films films={wafer.back} />
          </Part>
          <Part label="It is on">{wafer.on ?? "nothing: free"}</Part>
          <Part label="Side up">{wafer.faceUp}</Part>
        </dl>
      ) : (
        <p className="mt-1 text-quiet">A step before this one leaves no silicon. Mend that one first.</p>
      )}
    </aside>
  );
}

function Part({ label, children }: { label: string; children: React.ReactNode }) {
  return (
    <div className="border-t border-line pt-2">
      <dt className="text-label text-quiet">{label}</dt>
      <dd>{children}</dd>
    </div>
  );
}

function Films({ films }: { films: string[] }) {
  if (films.length === 0) return <span className="text-quiet">no film</span>;
  return (
    <ul>
      {films.map((film, index) => (
        <li key={index}>{film}</li>
      ))}
    </ul>
  );
}
