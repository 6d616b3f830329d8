import { useState, type FormHTMLAttributes, type ReactNode } from "react";
import { Form, useSubmit } from "react-router";
import { newId, useOutbox } from "./use-floor-outbox.ts";

interface Props extends Pick<FormHTMLAttributes<HTMLFormElement>, "id" | "className" | "noValidate"> {
  /** where the form takes files */
  encType?: "multipart/form-data";
  action: string;
  /** what it says, in a few words, while it waits to be sent */
  words: string;
  /** where it leads once it was taken, or waits */
  next: string;
  children: ReactNode;
}

const keepsPages = () => "serviceWorker" in navigator && navigator.serviceWorker.controller !== null;

/**
 * A form of the floor. It is kept on the device before it is sent, and until the server has it, so that a lost connection loses nothing;
 * without scripts it is sent as any form is.
 */
export function FloorForm({ action, words, next, children, encType, ...rest }: Props) {
  const known = useOutbox();
  const submit = useSubmit();
  const [busy, setBusy] = useState(false);
  const send = async (form: FormData) => {
    const asForm = () => submit(form, { method: "post", action, ...(encType && { encType }) });
    if (!known || typeof indexedDB === "undefined") return asForm();
    const { outbox, person, lot } = known;
    setBusy(true);
    const asked = String(form.get("id") ?? "");
    const id = asked === "" || outbox.queued.some((entry) => entry.id === asked) ? newId() : asked;
    form.set("id", id);
    // A file field that was left empty comes as a file without name and content.
    const fields = [...form].filter(([, value]) => typeof value === "string" || value.size > 0);
    const at = new Date().toISOString();
    // A device whose store is full or broken keeps nothing: then it goes out as a form, which says whether it was taken.
    const outcome = await outbox.enter({ id, person, lot, words, at, fields, refused: null }).catch(() => null);
    if (outcome === null) {
      setBusy(false);
      return asForm();
    }
    const { pathname, search } = window.location;
    // What waits leads on too, so that it is not entered twice; without the pages that this device keeps there is nowhere to go.
    const goesOn = outcome === "stored" || (outcome === "waits" && next !== pathname + search && keepsPages());
    if (goesOn) return window.location.assign(next);
    setBusy(false);
    // Sent once more as a form of the page, which then says beside its fields what is wrong.
    if (outcome === "refused") await asForm();
  };
  return (
    <Form
      {...rest}
      // It leads nowhere that the page has not got, and the device may have no connection to ask.
      discover="none"
      method="post"
      encType={encType}
      action={action}
      aria-busy={busy}
      onSubmit={(event) => {
        event.preventDefault();
        if (!busy) void send(new FormData(event.currentTarget, (event.nativeEvent as SubmitEvent).submitter));
      }}
    >
      {/* What is pressed while an entry is on its way would be lost with the page that is left. */}
      <fieldset disabled={busy} className="contents">
        {children}
      </fieldset>
    </Form>
  );
}
