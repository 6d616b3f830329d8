import { Form, Link } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { FilmImported, FilmImportPlan } from "#app/schemas/film-import.ts";

/** A table of films: chosen or pasted, looked at, and only then applied. */
export function FilmImport({ imported }: { imported: Exclude<FilmImported, { outcome: "done" }> | null }) {
  const plan = imported?.outcome === "plan" ? imported.plan : null;
  return (
    <>
      {imported?.outcome === "refused" && <Notice kind="error" title={imported.reason} />}
      {imported?.outcome === "plan" && imported.conflict !== null && (
        <Notice kind="caution" title={imported.conflict} />
      )}
      {plan && <Preview plan={plan} />}
      <Form method="post" encType="multipart/form-data" className="frame mt-4" aria-labelledby="table-head">
        <div className="p-4 tablet:px-6">
          <h2 id="table-head" className="text-lead font-medium">
            {plan ? "Another table" : "A table of films"}
          </h2>
          <p className="mt-1 max-w-160 text-quiet">
            A row is a film, told by its name. Columns that are left out stay as they are in the library; a new film
            needs its kind, stress, modulus, Poisson’s ratio and expansion, each with its source. Begin with the{" "}
            <a href="/films/films.csv" className="link" download>
              library as CSV
            </a>
            . Nothing is changed before you have seen what would be.
          </p>
          <div className="mt-3 grid gap-3 wide:grid-cols-2">
            <div className="field">
              <label htmlFor="film-file">File</label>
              <input
                type="file"
                id="film-file"
                name="file"
                accept=".csv,.txt,.tsv,text/csv,text/plain"
                className="file:mr-3 file:cursor-pointer file:border-0 file:bg-transparent file:font-medium file:text-ink file:underline max-tablet:file:leading-8"
              />
              <small>CSV in UTF-8, up to 1 MB</small>
            </div>
            <div className="field">
              <label htmlFor="film-text">Or its rows, pasted</label>
              <textarea
                id="film-text"
                name="text"
                rows={5}
                spellCheck={false}
                placeholder={
                  "name;stress_MPa;stress_tolerance_MPa;stress_source\nPolymer dielectric A;30;3;measured here"
                }
                className="tabular-nums"
              />
              <small>With a decimal comma, semicolons between the columns</small>
            </div>
          </div>
        </div>
        <div className="flex flex-wrap items-center gap-2 border-t border-ink p-4 tablet:px-6">
          {plan ? (
            <button type="submit" className="btn">
              See what would change
            </button>
          ) : (
            <SubmitButton busy="Reading">See what would change</SubmitButton>
          )}
          <Link to="/films" className="btn">
            Back to the films
          </Link>
        </div>
      </Form>
    </>
  );
}

function Preview({ plan }: { plan: FilmImportPlan }) {
  const { added, changed, refused, same, unread } = plan;
  const count = added.length + changed.length;
  return (
    <section aria-labelledby="preview" className="frame">
      <div className="p-4 tablet:px-6">
        <h2 id="preview" className="text-lead font-medium">
          {headline(plan)}
        </h2>
        <p className="mt-1 text-quiet">
          {same === 1 ? "One row says" : `${same} rows say`} what the library says already.
          {unread.length > 0 && ` Not read, since they name nothing of a film: ${unread.join(", ")}.`}
        </p>
      </div>
      {refused.length > 0 && (
        <ul className="border-t border-line p-4 tablet:px-6" aria-label="Rows that are left out">
          {refused.map(({ row, name, reasons }) => (
            <li key={row} className="wrap-anywhere">
              <b className="font-semibold text-stop">Row {row} is left out</b>
              {name && ` (${name})`}: {reasons.join(" ")}
            </li>
          ))}
        </ul>
      )}
      {count > 0 && <ChangeTable plan={plan} />}
      {count > 0 && (
        <Form
          method="post"
          encType="multipart/form-data"
          className="flex flex-wrap items-center gap-3 border-t border-ink p-4 tablet:px-6"
        >
          <input type="hidden" name="text" value={plan.text} />
          <input
            type="hidden"
            name="seen"
            value={JSON.stringify(Object.fromEntries(changed.map(({ id, version }) => [id, version])))}
          />
          <input type="hidden" name="intent" value="apply" />
          <SubmitButton busy="Importing">{buttonWords(added.length, changed.length)}</SubmitButton>
          <p className="text-quiet">Assessments that used a changed value become out of date and say by how much.</p>
        </Form>
      )}
    </section>
  );
}

function ChangeTable({ plan: { added, changed } }: { plan: FilmImportPlan }) {
  return (
    <div
      className="overflow-x-auto border-t border-line px-4 tablet:px-6"
      tabIndex={0}
      role="region"
      aria-label="What would change"
    >
      <table className="table">
        <thead>
          <tr>
            <th scope="col">Film</th>
            <th scope="col">Property</th>
            <th scope="col">In the library</th>
            <th scope="col">In the table</th>
          </tr>
        </thead>
        <tbody>
          {added.map(({ row, name }) => (
            <tr key={row}>
              <th scope="row" className="font-normal">
                {name}
              </th>
              <td colSpan={3} className="font-semibold">
                new
              </td>
            </tr>
          ))}
          {changed.flatMap(({ id, name, uses, changes }) =>
            changes.map(({ label, from, to }, n) => (
              <tr key={`${id} ${label}`}>
                {n === 0 && (
                  <th scope="rowgroup" rowSpan={changes.length} className="align-top font-normal">
                    <Link to={`/films/${id}`} className="link">
                      {name}
                    </Link>
                    <span className="block text-label text-quiet">{usedWords(uses)}</span>
                  </th>
                )}
                <td>{label}</td>
                <td className="text-quiet">{from}</td>
                <td className="font-medium">{to}</td>
              </tr>
            )),
          )}
        </tbody>
      </table>
    </div>
  );
}

const films = (count: number) => (count === 1 ? "1 film" : `${count} films`);

function headline({ added, changed, refused }: FilmImportPlan): string {
  if (added.length + changed.length === 0)
    return refused.length > 0 ? "Nothing can be imported" : "Nothing would change";
  const parts = [
    added.length > 0 && `${films(added.length)} would be added`,
    changed.length > 0 && `${films(changed.length)} would be changed`,
  ].filter((part) => part !== false);
  return parts.join(", ");
}

const buttonWords = (added: number, changed: number) =>
  [added > 0 && `add ${films(added)}`, changed > 0 && `change ${films(changed)}`]
    .filter((part) => part !== false)
    .join(" and ")
    .replace(/^./, (letter) => letter.toUpperCase());

const usedWords = (uses: number) =>
  uses === 0
    ? "in no stack or flow of yours"
    : `in ${uses === 1 ? "one stack or flow" : `${uses} stacks and flows`} of yours`;
