import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { count } from "#app/lib/count-words.ts";
import { comparisonSearch, MOST_STACKS } from "#app/lib/stack-comparison/asked.ts";
import type { ComparisonView } from "#app/schemas/stack-comparison.ts";
import { AddStack } from "./AddStack.tsx";
import { ChosenStacks } from "./ChosenStacks.tsx";
import { Compared } from "./Compared.tsx";
import { ExportLinks } from "./ExportLinks.tsx";

/** Stacks side by side: which, over what, and everything that differs. */
export function ComparePage({ view }: { view: ComparisonView }) {
  const { asked, missing, stacks, choices, compared } = view;
  const tooMany = stacks.length > MOST_STACKS;
  return (
    <>
      <PageHead
        title="Compare stacks"
        crumbs={[{ name: "Stacks", path: "/stacks" }]}
        actions={
          compared && (
            <ExportLinks
              page="/stacks/compare"
              search={comparisonSearch({ ...asked, query: "" })}
              picture="comparison-of-stacks"
            />
          )
        }
      />
      {missing > 0 ? (
        <Notice kind="caution" title={missing === 1 ? "No such stack" : `No such stack, ${count(missing)} times`}>
          What you asked for is not there, or belongs to a program that is not yours. The others are compared.
        </Notice>
      ) : null}
      {tooMany ? (
        <Notice kind="error" title={`${stacks.length} stacks are too many to compare`}>
          Six lines and columns can still be told apart. Remove {count(stacks.length - MOST_STACKS)} below.
        </Notice>
      ) : null}
      <div className="frame mb-4 max-tablet:-mx-4 max-tablet:border-x-0">
        <ChosenStacks asked={asked} stacks={stacks} chart={compared?.chart ?? null} />
        <AddStack asked={asked} choices={choices} chosen={stacks.length} />
      </div>
      {compared ? (
        <Compared view={view} compared={compared} />
      ) : tooMany ? null : (
        <EmptyState
          title={stacks.length === 0 ? "Nothing to compare yet" : "One stack has nothing to be compared with"}
          actions={
            <Link to="/stacks" className="btn">
              Choose from the list of stacks
            </Link>
          }
        >
          Add {stacks.length === 0 ? "two stacks or more" : "another stack"} above, or tick two to six in the list of
          stacks. Their curves, what differs between them and what moves their warp then stand here side by side.
        </EmptyState>
      )}
    </>
  );
}
