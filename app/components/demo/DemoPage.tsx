import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { DemoRemoved, DemoView } from "#app/schemas/demo.ts";
import { DemoGoes } from "./DemoGoes.tsx";
import { LoadDemo } from "./LoadDemo.tsx";
import { RemoveDemo, type TypedDemo } from "./RemoveDemo.tsx";

interface Props {
  view: DemoView;
  refused: (DemoRemoved & { outcome: "refused" }) | undefined;
  typed: TypedDemo | undefined;
}

/** The demo: loaded here where it is not, and where it is, what exactly goes when it is removed, and what stays. */
export function DemoPage({ view, refused, typed }: Props) {
  return (
    <>
      <PageHead title="The demo" remark={REMARKS[view.state]} />
      {refused && <Notice kind="error" title={refused.sentence} />}
      {view.state === "absent" && (
        <div className="max-w-160">
          <LoadDemo primary />
        </div>
      )}
      {view.state === "not yours" && (
        <EmptyState
          title="You may not remove the demo"
          actions={
            <Link to="/" className="btn">
              Back to Today
            </Link>
          }
        >
          The demo is on this site. Only somebody who is process owner of every one of its programs may remove it,
          because all of them go together. Ask a process owner of the others.
        </EmptyState>
      )}
      {view.state === "here" && (
        <div className="grid gap-x-12 gap-y-6 wide:grid-cols-[minmax(0,1fr)_384px]">
          <div className="min-w-0">
            <DemoGoes view={view} />
          </div>
          <RemoveDemo view={view} field={refused?.field} typed={typed} />
        </div>
      )}
    </>
  );
}

const REMARKS: Record<DemoView["state"], string> = {
  absent: "Not on this site",
  "not yours": "On this site",
  here: "On this site: nothing has been removed yet",
};
