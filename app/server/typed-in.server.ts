const HIDDEN = new Set(["proof", "proofCode", "password"]);

/** What was typed into a form, to be shown again; passwords are left out. */
export function typedIn(formData: FormData): Record<string, string> {
  return Object.fromEntries(
    [...formData].flatMap(([name, value]) => (typeof value === "string" && !HIDDEN.has(name) ? [[name, value]] : [])),
  );
}
