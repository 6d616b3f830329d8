import { useId, type ReactNode } from "react";
import { Form, useSearchParams } from "react-router";
import { SavedFilters } from "./SavedFilters.tsx";

interface Filter {
  name: string;
  label: string;
  options: { value: string; label: string }[];
}

/** Search and filters of a list, a form that puts them into the address, and those that its reader has kept. */
export function ListHead({ what, filters = [], children }: { what: string; filters?: Filter[]; children?: ReactNode }) {
  const [search] = useSearchParams();
  const id = useId();
  return (
    <div className="screen-only mb-4 space-y-2">
      <Form method="get" role="search" className="flex flex-wrap items-end gap-3" key={search.toString()}>
        <div className="field w-64">
          <label htmlFor={id}>Search {what}</label>
          <input id={id} type="search" name="q" defaultValue={search.get("q") ?? ""} />
        </div>
        {filters.map(({ name, label, options }) => (
          <div className="field" key={name}>
            <label htmlFor={`${id}-${name}`}>{label}</label>
            <select id={`${id}-${name}`} name={name} defaultValue={search.get(name) ?? ""}>
              <option value="">Any</option>
              {options.map((option) => (
                <option key={option.value} value={option.value}>
                  {option.label}
                </option>
              ))}
            </select>
          </div>
        ))}
        {search.get("sort") && <input type="hidden" name="sort" value={search.get("sort") ?? ""} />}
        <button type="submit" className="btn">
          Show
        </button>
        {children}
      </Form>
      <SavedFilters />
    </div>
  );
}
