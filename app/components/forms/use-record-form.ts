import { useEffect } from "react";
import { parse, useForm, type DefaultValue, type SubmissionResult } from "@conform-to/react";
import { isEditedField, scriptsWereAtWork } from "./written-fields.ts";

/**
 * A form whose fields are checked on the server and whose lists grow and shrink in the browser. What the server found wrong is
 * shown beside the fields, and everything typed stays.
 */
export function useRecordForm<Values extends Record<string, unknown>>({
  lastResult,
  defaultValue,
  id,
}: {
  lastResult?: SubmissionResult<string[]> | null | undefined;
  defaultValue?: DefaultValue<Values>;
  id?: string;
}) {
  const made = useForm<Values>({
    id,
    lastResult,
    defaultValue,
    // Adding, moving and removing rows needs no server; values are left to it, so the schema stays out of the browser.
    onValidate: ({ formData }) => parse(formData, { resolve: (value) => ({ value: value as Values }) }),
    shouldValidate: "onSubmit",
    shouldRevalidate: "onSubmit",
  });
  const formId = made[0].id;
  useEffect(() => {
    const form = document.getElementById(formId);
    if (form instanceof HTMLFormElement) tellEarlierEdits(form);
  }, [formId]);
  return made;
}

/** What was typed before the scripts were at work, or put back by the browser, counts as typed: live figures and the guard of unsaved edits see it. */
function tellEarlierEdits(form: HTMLFormElement) {
  if (scriptsWereAtWork()) return;
  for (const element of form.elements)
    if (isEditedField(element)) element.dispatchEvent(new Event("input", { bubbles: true }));
}
