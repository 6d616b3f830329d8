import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { sheetPath } from "#app/lib/sheet-path.ts";
import type { RevisionView } from "#app/schemas/sheet-view.ts";

const PAGES = [
  { value: "all", label: "All pages" },
  { value: "hands", label: "Page for hands alone" },
];

/** Takes the stored PDF out, and notes for which place. A plain form: what comes back is the file. */
export function PrintForm({ view: { id, papers, staff }, paper }: { view: RevisionView; paper: Paper }) {
  return (
    <form method="post" action={`${sheetPath(id)}/sheet.pdf`} className="flex max-w-160 flex-wrap items-start gap-x-3">
      {papers.length > 1 && (
        <SelectField
          name="leg"
          label="Slots"
          options={papers.map(({ leg, name }) => ({ value: String(leg), label: name }))}
        />
      )}
      <SelectField
        name="paper"
        label="Paper"
        defaultValue={paper}
        options={Object.entries(PAPERS).map(([value, { name }]) => ({ value, label: name }))}
      />
      {staff ? (
        <SelectField name="pages" label="Pages" options={PAGES} />
      ) : (
        <input type="hidden" name="pages" value="hands" />
      )}
      <TextField name="place" label="Where it will hang" maxLength={200} className="min-w-48 flex-1" />
      <button type="submit" className="btn btn-primary mt-5">
        Take out the PDF
      </button>
    </form>
  );
}
