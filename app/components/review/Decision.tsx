import { getInputProps, type FieldMetadata } from "@conform-to/react";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { ProofFields } from "#app/components/people/ProofFields.tsx";
import type { Proof, ProofFault } from "#app/schemas/proof.ts";
import type { ReviewRevision, ReviewView } from "#app/schemas/review-view.ts";
import { ReviewForm, type ReviewAnswer } from "./ReviewForm.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";

interface Props {
  view: ReviewView;
  revision: ReviewRevision;
  answer: ReviewAnswer;
}

/** The decision: what stands in the way of a release for this reader, releasing, and returning. */
export function Decision({ view: { may, assumed, proofAsked }, revision: { obstacles, askedBy }, answer }: Props) {
  return (
    <>
      <HungSection title="Release">
        {obstacles.length > 0 && (
          <>
            <p className="font-medium">It cannot be released {may.release ? "by you" : "as it is"}:</p>
            <ul className="mt-1 list-disc pl-5">
              {obstacles.map(({ what, remedy }) => (
                <li key={what}>
                  {what} <span className="text-quiet">{remedy}</span>
                </li>
              ))}
            </ul>
          </>
        )}
        {!may.release && <p className="mt-1">A process owner of the program releases it, other than {askedBy}.</p>}
        {may.release && obstacles.length === 0 && (
          <>
            <p>
              The sheet gets its revision letter and is frozen as it is now. The released revision before it, if there
              is one, is superseded in the same moment, and everybody of the program is told.
            </p>
            <ReviewForm
              intent="release"
              answer={answer}
              button="Release the sheet"
              busy="Releasing: the papers are being set"
              primary
            >
              {({ assumptions, remark, proof, proofCode }) => (
                <>
                  <div className="field">
                    <label className="mb-0 flex min-h-8 items-center gap-2 text-body text-ink">
                      <input
                        {...getInputProps(assumptions, { type: "checkbox", value: "checked" })}
                        key={assumptions.key}
                        aria-describedby={assumptions.errors ? assumptions.errorId : undefined}
                        className="size-4 accent-ink"
                      />
                      <span>
                        {assumed.length === 0
                          ? "I have seen that nothing is assumed"
                          : `I have been through the ${assumed.length === 1 ? "assumption" : `${assumed.length} assumptions`}`}
                      </span>
                    </label>
                    {assumptions.errors && <small id={assumptions.errorId}>{assumptions.errors[0]}</small>}
                  </div>
                  <NoteField field={remark} label="Remark" rows={2} hint="May stay empty." />
                  <ProofFields asked={proofAsked} fault={faultIn({ proof, proofCode })} />
                </>
              )}
            </ReviewForm>
          </>
        )}
      </HungSection>
      {may.return && (
        <HungSection title="Return">
          <ReviewForm intent="return" answer={answer} button="Return it" busy="Returning">
            {({ reason }) => <NoteField field={reason} label="Why it goes back" />}
          </ReviewForm>
        </HungSection>
      )}
    </>
  );
}

function faultIn(fields: Record<keyof Proof, FieldMetadata<string>>): ProofFault | undefined {
  for (const field of ["proof", "proofCode"] as const) {
    const sentence = fields[field].errors?.[0];
    if (sentence !== undefined) return { field, sentence };
  }
  return undefined;
}
