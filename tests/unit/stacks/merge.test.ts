/* Two people's changes of one stack, put together. */
import { describe, expect, it } from "vitest";
import type { MergeChoices } from "#app/lib/stack-merge-rows.ts";
import { mergeOf, undecided } from "#app/lib/stack-merge.ts";
import type { LayerText, StackText } from "#app/lib/stack-text.ts";
import { CHOICES, COPPER, layerText, POLYMER, TEXT } from "./samples.ts";

const of = (mine: StackText, theirs: StackText) => mergeOf({ opened: TEXT, mine, theirs }, CHOICES);
const merged = (mine: StackText, theirs: StackText, choices: MergeChoices = {}) => of(mine, theirs).merge(choices);
const rows = (mine: StackText, theirs: StackText) => of(mine, theirs).rows;
const keys = (mine: StackText, theirs: StackText) => rows(mine, theirs).map(({ key, by }) => `${key} ${by}`);

const layers = (...films: (LayerText | undefined)[]): StackText => ({
  ...TEXT,
  layers: films.filter((film) => film !== undefined),
});
const [TOP, MIDDLE, BACK] = TEXT.layers;
const film = (index: number, changes: Partial<LayerText>): StackText => ({
  ...TEXT,
  layers: TEXT.layers.map((layer, at) => (at === index ? { ...layer, ...changes } : layer)),
});
const NEW = layerText({ thickness: { value: "1 µm" }, coverage: "50 %" });
const OTHER = layerText({ film: POLYMER.id, thickness: { value: "9 µm" } });
const thicknesses = ({ layers: films }: StackText) => films.map(({ thickness }) => thickness.value);

/** Each kind of field, changed in two ways. */
const KINDS: [what: string, key: string, mine: StackText, theirs: StackText][] = [
  ["the name", "name", { ...TEXT, name: "mine" }, { ...TEXT, name: "theirs" }],
  ["the note", "note", { ...TEXT, note: "mine" }, { ...TEXT, note: "theirs" }],
  ["the silicon", "silicon", { ...TEXT, silicon: "one" }, { ...TEXT, silicon: "other" }],
  [
    "the remaining silicon",
    "siliconThickness",
    { ...TEXT, siliconThickness: { value: "170 µm" } },
    { ...TEXT, siliconThickness: { value: "180 µm" } },
  ],
  [
    "its tolerance and its source",
    "siliconThickness",
    { ...TEXT, siliconThickness: { ...TEXT.siliconThickness, tolerance: "5 µm" } },
    { ...TEXT, siliconThickness: { ...TEXT.siliconThickness, source: "assumed" } },
  ],
  [
    "a film's thickness",
    "b1.thickness",
    film(1, { thickness: { value: "6 um" } }),
    film(1, { thickness: { value: "8 um" } }),
  ],
  ["a stress of its own", "b1.stress", film(1, { stress: {} }), film(1, { stress: { value: "150 MPa", note: "new" } })],
  [
    "a film's cut",
    "b1.cut",
    film(1, { coverage: "0.5" }),
    film(1, { cut: "lines", lineWidth: "10 µm", lineDirection: "0°" }),
  ],
  ["the film itself", "b1", film(1, { film: POLYMER.id }), film(1, { thickness: { value: "8 um" } })],
];

describe.each(KINDS)("%s", (_, key, mine, theirs) => {
  it("changed by one is theirs who changed it", () => {
    const changed = rows(mine, TEXT);
    expect(changed.map(({ by }) => by)).toEqual(["you"]);
    expect(merged(mine, TEXT)).toEqual(mine);
    expect(rows(TEXT, theirs).map(({ by }) => by)).toEqual(["them"]);
    expect(merged(TEXT, theirs)).toEqual(theirs);
  });

  it("changed by one may be put back", () => {
    const [row] = rows(mine, TEXT);
    expect(merged(mine, TEXT, { [row?.key ?? ""]: "theirs" })).toEqual(TEXT);
  });

  it("changed by both is asked, and is whose it is to be", () => {
    expect(keys(mine, theirs)).toEqual([`${key} both`]);
    expect(undecided(of(mine, theirs), {})).toHaveLength(1);
    expect(undecided(of(mine, theirs), { [key]: "mine" })).toEqual([]);
    expect(merged(mine, theirs, { [key]: "mine" })).toEqual(mine);
    expect(merged(mine, theirs, { [key]: "theirs" })).toEqual(theirs);
  });

  it("changed alike by both is no question", () => {
    expect(rows(mine, mine)).toEqual([]);
    expect(merged(mine, mine)).toEqual(mine);
  });
});

