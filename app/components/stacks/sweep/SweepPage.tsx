import { PageHead } from "#app/components/layout/PageHead.tsx";
import { ExportLinks } from "#app/components/comparison/ExportLinks.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { sweepSearch } from "#app/lib/stack-sweep/asked.ts";
import type { SweepView } from "#app/schemas/stack-sweep.ts";
import { SweepForm } from "./SweepForm.tsx";
import { Swept } from "./Swept.tsx";

/** One stack with one or two of its inputs moved over a range: what it does there, and where that meets a limit. */
export function SweepPage({ view }: { view: SweepView }) {
  const { stack, asked, faults, swept } = view;
  return (
    <>
      <PageHead
        title="Sweep"
        crumbs={[
          { name: "Stacks", path: "/stacks" },
          { name: stack.name, path: `/stacks/${stack.id}` },
        ]}
        remark={stack.program}
        actions={
          swept && (
            <ExportLinks page={`/stacks/${stack.id}/sweep`} search={sweepSearch(asked)} picture="sweep-of-a-stack" />
          )
        }
      />
      {swept ? null : (
        <Notice kind="error" title="Nothing is drawn">
          {faults.whole ??
            "Something below is not right: it is marked where it stands, and nothing that you typed is lost."}
        </Notice>
      )}
      <article className="frame max-tablet:-mx-4 max-tablet:border-x-0">
        <SweepForm view={view} />
        {swept ? <Swept swept={swept} /> : null}
      </article>
    </>
  );
}
