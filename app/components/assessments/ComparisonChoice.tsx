import { useId } from "react";
import { Form, useNavigation } from "react-router";
import type { ComparisonView } from "#app/lib/comparison-view.ts";

/** What to compare with: a form that puts it into the address. */
export function ComparisonChoice({ view, query }: { view: ComparisonView; query: string }) {
  const id = useId();
  const loading = useNavigation().state === "loading";
  const { sameFlow, otherFlows, chosen, asked } = view;
  return (
    <Form
      method="get"
      className="screen-only mb-4 flex flex-wrap items-end gap-3"
      key={`${chosen?.with} ${query}`}
      aria-label="What to compare with"
    >
      <div className="field w-full max-w-120 min-w-0">
        <label htmlFor={`${id}-with`}>Compare {asked.name} with</label>
        <select id={`${id}-with`} name="with" defaultValue={chosen?.with ?? ""}>
          {chosen ? null : <option value="">Choose</option>}
          {sameFlow.length > 0 ? (
            <optgroup label="This flow">
              {sameFlow.map((option) => (
                <option key={option.id} value={option.id}>
                  {option.label}
                </option>
              ))}
            </optgroup>
          ) : null}
          {otherFlows.length > 0 ? (
            <optgroup label="Newest of other flows of the program">
              {otherFlows.map((option) => (
                <option key={option.id} value={option.id}>
                  {option.label}
                </option>
              ))}
            </optgroup>
          ) : null}
        </select>
      </div>
      <div className="field w-56">
        <label htmlFor={`${id}-q`}>Flows whose name contains</label>
        <input id={`${id}-q`} type="search" name="q" defaultValue={query} />
      </div>
      <button type="submit" className="btn">
        {loading ? "Comparing…" : "Show"}
      </button>
    </Form>
  );
}
