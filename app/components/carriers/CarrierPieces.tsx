import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { LineField } from "#app/components/forms/LineField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { DataTable, type Column } from "#app/components/ui/DataTable.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import { formatMeasured } from "#app/lib/format-measured.ts";
import {
  CARRIER_UNIT_STATES,
  usesLeft,
  type CarrierUnitRow,
  type CarrierUnits,
  type UnitAnswer,
} from "#app/lib/carrier-units.ts";
import { PieceActions } from "./PieceActions.tsx";

interface Props {
  units: CarrierUnits;
  /** how often a piece may be used */
  limit: number;
  mayEdit: boolean;
  answer: UnitAnswer | null;
}

const columnsOf = (limit: number, mayEdit: boolean): Column<CarrierUnitRow>[] => [
  { key: "mark", head: "Mark", sortable: true, cell: ({ mark }) => <span className="whitespace-nowrap">{mark}</span> },
  { key: "state", head: "State", sortable: true, cell: ({ state }) => state },
  { key: "uses", head: "Uses", numeric: true, sortable: true, cell: ({ uses }) => uses },
  { key: "left", head: "Left", wide: true, cell: (unit) => usesLeft(unit, limit) },
  {
    key: "variation",
    head: "Variation",
    wide: true,
    cell: ({ thicknessVariation: measured }) =>
      measured ? (
        <>
          {formatMeasured(measured, "length", { unit: "µm" })}
          <span className="block text-label text-quiet">{measured.on}</span>
        </>
      ) : (
        <span className="text-quiet">as its kind</span>
      ),
  },
  {
    key: "used",
    head: "Last use",
    sortable: true,
    wide: true,
    cell: ({ lastUsedOn }) => lastUsedOn ?? <span className="text-quiet">none counted here</span>,
  },
  {
    key: "changed",
    head: "Last changed",
    wide: true,
    cell: ({ stamp }) => `${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`,
  },
  ...(mayEdit ? [{ key: "do", head: "Change", cell: (unit: CarrierUnitRow) => <PieceActions unit={unit} /> }] : []),
];

/** The pieces of a kind of carrier, each with its mark, how often it was used and what it is doing. */
export function CarrierPieces({ units: { page, all }, limit, mayEdit, answer }: Props) {
  return (
    <section aria-labelledby="pieces" className="mt-8">
      <h2 id="pieces" className="text-lead font-semibold">
        Pieces
      </h2>
      <p className="mt-1 mb-4 max-w-[60em] text-quiet">
        {all === 0
          ? "No piece of this carrier is known yet. Each has a mark of its own and is counted by its uses."
          : `${all} ${all === 1 ? "piece" : "pieces"}; each may be used ${limit === 1 ? "once" : `${limit} times`}.`}
      </p>
      {answer?.refused && <Notice kind="error" title={answer.refused} />}
      {all > 0 && (
        <>
          <ListHead
            what="pieces"
            filters={[{ name: "state", label: "State", options: sameWords(CARRIER_UNIT_STATES) }]}
          />
          {page.rows.length > 0 ? (
            <DataTable caption="Pieces" columns={columnsOf(limit, mayEdit)} page={page} rowKey={({ id }) => id} />
          ) : (
            <p className="mb-4 text-quiet">No piece fits. Change the search, or take the filter away.</p>
          )}
        </>
      )}
      {mayEdit && <NewPiece key={`${all} ${answer ? "again" : "new"}`} lastResult={answer?.lastResult ?? null} />}
    </section>
  );
}

function NewPiece({ lastResult }: { lastResult: SubmissionResult<string[]> | null }) {
  const [form, fields] = useRecordForm<{ mark: string; uses: string }>({
    lastResult,
    defaultValue: { uses: "0" },
    id: "new-piece",
  });
  return (
    <Form
      method="post"
      {...getFormProps(form)}
      aria-labelledby="new-piece-title"
      className="frame mt-4 max-w-260 p-4 tablet:p-6"
      preventScrollReset
    >
      <h3 id="new-piece-title" className="font-semibold">
        Add a piece
      </h3>
      <div className="mt-2 flex flex-wrap items-start gap-3">
        <LineField
          field={fields.mark}
          label="Mark"
          hint="Serial number or laser mark"
          className="w-64 max-w-full"
          input={{ autoComplete: "off" }}
        />
        <LineField
          field={fields.uses}
          label="Uses so far"
          hint="0 for a new one"
          className="w-40"
          input={{ inputMode: "numeric" }}
        />
        <div className="tablet:mt-5">
          <SubmitButton busy="Adding">Add piece</SubmitButton>
        </div>
      </div>
    </Form>
  );
}
