const ENTITIES: Record<string, string> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;", "'": "&#39;" };

/** Markup that is safe as it stands. */
export class Markup {
  readonly text: string;
  constructor(text: string) {
    this.text = text;
  }
}

type Part = string | number | Markup | null | readonly Markup[];

const written = (part: Part): string => {
  if (part === null) return "";
  if (part instanceof Markup) return part.text;
  if (typeof part === "object") return part.map(({ text }) => text).join("");
  return String(part).replace(/[&<>"']/g, (character) => ENTITIES[character] ?? "");
};

/** Markup with every value in it escaped, but for what is markup already. */
export function html(strings: TemplateStringsArray, ...parts: readonly Part[]): Markup {
  return new Markup(strings.map((text, index) => text + written(parts[index] ?? null)).join(""));
}
