import { Form, Link } from "react-router";
import { Choices } from "#app/components/forms/Choices.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import type { Paper } from "#app/lib/paper-size.ts";
import { PRINT_YEARS, type PrintRetention } from "#app/schemas/print-retention.ts";
import type { Role } from "#app/policies/roles.ts";
import type { ProofAsked, ProofFault } from "#app/schemas/proof.ts";
import type { RecordStamp } from "#app/schemas/record-stamp.ts";
import { CodesRequired } from "./CodesRequired.tsx";

const PAPER_WORDS: Record<Paper, string> = { a4: "A4, 210 × 297 mm", letter: "Letter, 8.5 × 11 inches" };

interface Props {
  paper: Paper;
  stamp: RecordStamp;
  retention: readonly PrintRetention[];
  codesFor: readonly Role[];
  proofAsked: ProofAsked;
  /** what was ticked and what was wrong in the form of the codes */
  codes: { ticked: string[]; fault: ProofFault } | undefined;
  saved: boolean;
  /** what somebody else has saved in the meantime, and what this person had chosen */
  refused: { reason: string; version: number; chosen: Paper } | undefined;
}

/** What holds for the whole site. */
export function SiteSettingsPage({ paper, stamp, retention, codesFor, proofAsked, codes, saved, refused }: Props) {
  const { version, updatedAt, updatedBy } = stamp;
  return (
    <>
      <PageHead
        title="Site settings"
        remark="For everybody on this site"
        actions={
          <Link to="/audit" className="btn">
            Audit trail
          </Link>
        }
      />
      {refused && (
        <Notice kind="error" title="Not saved: somebody else saved first">
          {refused.reason}
        </Notice>
      )}
      {saved && !refused && !codes && <Notice kind="done" title="The site’s settings are saved." />}
      {/* A new version of the settings is a new form, or a choice made before would stay in it. */}
      <Form key={`${refused?.version ?? version} ${paper}`} method="post" className="frame max-w-160">
        <input type="hidden" name="version" value={refused?.version ?? version} />
        <Choices title="Paper" name="paper" words={PAPER_WORDS} chosen={refused?.chosen ?? paper}>
          What handling-risk sheets and other printed pages are laid out for, and their PDF. Each such page can still be
          opened for the other paper.
        </Choices>
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2 p-4 tablet:px-6">
          <SubmitButton busy="Saving">Save settings</SubmitButton>
          <span className="text-quiet">
            Last changed {updatedAt.slice(0, 10)}, {updatedBy}
          </span>
        </div>
      </Form>
      <PrintsKept retention={retention} />
      <CodesRequired codesFor={codesFor} ticked={codes?.ticked} proofAsked={proofAsked} fault={codes?.fault} />
    </>
  );
}

const YEARS = PRINT_YEARS.map((years) => ({ value: years, label: years === "1" ? "1 year" : `${years} years` }));

/** How long each program keeps who took a sheet out to print, when and for which place. */
function PrintsKept({ retention }: Pick<Props, "retention">) {
  return (
    <section className="mt-8" aria-labelledby="prints">
      <h2 id="prints" className="font-semibold">
        Who printed sheets
      </h2>
      <p className="mb-3 max-w-160 text-quiet">
        The list of prints names people and places. What is older than this goes every night; the audit trail keeps how
        many went. The sheets themselves are kept for good.
      </p>
      {retention.length === 0 ? (
        <p className="text-quiet">There is no program yet.</p>
      ) : (
        <Form method="post" className="frame max-w-160">
          <input type="hidden" name="intent" value="prints" />
          <div className="grid gap-3 p-4 tablet:grid-cols-2 tablet:px-6">
            {retention.map(({ id, name, years }, index) => (
              <div key={id}>
                <input type="hidden" name={`kept[${index}].program`} value={id} />
                <SelectField
                  name={`kept[${index}].years`}
                  label={name}
                  options={YEARS}
                  blank="For good"
                  defaultValue={years === null ? "" : String(years)}
                />
              </div>
            ))}
          </div>
          <div className="border-t border-line p-4 tablet:px-6">
            <SubmitButton busy="Saving">Save how long prints are kept</SubmitButton>
          </div>
        </Form>
      )}
    </section>
  );
}
