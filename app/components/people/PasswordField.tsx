import { useId, useState } from "react";
import { SHORTEST_PASSWORD } from "#app/lib/password-length.ts";

interface Props {
  name: string;
  label: string;
  error?: string | undefined;
  /** a new password, not one that is known */
  fresh?: boolean;
  hint?: string;
}

/** A field for a password, which may be pasted and looked at. */
export function PasswordField({ name, label, error, fresh = false, hint }: Props) {
  const id = useId();
  const [shown, setShown] = useState(false);
  const expected = hint ?? (fresh ? `${SHORTEST_PASSWORD} characters or more; several words are fine.` : "");
  return (
    <div className="field">
      <label htmlFor={id}>{label}</label>
      <div className="flex items-center gap-2">
        <input
          id={id}
          name={name}
          type={shown ? "text" : "password"}
          autoComplete={fresh ? "new-password" : "current-password"}
          required
          autoCapitalize="none"
          spellCheck={false}
          aria-invalid={error ? true : undefined}
          aria-describedby={`${id}-note`}
        />
        <button
          type="button"
          className="btn scriptless:hidden"
          aria-pressed={shown}
          aria-label={`Show: ${label}`}
          onClick={() => setShown(!shown)}
        >
          {shown ? "Hide" : "Show"}
        </button>
      </div>
      <small id={`${id}-note`}>{error ?? expected}</small>
    </div>
  );
}
