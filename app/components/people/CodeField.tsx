import { TextField } from "#app/components/ui/TextField.tsx";

interface Props {
  name: string;
  label: string;
  error?: string | undefined;
  /** digits alone, where a recovery code is not taken */
  digits?: boolean;
}

/** A field for a one-time code, which an app or the browser may fill in. */
export function CodeField({ name, label, error, digits = false }: Props) {
  return (
    <TextField
      name={name}
      label={label}
      autoComplete="one-time-code"
      autoCapitalize="none"
      spellCheck={false}
      inputMode={digits ? "numeric" : "text"}
      required
      hint={digits ? "Six digits, from your app." : "Six digits from your app, or a recovery code."}
      error={error}
    />
  );
}