describe("changes in different places", () => {
  it("stand side by side, each theirs who made it", () => {
    const mine = { ...film(0, { thickness: { value: "7.5 µm" } }), name: "mine" };
    const theirs = { ...film(1, { stress: {} }), note: "theirs" };
    expect(keys(mine, theirs)).toEqual(["note them", "b1.stress them", "name you", "b0.thickness you"]);
    const { name, note, layers: films } = merged(mine, theirs);
    expect([name, note, films[0]?.thickness.value, films[1]?.stress]).toEqual(["mine", "theirs", "7.5 µm", {}]);
  });

  it("say only what differs", () => {
    const theirs = {
      ...TEXT,
      siliconThickness: { ...TEXT.siliconThickness, value: "170 µm", source: "measured here" },
    };
    expect(rows(TEXT, theirs)).toMatchObject([
      { label: "Remaining silicon", opened: "250 µm, supplier", theirs: "170 µm, measured here" },
    ]);
  });

  it("that are written otherwise only are none", () => {
    expect(rows(film(1, { thickness: { value: "0.005 mm", source: "measured here" } }), TEXT)).toEqual([]);
  });
});

describe("a film that one has taken out", () => {
  const without = layers(TOP, BACK);

  it("is gone where the other left it alone, unless it is to stay", () => {
    expect(keys(without, TEXT)).toEqual(["b1 you"]);
    expect(merged(without, TEXT)).toEqual(without);
    expect(merged(TEXT, without)).toEqual(without);
    expect(merged(without, TEXT, { b1: "theirs" })).toEqual(TEXT);
    expect(merged(TEXT, without, { b1: "mine" })).toEqual(TEXT);
  });

  it("is asked where the other has changed it, and comes back in its place", () => {
    const theirs = film(1, { thickness: { value: "8 um" } });
    expect(keys(without, theirs)).toEqual(["b1 both"]);
    expect(rows(without, theirs)).toMatchObject([
      { label: "Film Plated copper A", mine: "taken out", theirs: expect.stringContaining("8 um") as string },
    ]);
    expect(merged(without, theirs, { b1: "mine" })).toEqual(without);
    expect(merged(without, theirs, { b1: "theirs" })).toEqual(theirs);
    expect(merged(theirs, without, { b1: "mine" })).toEqual(theirs);
  });

  it("by both is no question", () => {
    expect(rows(without, without)).toEqual([]);
    expect(merged(without, without)).toEqual(without);
  });
});

describe("films that were added", () => {
  it("by each in another place both stand where they were put", () => {
    const mine = layers(NEW, TOP, MIDDLE, BACK);
    const theirs = layers(TOP, MIDDLE, BACK, { ...OTHER, side: "back" });
    expect(thicknesses(merged(mine, theirs))).toEqual(["1 µm", "7 µm", "5 um", "2 µm", "9 µm"]);
    expect(thicknesses(merged(mine, theirs, { m0: "theirs" }))).toEqual(["7 µm", "5 um", "2 µm", "9 µm"]);
    expect(thicknesses(merged(mine, theirs, { t3: "mine" }))).toEqual(["1 µm", "7 µm", "5 um", "2 µm"]);
  });

  it.each([
    ["on top", layers(NEW, TOP, MIDDLE, BACK), layers(OTHER, TOP, MIDDLE, BACK), 0],
    ["between two", layers(TOP, NEW, MIDDLE, BACK), layers(TOP, OTHER, MIDDLE, BACK), 1],
    ["next to the silicon", layers(TOP, MIDDLE, NEW, BACK), layers(TOP, MIDDLE, OTHER, BACK), 2],
  ])("%s by both ask which lies above", (_, mine, theirs, at) => {
    expect(keys(mine, theirs)).toContain("on top both");
    const pair = (choices: MergeChoices) => thicknesses(merged(mine, theirs, choices)).slice(at, at + 2);
    expect(pair({ "on top": "mine" })).toEqual(["1 µm", "9 µm"]);
    expect(pair({ "on top": "theirs" })).toEqual(["9 µm", "1 µm"]);
  });

  it("to a stack without films meet as well", () => {
    const [empty, mine, theirs] = [layers(), layers(NEW), layers(OTHER)];
    const { rows: asked, merge } = mergeOf({ opened: empty, mine, theirs }, CHOICES);
    expect(asked.map(({ key, by }) => `${key} ${by}`)).toEqual(["on top both", "t0 them", "m0 you"]);
    expect(thicknesses(merge({ "on top": "theirs" }))).toEqual(["9 µm", "1 µm"]);
  });
});

