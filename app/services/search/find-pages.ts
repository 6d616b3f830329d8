import { EQUATIONS, type Equation } from "#app/engine/equations.ts";
import { DESCRIBED_RULES } from "#app/engine/rules/described-rules.ts";
import { matchRank } from "#app/lib/match-rank.ts";
import { METHOD_SECTIONS, termAnchor } from "#app/lib/method-sections.ts";
import { CONVENTIONS, GLOSSARY } from "#app/lib/method-words.ts";
import { pagesFor } from "#app/policies/places.ts";
import type { Actor } from "#app/policies/roles.ts";
import type { FoundRow } from "#app/schemas/search.ts";
import { SHOWN, type RankedGroup } from "./find-records.server.ts";

/** Something that stands on a page of everybody: a section, a rule, a word. */
interface Entry extends FoundRow {
  also?: string;
}

const onMethod = (anchor: string, name: string, about: string, also?: string): Entry => ({
  key: `method ${anchor}`,
  name,
  about,
  path: `/method#${anchor}`,
  also,
});

/** What the method page has an anchor for, without the limits of the site. */
const METHOD: readonly Entry[] = [
  ...METHOD_SECTIONS.map(({ id, title }) => onMethod(id, title, "Section of the method page")),
  ...DESCRIBED_RULES.map(({ number, title, asks }) =>
    onMethod(`rule-${number}`, title, `Handling rule ${number}`, `rule ${number} ${asks}`),
  ),
  ...Object.entries<Equation>(EQUATIONS).map(([id, { title }]) => onMethod(`equation-${id}`, title, "Equation")),
  ...CONVENTIONS.map(({ term, meaning }) => onMethod(termAnchor(term), term, "Signs and words", meaning)),
  ...GLOSSARY.map(({ term, meaning }) => onMethod(termAnchor(term), term, "Glossary", meaning)),
];

/** The places that the actor may open, and what the method page says, as far as they fit the search. */
export function findPages(actor: Actor, query: string): RankedGroup[] {
  const places = pagesFor(actor).map(({ name, path, also }) => ({ key: `place ${path}`, name, about: "", path, also }));
  return [...ranked("place", "Places", places, query), ...ranked("method", "Method", METHOD, query)];
}

function ranked(kind: string, title: string, entries: readonly Entry[], query: string): RankedGroup[] {
  const fitting = entries
    .flatMap((entry) => {
      const rank = matchRank(query, entry.name, entry.also);
      return rank === null ? [] : [{ entry, rank }];
    })
    .toSorted((a, b) => a.rank - b.rank);
  const [best] = fitting;
  if (!best) return [];
  const rows = fitting.slice(0, SHOWN).map(({ entry: { key, name, about, path } }) => ({ key, name, about, path }));
  return [{ kind, title, rows, total: fitting.length, list: null, best: best.rank }];
}
