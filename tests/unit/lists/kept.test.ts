import { describe, expect, it } from "vitest";
import routes from "#app/routes.ts";
import { keptRecordAt } from "#app/lib/kept-kinds.ts";
import { escapeRegex, matchRank } from "#app/lib/match-rank.ts";
import { METHOD_SECTIONS } from "#app/lib/method-sections.ts";
import { methodPart } from "#app/lib/method-part.ts";
import { keepsSearches, keptQuery } from "#app/lib/saved-list.ts";
import { favouriteFormSchema, savedFilterFormSchema } from "#app/schemas/kept.ts";

const ID = "0191d6b2-0000-7000-8000-0123456789ab";

describe("a record's page", () => {
  it("is known by its address, and no page below or beside it is", () => {
    expect(keptRecordAt(`/flows/${ID}`)).toEqual({ kind: "flow", id: ID });
    expect(keptRecordAt(`/films/${ID.toUpperCase()}`)).toEqual({ kind: "film", id: ID });
    for (const path of [`/flows/${ID}/edit`, "/flows/new", "/flows", `/sheets/${ID}`, `/carriers/${ID}`, "/"])
      expect(keptRecordAt(path)).toBeNull();
  });
});

describe("how well a name fits", () => {
  it.each([
    ["copper", "Copper", 0],
    ["cop", "Copper, plated", 1],
    ["copper", "Plated copper A", 2],
    ["copper", "Solder tin-silver-copper", 2],
    ["opper", "Copper", 3],
    ["plated copper", "Copper, plated", 3],
    ["gold", "Copper", null],
    ["(cop", "x (copper)", 2],
  ])("%s in %s is %s", (query, name, rank) => expect(matchRank(query, name)).toBe(rank));

  it("takes every sign as itself", () => {
    for (const sign of String.raw`\^$.*+?()[]{}|/-#'"µ`)
      expect(new RegExp(escapeRegex(sign), "u").test(sign)).toBe(true);
  });
});

describe("what is kept of a list", () => {
  it("is search, filters and order, without the page and blanks", () => {
    expect(keptQuery(new URLSearchParams("q=a+b&kind=&page=3&sort=-name"))).toBe("q=a+b&sort=-name");
  });

  it("is of lists, not of what stands on a record's page", () => {
    for (const path of ["/films", "/carriers/bonding-materials", "/flows/library/steps"]) {
      expect(keepsSearches(path)).toBe(true);
      expect(savedFilterFormSchema.safeParse({ list: path, query: "q=1", name: "one" }).success).toBe(true);
    }
    for (const path of [`/lots/${ID}`, "/", "//elsewhere", "/films/../x"]) {
      expect(keepsSearches(path)).toBe(false);
      expect(savedFilterFormSchema.safeParse({ list: path, query: "q=1", name: "one" }).success).toBe(false);
    }
  });

  it("needs a name", () => {
    expect(savedFilterFormSchema.safeParse({ list: "/films", query: "q=1", name: "  " }).success).toBe(false);
    expect(favouriteFormSchema.safeParse({ kind: "program", id: ID, marked: "yes" }).success).toBe(false);
  });
});

describe("the way to the method page", () => {
  const paths =
    JSON.stringify(routes)
      .match(/"path":"[a-z][^"]*"/g)
      ?.map((text) => `/${text.slice(8, -1)}`) ?? [];

  it("leads from every place to a part that is there", () => {
    expect(paths.length).toBeGreaterThan(40);
    const known = new Set<string>(METHOD_SECTIONS.map(({ id }) => id));
    for (const path of paths) {
      const part = methodPart(path);
      if (part && !part.anchor.startsWith("equations-")) expect(known).toContain(part.anchor);
    }
    expect(methodPart("/flows/1/steps/2")).toMatchObject({ anchor: "rules" });
    expect(methodPart("/method")).toBeNull();
  });
});
