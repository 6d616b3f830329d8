import { describe, expect, it } from "vitest";
import { Cautions } from "#app/components/cautions/Cautions.tsx";
import { CAUTION_SIGNS } from "#app/lib/sheet/caution-signs.ts";
import { MethodView } from "#app/components/method/MethodView.tsx";
import { leftOut } from "#app/lib/method-words.ts";
import { EQUATIONS } from "#app/engine/equations.ts";
import { SOURCES } from "#app/engine/sources.ts";
import type { RuleText } from "#app/schemas/rule-text.ts";
import { attributes, render, words } from "#tests/components/drawings/render.ts";
import { strangeCharacters } from "#tests/components/glyphs.ts";

const LIMIT = { title: "200 mm wafer: bare from", value: "310\u00A0µm", delivered: "300\u00A0µm", source: "trial 12" };
const rule = (limits: RuleText["limits"]): RuleText => ({ number: 1, title: "Thickness", asks: "Is it held?", limits });

describe("the method page", () => {
  const markup = render(<MethodView rules={[rule([LIMIT])]} engineVersion="0.2.0" />);
  const anchors = attributes(markup, "id");

  it("has an anchor for every equation, rule, source and section", () => {
    for (const id of Object.keys(EQUATIONS)) expect(anchors).toContain(`equation-${id}`);
    for (const id of Object.keys(SOURCES)) expect(anchors).toContain(`source-${id}`);
    for (const id of ["rule-1", "cautions", "glossary", "sources", "left-out"]) expect(anchors).toContain(id);
    expect(new Set(anchors).size).toBe(anchors.length);
  });

  it("links only to anchors that it has", () => {
    const targets = attributes(markup, "href").filter((href) => href.startsWith("#"));
    expect(targets.length).toBeGreaterThan(50);
    for (const target of targets) expect(anchors).toContain(target.slice(1));
  });

  it("shows the site's value beside the delivered one, and no values to a guest", () => {
    expect(words(markup)).toMatch(/bare from 310.µm delivered 300.µm trial 12/);
    const forGuest = words(render(<MethodView rules={[rule(null)]} engineVersion="0.2.0" />));
    expect(forGuest).toContain("Is it held?");
    expect(forGuest).not.toMatch(/Value here|bare from|310/);
  });

  it("uses only characters for which a font is shipped", () => expect(strangeCharacters(markup)).toEqual([]));

  it("names the rules that nobody judges, and only those", () => {
    expect(leftOut([1, 2, 6, 8, 12])[0]).toMatch(/^Rules not judged yet: 3, .*; 18, /);
    expect(leftOut([3, 1, 2])[0]).not.toMatch(/: 3,/);
    expect(leftOut(Array.from({ length: 18 }, (_, n) => n + 1))[0]).not.toContain("not judged");
  });
});

describe("cautions", () => {
  it.each([true, false])("compact %s: every one with its sign, which is hidden from readers", (compact) => {
    const markup = render(<Cautions compact={compact} />);
    expect(markup.match(/<li/g)).toHaveLength(CAUTION_SIGNS.length);
    expect(markup.match(/<svg[^>]*aria-hidden="true"/g)).toHaveLength(CAUTION_SIGNS.length);
    expect(markup).toContain("Estimates support, never replace");
    expect(markup).toContain("never replaces the run card");
  });

  it("take the colour of the text around them, so that paper is black", () => {
    expect(render(<Cautions />)).not.toMatch(/(?:fill|stroke)="(?!none|currentColor)/);
  });
});
