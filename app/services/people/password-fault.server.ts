import { MOST_PASSWORD, SHORTEST_PASSWORD } from "#app/lib/password-length.ts";

let common: Promise<ReadonlySet<string>> | undefined;

/** Some 49,000 passwords that are tried first, read from the package once. */
function commonPasswords(): Promise<ReadonlySet<string>> {
  common ??= import("@zxcvbn-ts/language-common").then(
    ({ dictionary }) => new Set(dictionary["passwords-common"].map((word) => word.toLowerCase())),
  );
  return common;
}

/** The shortest piece that a text repeats, or the whole text. */
function repeated(text: string): string {
  const again = (text + text).indexOf(text, 1);
  return text.slice(0, again);
}

/**
 * What is wrong with a password, as a sentence; null where it can be used. Length counts and no composition is asked for; what is
 * guessed first is refused: common passwords, a common one or a few characters over and over, the person's own address or name.
 */
export async function passwordFault(
  password: string,
  { email, name }: { email: string; name: string },
): Promise<string | null> {
  const length = [...password].length;
  if (length < SHORTEST_PASSWORD) return `Use ${SHORTEST_PASSWORD} characters or more; several words are fine.`;
  if (length > MOST_PASSWORD) return `Keep it under ${MOST_PASSWORD + 1} characters.`;
  const typed = password.toLowerCase();
  const piece = repeated(typed);
  const known = await commonPasswords();
  if (known.has(typed) || known.has(piece) || piece.length <= 4)
    return "This password is one of those that are guessed first. Choose another.";
  const own = [email, name, email.split("@")[0] ?? ""].map((word) => word.toLowerCase());
  if (own.some((word) => word !== "" && (typed === word || piece === word || typed === word.replaceAll(" ", ""))))
    return "Do not use your own address or name. Choose another.";
  return null;
}
