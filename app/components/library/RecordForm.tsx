import { getFormProps, type FormMetadata, type SubmissionResult } from "@conform-to/react";
import { useEffect, useRef, type ReactNode } from "react";
import { Form, Link } from "react-router";
import { ConflictTable } from "#app/components/forms/ConflictTable.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import type { RecordConflict } from "#app/lib/record-conflict.ts";

/** What the form of a library record is given by its page. */
export interface RecordFormProps<Row> {
  /** null for a new one */
  record: Row | null;
  version: number | null;
  lastResult: SubmissionResult<string[]> | null | undefined;
  /** what somebody else has saved meanwhile, where it can be said property by property */
  conflict?: RecordConflict | null | undefined;
  /** where leaving leads */
  back: string;
}

interface Props<Values extends Record<string, unknown>> extends Omit<RecordFormProps<unknown>, "record"> {
  form: FormMetadata<Values>;
  /** 'carrier': what is saved */
  what: string;
  children: ReactNode;
}

/** The frame of a library record's form: what is wrong on top, the fields, and the way out. */
export function RecordForm<Values extends Record<string, unknown>>(props: Props<Values>) {
  const { form, what, version, lastResult, conflict, back, children } = props;
  const top = useRef<HTMLDivElement>(null);
  // Whoever pressed 'save' stands at the foot of a long form.
  useEffect(() => {
    if (conflict) top.current?.focus();
  }, [conflict]);
  return (
    <Form method="post" {...getFormProps(form)} className="frame max-w-260 space-y-4 p-4 tablet:p-6">
      {lastResult && (
        <div ref={top} tabIndex={-1}>
          <FormHead lastResult={lastResult} />
          {conflict && conflict.rows.length > 0 && (
            <ConflictTable rows={conflict.rows} saved={`Saved by ${conflict.by}`} />
          )}
        </div>
      )}
      {version !== null && <input type="hidden" name="version" value={version} />}
      {children}
      <div className="flex flex-wrap gap-2 border-t border-line pt-4">
        <SubmitButton busy="Saving">{`Save ${what}`}</SubmitButton>
        <Link to={back} className="btn">
          Leave without saving
        </Link>
      </div>
    </Form>
  );
}