describe("the order of the films", () => {
  const turned = layers(MIDDLE, TOP, BACK);
  const THREE: StackText = layers(TOP, MIDDLE, layerText({ thickness: { value: "3 µm" } }), BACK);
  const [, , THIRD] = THREE.layers;

  it("is theirs who moved something, and what the other changed in a film goes with it", () => {
    const theirs = film(1, { thickness: { value: "8 um", source: "measured here" } });
    expect(keys(turned, theirs)).toEqual(["b1.thickness them", "order you"]);
    expect(thicknesses(merged(turned, theirs))).toEqual(["8 um", "7 µm", "2 µm"]);
    expect(thicknesses(merged(turned, theirs, { order: "theirs" }))).toEqual(["7 µm", "8 um", "2 µm"]);
  });

  it("is asked as a whole where both have moved films differently", () => {
    const mine = layers(MIDDLE, TOP, THIRD, BACK);
    const theirs = layers(TOP, THIRD, MIDDLE, BACK);
    const merge = mergeOf({ opened: THREE, mine, theirs }, CHOICES);
    expect(merge.rows.map(({ key, by }) => `${key} ${by}`)).toEqual(["order both"]);
    expect(merge.merge({ order: "mine" })).toEqual(mine);
    expect(merge.merge({ order: "theirs" })).toEqual(theirs);
  });

  it("moved alike by both is no question", () => {
    expect(rows(turned, turned)).toEqual([]);
    expect(merged(turned, turned)).toEqual(turned);
  });

  it("a film moved to the other side is moved, with what the other changed in it", () => {
    const mine = layers(MIDDLE, { ...(TOP as LayerText), side: "back" }, BACK);
    const theirs = { ...TEXT, note: "theirs" };
    expect(merged(mine, theirs)).toEqual({ ...mine, note: "theirs" });
  });

  it("has films of the back side under those of the device side", () => {
    const mine = layers(TOP, MIDDLE, NEW, BACK);
    const theirs = layers(
      TOP,
      MIDDLE,
      BACK,
      layerText({ side: "back", film: COPPER.id, thickness: { value: "4 µm" } }),
    );
    expect(merged(mine, theirs).layers.map(({ side }) => side)).toEqual(["front", "front", "front", "back", "back"]);
  });
});

it("what is chosen as a whole is that whole", () => {
  const mine = { ...layers(NEW, TOP, BACK), name: "mine", note: "both" };
  const theirs = {
    ...layers({ ...(TOP as LayerText), thickness: { value: "6 µm" } }, MIDDLE, BACK, NEW),
    note: "theirs",
  };
  const merge = of(mine, theirs);
  const all = (whose: "mine" | "theirs") => Object.fromEntries(merge.rows.map(({ key }) => [key, whose]));
  expect(merge.merge(all("mine"))).toEqual(mine);
  expect(merge.merge(all("theirs"))).toEqual({
    ...theirs,
    layers: theirs.layers.toSorted((one, next) => Number(one.side === "back") - Number(next.side === "back")),
  });
});
