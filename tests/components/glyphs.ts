import { readFileSync } from "node:fs";

export const STYLES = readFileSync(new URL("../../app/app.css", import.meta.url), "utf8");

/** The code points for which the style sheet declares a face. */
export function shippedRanges(): [from: number, to: number][] {
  const lists = [...STYLES.matchAll(/unicode-range:\s*([^;]+);/g)].map((match) => match[1] ?? "");
  return lists.flatMap((list) =>
    list.split(",").map((range): [number, number] => {
      const [from = "0", to = from] = range.trim().replace("U+", "").split("-");
      return [parseInt(from, 16), parseInt(to, 16)];
    }),
  );
}

/** The characters of some markup for which no font is shipped. */
export function strangeCharacters(markup: string): string[] {
  const ranges = shippedRanges();
  return [...markup].filter((character) => {
    const point = character.codePointAt(0) ?? 0;
    return !ranges.some(([from, to]) => point >= from && point <= to);
  });
}
