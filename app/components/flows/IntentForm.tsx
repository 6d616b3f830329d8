import type { ReactNode } from "react";
import { Form, useNavigation } from "react-router";

interface Props {
  intent: string;
  /** what the button says while it is on its way */
  busy: string;
  className: string;
  action?: string;
  /** what else is sent along */
  fields?: Record<string, string>;
  children: ReactNode;
}

/** One thing that can be done to a flow, as a form of its own. */
export function IntentForm({ intent, busy, className, action, fields = {}, children }: Props) {
  const { formData, state } = useNavigation();
  const waiting = state !== "idle" && formData?.get("intent") === intent;
  return (
    <Form method="post" action={action}>
      {Object.entries(fields).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <button type="submit" name="intent" value={intent} className={className} disabled={waiting}>
        {waiting ? busy : children}
      </button>
    </Form>
  );
}
