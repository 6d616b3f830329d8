import { useEffect } from "react";
import { parse, useForm, type DefaultValue, type SubmissionResult } from "@conform-to/react";

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
  for (const element of form.elements)
    if (isEdited(element)) element.dispatchEvent(new Event("input", { bubbles: true }));
}

function isEdited(element: Element): boolean {
  if (element instanceof HTMLSelectElement) {
    const written = [...element.options].filter(({ defaultSelected }) => defaultSelected);
    // Where the page's text chose none, a browser chooses the first.
    return written.length > 0 ? !written.every(({ selected }) => selected) : element.selectedIndex > 0;
  }
  if (element instanceof HTMLTextAreaElement) return element.value !== element.defaultValue;
  if (!(element instanceof HTMLInputElement)) return false;
  return element.type === "checkbox" || element.type === "radio"
    ? element.checked !== element.defaultChecked
    : element.value !== element.defaultValue;
}
