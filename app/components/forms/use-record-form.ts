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
  return useForm<Values>({
    id,
    lastResult,
    defaultValue,
    // Adding, moving and removing rows needs no server; values are left to it, so the schema stays out of the browser.
    onValidate: ({ formData }) => parse(formData, { resolve: (value) => ({ value: value as Values }) }),
    shouldValidate: "onSubmit",
    shouldRevalidate: "onSubmit",
  });
}
