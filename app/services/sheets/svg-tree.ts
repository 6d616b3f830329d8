import { onPaper } from "#app/lib/paper-tokens.ts";

/** An element of a drawing, or a text in it. */
export interface SvgNode {
  name: string;
  attributes: Record<string, string>;
  children: (SvgNode | string)[];
}

const TAG = /<(\/?)([a-zA-Z]+)((?:\s+[-:a-zA-Z]+="[^"]*")*)\s*(\/?)>|([^<]+)/g;
const ATTRIBUTE = /([-:a-zA-Z]+)="([^"]*)"/g;

const ENTITIES: Record<string, string> = { amp: "&", lt: "<", gt: ">", quot: '"', "#x27": "'" };

const plain = (text: string) => text.replace(/&(amp|lt|gt|quot|#x27);/g, (_, name: string) => ENTITIES[name] ?? "");

/**
 * The tree of a drawing from the markup that React makes of it, which is all that this reads.
 * @throws Error for markup that is not one whole element
 */
export function svgTree(markup: string): SvgNode {
  const top: SvgNode = { name: "", attributes: {}, children: [] };
  const open = [top];
  for (const [, closing, name, attributes = "", empty, text] of markup.matchAll(TAG)) {
    const parent = open.at(-1);
    if (!parent) throw new Error("a drawing closes more than it opens");
    if (text !== undefined) parent.children.push(plain(text));
    else if (closing) open.pop();
    else if (name) {
      const node: SvgNode = { name, attributes: read(attributes), children: [] };
      parent.children.push(node);
      if (!empty) open.push(node);
    }
  }
  const [root] = top.children;
  if (typeof root !== "object" || open.length !== 1) throw new Error("a drawing is one whole element");
  return root;
}

function read(attributes: string): Record<string, string> {
  return Object.fromEntries(
    [...attributes.matchAll(ATTRIBUTE)].map(([, name = "", value = ""]) => [name, plain(value)]),
  );
}

const VARIABLE = /^var\(--([a-z-]+)\)$/;

/** Attributes of an element with those of its style, tokens as they are on paper, lengths without px. */
export function attributesOf({ attributes }: SvgNode): Record<string, string> {
  const { style = "", ...own } = attributes;
  const styled = style.split(";").flatMap((rule) => {
    const colon = rule.indexOf(":");
    return colon < 0 ? [] : [[rule.slice(0, colon).trim(), rule.slice(colon + 1).trim()]];
  });
  const all = Object.entries({ ...own, ...(Object.fromEntries(styled) as Record<string, string>) });
  return Object.fromEntries(all.map(([name, value]) => [name, inked(value)]));
}

function inked(value: string): string {
  const token = VARIABLE.exec(value)?.[1];
  if (token !== undefined) return onPaper(token);
  return value === "currentColor" ? onPaper("ink") : value.replace(/^([\d.]+)px$/, "$1");
}
