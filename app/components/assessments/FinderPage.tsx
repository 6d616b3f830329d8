import { Link, useNavigation, useSearchParams } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { legQuery, trialHome } from "#app/lib/leg-query.ts";
import type { ListPage } from "#app/lib/list-params.ts";
import type { FinderPageData, FinderRow } from "#app/schemas/finder.ts";
import { finderColumns } from "./finder-columns.tsx";
import { FinderForm } from "./FinderForm.tsx";
import { TrialBarred } from "./TrialBarred.tsx";
import { TrialLeg } from "./TrialLeg.tsx";

interface Props {
  found: FinderPageData;
  /** null when today's engine cannot compute the inputs */
  page: ListPage<FinderRow> | null;
}

/** Every carrier and bonding material tried in a flow: what fits, by margin, and why the others do not. */
export function FinderPage({ found, page }: Props) {
  const { head, bonds, tried, fits } = found;
  const [search] = useSearchParams();
  const trying = useNavigation().state === "loading";
  const back = (
    <Link to={trialHome(head)} className="btn">
      Back to the assessment
    </Link>
  );
  return (
    <>
      <PageHead
        title="Carriers and bonds"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: head.flow.name, path: `/flows/${head.flow.id}` },
          { name: `Assessment ${head.revision}`, path: trialHome(head) },
        ]}
        remark={tried > 0 ? `${tried} tried, ${fits === 1 ? "1 fits" : `${fits} fit`}` : ""}
        actions={
          tried > 0 ? (
            <a href={`/assessments/${head.id}/carriers.csv?${search.toString()}`} className="btn" download>
              Save as CSV
            </a>
          ) : undefined
        }
      />
      <TrialBarred head={head} />
      <TrialLeg head={head} />
      {page === null ? (
        <EmptyState title="This cannot be computed any more" actions={back}>
          The inputs of this assessment are refused by the engine of today. Run it again to see why.
        </EmptyState>
      ) : bonds.length === 0 ? (
        <EmptyState title="No bond in this flow" actions={back}>
          Carriers are tried in the place of a bond. Add a bond step and a debond to the flow and assess it again.
        </EmptyState>
      ) : tried === 0 ? (
        <EmptyState
          title="Nothing to try yet"
          actions={
            <Link to="/carriers" className="btn">
              Carriers & bonds
            </Link>
          }
        >
          The site has no carriers, or no bonding materials. A process owner adds them.
        </EmptyState>
      ) : (
        <>
          <FinderForm found={found} />
          <div aria-busy={trying}>
            {page.rows.length > 0 ? (
              <DataTable
                caption="Carriers and bonds, what fits first"
                columns={finderColumns(head)}
                page={page}
                rowKey={({ key }) => key}
              />
            ) : (
              <EmptyState
                title="None found"
                actions={
                  <Link to={`/assessments/${head.id}/carriers${legQuery("?", head.leg?.number)}`} className="btn">
                    Show all {tried}
                  </Link>
                }
              >
                {fits === 0 && search.get("fits") === "yes"
                  ? `None of the ${tried} tried fits the flow as it is. Those that get farthest come first in the whole list, with what bars them.`
                  : `None of the ${tried} tried is like that.`}
              </EmptyState>
            )}
          </div>
          <p className="mt-3 max-w-160 text-label text-quiet">
            Each is walked through the flow at nominal values, from the bond to the first step that bars it. Margin: the
            smallest share of any limit that is left, temperatures counted from 25&nbsp;°C; below zero is beyond it.
            Rules that no bond can change are not judged here.
          </p>
        </>
      )}
    </>
  );
}
