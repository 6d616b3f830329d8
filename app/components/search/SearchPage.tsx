import { Form, Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { TodaySection } from "#app/components/today/TodaySection.tsx";
import { countFound, nothingFound } from "#app/lib/search-words.ts";
import type { FoundGroup, SearchAnswer } from "#app/schemas/search.ts";

/** What a search finds, kind by kind. The palette shows the same where there are scripts. */
export function SearchPage({ answer }: { answer: SearchAnswer }) {
  const { query, groups, total } = answer;
  return (
    <>
      <PageHead title="Search" remark={query === "" ? undefined : countFound(total)} />
      <Form method="get" role="search" className="mb-6 flex flex-wrap items-end gap-3" key={query}>
        <div className="field w-full max-w-120">
          <label htmlFor="search-all">Name or number of anything that you may open</label>
          <input id="search-all" type="search" name="q" defaultValue={query} maxLength={100} autoFocus />
        </div>
        <button type="submit" className="btn btn-primary">
          Search
        </button>
      </Form>
      {groups.map((group) => (
        <FoundSection key={group.kind} group={group} />
      ))}
      {groups.length === 0 && (
        <EmptyState title={query === "" ? "What are you looking for?" : nothingFound(query)}>
          {query === ""
            ? "Type a part of a name: a flow, a step, a film, a wafer, the number of an assessment, a word of the method page."
            : "Try fewer letters, or one word alone. What lies in programs that are not yours is not found."}
        </EmptyState>
      )}
    </>
  );
}

function FoundSection({ group: { title, rows, total, list } }: { group: FoundGroup }) {
  return (
    <TodaySection title={title} remark={rows.length < total ? `${rows.length} of ${total}` : undefined}>
      <ul>
        {rows.map(({ key, name, about, path }) => (
          <li key={key} className="border-t border-line py-2 first:border-0 first:pt-0">
            <Link to={path} className="link">
              {name}
            </Link>{" "}
            <span className="text-quiet">{about}</span>
          </li>
        ))}
      </ul>
      {list && (
        <p className="border-t border-line pt-2">
          <Link to={list} className="link">
            All {total} in the list
          </Link>
        </p>
      )}
    </TodaySection>
  );
}
