import type { ReactNode } from "react";
import { Link } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { PropertyTable, type Property } from "#app/components/ui/PropertyTable.tsx";
import type { LibraryUse } from "#app/schemas/library-records.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import { Facts, type Fact } from "./Facts.tsx";
import { UsedIn } from "./UsedIn.tsx";

/** What a kind of library record shows of itself. */
export interface RecordView {
  /** what it means for the work, in one sentence; a second one says why */
  answer?: string;
  because?: string;
  properties: Property[];
  facts: Fact[];
}

interface Props {
  record: { name: string; note: string };
  stamp: RecordStamp;
  mayEdit: boolean;
  uses: LibraryUse[];
  crumbs: { name: string; path: string }[];
  view: RecordView;
  /** what the kind shows below its answer: a calculation, a scale */
  children?: ReactNode;
  /** a drawing 464 px wide that stands at the side */
  drawing?: ReactNode;
}

const WITH_DRAWING = "wide:grid-cols-[minmax(0,1fr)_512px]";
const BESIDE_DRAWING = "tablet:max-wide:flex tablet:max-wide:gap-6";
const WITHOUT_DRAWING = "wide:grid-cols-[minmax(0,1fr)_384px]";

/** A record of the library: what it means first, then every property with its source, then where it is used. */
export function LibraryDetail({ record, stamp, mayEdit, uses, crumbs, view, children, drawing }: Props) {
  const { answer, because, properties, facts } = view;
  const about = facts.length > 0 && (
    <section aria-labelledby="about">
      <h2 id="about" className="font-semibold">
        About it
      </h2>
      <Facts facts={facts} />
    </section>
  );
  return (
    <>
      <PageHead
        title={record.name}
        crumbs={crumbs}
        remark={`Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
        actions={
          mayEdit && (
            <Link to="edit" className="btn btn-primary">
              Change
            </Link>
          )
        }
      />
      <div className={`frame grid grid-cols-1 wide:grid-rows-[auto_1fr] ${drawing ? WITH_DRAWING : WITHOUT_DRAWING}`}>
        <div className="border-b border-ink">
          {answer && (
            <div className="p-4 tablet:p-6">
              <p className="max-w-[44em] text-figure font-medium text-pretty">{noBreak(answer)}</p>
              {because && <p className="mt-1 max-w-[60em] text-quiet">{noBreak(because)}</p>}
            </div>
          )}
          {children}
        </div>
        <div
          className={`space-y-6 border-ink p-4 max-wide:border-b tablet:p-6 wide:row-span-2 wide:border-l ${drawing ? BESIDE_DRAWING : ""}`}
        >
          {drawing}
          {!drawing && about}
          <UsedIn uses={uses} />
        </div>
        <div className="space-y-6 p-4 tablet:p-6">
          <div>
            <h2 className="font-semibold">Properties</h2>
            <PropertyTable caption="Properties" properties={properties} />
            {record.note && <p className="mt-4 max-w-[60em] whitespace-pre-line">{record.note}</p>}
          </div>
          {drawing && about}
        </div>
      </div>
    </>
  );
}
