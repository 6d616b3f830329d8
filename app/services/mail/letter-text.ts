import type { Letter, LetterPart } from "./letter.ts";

/** Longest line of a mail as text, characters; words that are longer, such as addresses, stay whole. */
const WIDTH = 72;

/** A letter as plain text, readable where no HTML is shown. */
export function letterText({ parts, opening, foot }: Letter): string {
  const blocks = [
    "Planeward",
    ...(opening === null ? [] : [wrapped(opening)]),
    ...parts.map(partText),
    [wrapped(foot.why), ...foot.links.map(({ words, address }) => `${words}:\n${address}`)].join("\n\n"),
  ];
  return `${blocks.join("\n\n----\n\n")}\n`;
}

function partText({ heading, sentence, facts, said, mind, link }: LetterPart): string {
  const width = Math.max(...facts.map(({ label }) => label.length));
  const lines = said?.lines.map((line) => wrapped(line, "  ")) ?? [];
  return [
    wrapped(heading),
    wrapped(sentence),
    facts.map(({ label, value }) => `${`${label}:`.padEnd(width + 2)}${value}`).join("\n"),
    ...(said ? [`${said.heading}:\n${lines.join("\n")}`] : []),
    ...(mind === null ? [] : [wrapped(mind)]),
    `${link.words}:\n${link.address}`,
  ].join("\n\n");
}

function wrapped(text: string, indent = ""): string {
  const lines: string[] = [];
  let line = "";
  for (const word of text.split(" ")) {
    if (line !== "" && indent.length + line.length + 1 + word.length > WIDTH) {
      lines.push(line);
      line = word;
    } else line = line === "" ? word : `${line} ${word}`;
  }
  return [...lines, line].map((each) => indent + each).join("\n");
}
