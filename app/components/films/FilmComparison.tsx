import { Form, Link } from "react-router";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";

interface Chosen {
  id: string;
  name: string;
}

interface Props {
  choices: { value: string; label: string }[];
  chosen: (Chosen | null)[];
  /** null until two are chosen */
  rows: { label: string; from: string; to: string; differs: boolean }[] | null;
}

/** Two films, property by property; what differs is said in words, not by colour alone. */
export function FilmComparison({ choices, chosen: [one = null, other = null], rows }: Props) {
  const differing = rows?.filter(({ differs }) => differs).length ?? 0;
  return (
    <>
      <Form className="mb-4 flex flex-wrap items-start gap-3" aria-label="Films to compare">
        <SelectField
          name="of"
          label="Film"
          options={choices}
          defaultValue={one?.id ?? ""}
          blank="Choose"
          key={one?.id}
        />
        <SelectField
          name="of"
          label="Against"
          options={choices}
          defaultValue={other?.id ?? ""}
          blank="Choose"
          key={`against ${other?.id}`}
        />
        <button type="submit" className="btn mt-5">
          Compare
        </button>
      </Form>
      {rows && one && other ? (
        <section className="frame" aria-labelledby="comparison">
          <h2 id="comparison" className="p-4 text-lead font-medium tablet:px-6">
            {differing === 0
              ? "They say the same of everything"
              : `They differ in ${differing} of ${rows.length} properties`}
          </h2>
          <div className="overflow-x-auto px-4 pb-4 tablet:px-6" tabIndex={0} role="region" aria-label="Both films">
            <table className="table">
              <thead>
                <tr>
                  <th scope="col">Property</th>
                  {[one, other].map(({ id, name }, n) => (
                    <th key={n} scope="col">
                      <Link to={`/films/${id}`} className="link">
                        {name}
                      </Link>
                    </th>
                  ))}
                  <th scope="col">
                    <span className="sr-only">Difference</span>
                  </th>
                </tr>
              </thead>
              <tbody>
                {rows.map(({ label, from, to, differs }) => (
                  <tr key={label}>
                    <th scope="row" className="font-normal">
                      {label.charAt(0).toUpperCase() + label.slice(1)}
                    </th>
                    <td className={differs ? "font-medium" : "text-quiet"}>{from}</td>
                    <td className={differs ? "font-medium" : "text-quiet"}>{to}</td>
                    <td>{differs ? "differs" : <span className="text-quiet">same</span>}</td>
                  </tr>
                ))}
              </tbody>
            </table>
          </div>
        </section>
      ) : (
        <EmptyState title="Choose two films">
          What the library knows of each stands side by side here: stress, stiffness, expansion and limits, with
          tolerance and source.
        </EmptyState>
      )}
    </>
  );
}
