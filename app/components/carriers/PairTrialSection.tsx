import { Form, Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { PairTrial, TriedPair } from "#app/lib/pair-trial.ts";
import { pairAnswer, whyPairBow } from "./pair-words.ts";

/** A carrier tried on a blank wafer: how the pair lies, why that and no window of ppm decides, and what to try it with. */
export function PairTrialSection({ trial }: { trial: PairTrial }) {
  const { materials, pair } = trial;
  return (
    <section aria-labelledby="pair" className="p-4 tablet:p-6">
      <h2 id="pair" className="sr-only">
        Bonded to a blank wafer
      </h2>
      {pair && (
        <>
          <p className="max-w-[44em] text-figure font-medium text-pretty">{noBreak(pairAnswer(pair))}</p>
          <p className="mt-1 max-w-[60em] text-quiet">{noBreak(whyPairBow(pair))}</p>
          {pair.cannotRelease && (
            <p className="mt-2">
              <FindingTag outcome="caution">{pair.cannotRelease}</FindingTag>
            </p>
          )}
        </>
      )}
      {materials.length === 0 ? (
        <p className="text-quiet">
          No bonding material is in the library yet, so no pair can be computed.{" "}
          <Link to="/carriers/bonding-materials" className="link">
            Bonding materials
          </Link>
        </p>
      ) : (
        <TrialForm trial={trial} />
      )}
      {pair && <Budget pair={pair} />}
    </section>
  );
}

function TrialForm({ trial: { materials, chosen, fault, pair } }: { trial: PairTrial }) {
  return (
    <Form method="get" preventScrollReset className="mt-4 flex flex-wrap items-start gap-3">
      <SelectField
        key={`material ${chosen.material}`}
        name="material"
        label="Bonding material"
        options={materials.map(({ id, name }) => ({ value: id, label: name }))}
        defaultValue={chosen.material}
        hint={
          pair && noBreak(`At ${formatQuantity(pair.bondThickness, "length", { unit: "µm" })}, the middle of its range`)
        }
        className="w-80 max-w-full"
      />
      <TextField
        key={`silicon ${chosen.silicon}`}
        name="silicon"
        label="Silicon left"
        defaultValue={chosen.silicon}
        placeholder={pair ? formatQuantity(pair.wafer.thickness, "length", { unit: "µm" }) : "50 µm"}
        hint="Blank: not thinned"
        error={fault ?? undefined}
        className="w-48"
      />
      <button type="submit" className="btn mt-5">
        Compute
      </button>
    </Form>
  );
}

/** Contributions that would be shown as nothing are left out, m. */
const LEAST_SHOWN = 0.5e-6;

function Budget({ pair }: { pair: TriedPair }) {
  const shown = pair.budget.filter(({ contribution }) => contribution >= LEAST_SHOWN);
  if (shown.length === 0) return null;
  const name = "Where the uncertainty comes from";
  return (
    <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label={name}>
      <table className="table max-w-160">
        <caption className="sr-only">{name}</caption>
        <thead>
          <tr>
            <th scope="col">Uncertainty comes from (± is k = 2)</th>
            <th scope="col">Source</th>
            <th scope="col" className="num">
              Standard uncertainty
            </th>
          </tr>
        </thead>
        <tbody>
          {shown.map(({ input, source, contribution }) => (
            <tr key={input}>
              <th scope="row" className="font-normal">
                {input}
              </th>
              <td>
                <SourceMark kind={source} />
              </td>
              <td className="num">{formatQuantity(contribution, "length", { unit: "µm", significant: 2 })}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
