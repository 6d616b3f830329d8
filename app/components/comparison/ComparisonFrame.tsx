import type { ReactNode } from "react";
import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { count } from "#app/lib/count-words.ts";
import { comparisonSearch, MOST_COMPARED } from "#app/lib/comparison/asked.ts";
import { comparisonPath, type ComparedKind } from "#app/lib/comparison/kinds.ts";
import type { Plot } from "#app/components/drawings/plot.ts";
import type { ComparisonView } from "#app/schemas/comparison.ts";
import { AddToComparison } from "./AddToComparison.tsx";
import { ChosenMembers } from "./ChosenMembers.tsx";
import { ExportLinks } from "./ExportLinks.tsx";

interface Props {
  kind: ComparedKind;
  view: ComparisonView<object>;
  /** what its lines are drawn in; null while nothing is compared */
  plot: Plot | null;
  /** that it cannot be compared although enough are chosen, and why */
  barred?: ReactNode;
  /** what is compared, null while nothing is */
  children: ReactNode;
}

/** The page of a comparison: what is chosen and what may be added, then what is compared or why nothing is. */
export function ComparisonFrame({ kind, view, plot, barred = null, children }: Props) {
  const { asked, missing, members, choices, compared } = view;
  const { one, many, path } = kind;
  const tooMany = members.length > MOST_COMPARED;
  const capital = `${many.charAt(0).toUpperCase()}${many.slice(1)}`;
  return (
    <>
      <PageHead
        title={`Compare ${many}`}
        crumbs={[{ name: capital, path }]}
        actions={
          compared && (
            <ExportLinks
              page={comparisonPath(kind)}
              search={comparisonSearch({ ...asked, query: "" })}
              picture={`comparison-of-${many}`}
            />
          )
        }
      />
      {missing > 0 ? (
        <Notice kind="caution" title={missing === 1 ? `No such ${one}` : `No such ${one}, ${count(missing)} times`}>
          What you asked for is not there, or belongs to a program that is not yours. The others are compared.
        </Notice>
      ) : null}
      {tooMany ? (
        <Notice kind="error" title={`${members.length} ${many} are too many to compare`}>
          Six lines and columns can still be told apart. Remove {count(members.length - MOST_COMPARED)} below.
        </Notice>
      ) : null}
      {barred}
      <div className="frame mb-4 max-tablet:-mx-4 max-tablet:border-x-0">
        <ChosenMembers kind={kind} asked={asked} members={members} plot={plot} />
        <AddToComparison kind={kind} asked={asked} choices={choices} chosen={members.length} />
      </div>
      {compared ? (
        children
      ) : tooMany ? null : (
        <EmptyState
          title={members.length === 0 ? "Nothing to compare yet" : `One ${one} has nothing to be compared with`}
          actions={
            <Link to={path} className="btn">
              Choose from the list of {many}
            </Link>
          }
        >
          Add {members.length === 0 ? `two ${many} or more` : `another ${one}`} above, or tick two to six in the list of{" "}
          {many}. Their curves, what differs between them and what moves their warp then stand here side by side.
        </EmptyState>
      )}
    </>
  );
}
