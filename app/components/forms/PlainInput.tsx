import { memo, type InputHTMLAttributes } from "react";

/**
 * An input that is left alone while nothing of it changes. Whatever React draws anew gets its name set again, which the form's library
 * takes for a changed form: it would read every field once more.
 */
export const PlainInput = memo(function PlainInput(props: InputHTMLAttributes<HTMLInputElement>) {
  return <input {...props} />;
});
