/* Undo and redo of a stack: the states, what leads from one to another, and its words. */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { mirroredDeviceSide } from "#app/lib/stack-edit.ts";
import { changeWords, stackDifferences } from "#app/lib/stack-differences.ts";
import { beginHistory, note, standing, stateAfter, step } from "#app/lib/stack-history.ts";
import { filmOf, putBack, type FormChange } from "#app/lib/stack-put-back.ts";
import type { LayerText, StackText } from "#app/lib/stack-text.ts";
import { CHOICES, COPPER, layerText, TEXT } from "./samples.ts";

const withLayer = (index: number, changes: Partial<LayerText>): StackText => ({
  ...TEXT,
  layers: TEXT.layers.map((layer, at) => (at === index ? { ...layer, ...changes } : layer)),
});
const withLayers = (layers: LayerText[]): StackText => ({ ...TEXT, layers });

describe("a history", () => {
  it("leads back and on again, and forgets what had been taken back once something else is done", () => {
    let history = beginHistory("a");
    expect([stateAfter(history, "undo"), stateAfter(history, "redo")]).toEqual([null, null]);
    expect(step(history, "undo")).toBe(history);
    history = note(note(history, "b"), "c");
    expect(note(history, "c")).toBe(history);
    history = step(step(history, "undo"), "undo");
    expect(standing(history)).toBe("a");
    expect(stateAfter(history, "redo")).toBe("b");
    history = step(history, "redo");
    history = note(history, "d");
    expect([standing(history), stateAfter(history, "redo"), stateAfter(history, "undo")]).toEqual(["d", null, "b"]);
  });

  it("holds the last two hundred steps", () => {
    let history = beginHistory("0");
    for (let n = 1; n <= 500; n += 1) history = note(history, String(n));
    let steps = 0;
    while (stateAfter(history, "undo") !== null) {
      history = step(history, "undo");
      steps += 1;
    }
    expect([steps, standing(history)]).toEqual([200, "300"]);
  });
});

/** What the form makes of a change. */
function applied(text: StackText, change: FormChange): StackText {
  const copy = structuredClone(text);
  if (change.kind === "insert") return { ...copy, layers: copy.layers.toSpliced(change.index, 0, change.value) };
  if (change.kind === "remove") return { ...copy, layers: copy.layers.toSpliced(change.index, 1) };
  if (change.name === undefined) return change.value as StackText;
  const path = change.name.split(/[.[\]]+/).filter(Boolean);
  let at = copy as unknown as Record<string, unknown>;
  for (const key of path.slice(0, -1)) at = at[key] as Record<string, unknown>;
  at[path.at(-1) ?? ""] = change.value;
  return copy;
}

describe("putting a state back", () => {
  it("changes the smallest part that holds all of the difference", () => {
    const name = (to: StackText) => {
      const change = putBack(TEXT, to);
      return change?.kind === "update" ? [change.name, change.field] : change?.kind;
    };
    expect(putBack(TEXT, structuredClone(TEXT))).toBeNull();
    expect(name({ ...TEXT, note: "n" })).toEqual(["note", "note"]);
    expect(name(withLayer(1, { thickness: { value: "6 um", source: "measured here" } }))).toEqual([
      "layers[1].thickness.value",
      "layers[1].thickness.value",
    ]);
    expect(name(withLayer(1, { film: "other", coverage: "9 %" }))).toEqual(["layers[1]", "layers[1].film"]);
    expect(name({ ...withLayer(1, { film: "x" }), name: "y" })).toEqual([undefined, "name"]);
    expect(name(withLayers(TEXT.layers.toReversed()))).toEqual(["layers", "layers[0].film"]);
    expect(name(withLayers(TEXT.layers.slice(1)))).toBe("remove");
    expect(name(withLayers([...TEXT.layers, layerText({})]))).toBe("insert");
  });

  it("takes the uppermost of several films alike", () => {
    const [first, ...rest] = TEXT.layers;
    if (!first) throw new Error("The sample has films.");
    const twice = withLayers([first, first, ...rest]);
    expect(putBack(twice, TEXT)).toMatchObject({ kind: "remove", index: 0, field: "layers[0].film" });
    expect(putBack(TEXT, twice)).toMatchObject({ kind: "insert", index: 0, field: "layers[0].film" });
  });

  it("leads from any state to any other", () => {
    const layer = fc.record({
      side: fc.constantFrom("front" as const, "back" as const),
      film: fc.constantFrom("a", "b"),
      value: fc.constantFrom("1 µm", "2 µm"),
    });
    const text = fc
      .record({ name: fc.constantFrom("x", "y"), layers: fc.array(layer, { maxLength: 5 }) })
      .map(({ name, layers }): StackText => ({
        ...TEXT,
        name,
        layers: layers.map(({ side, film, value }) => layerText({ side, film, thickness: { value } })),
      }));
    fc.assert(
      fc.property(text, text, (from, to) => {
        const change = putBack(from, to);
        expect(change === null ? from : applied(from, change)).toEqual(to);
      }),
    );
  });

  it("tells the film of a field", () => {
    expect(["layers[12].film", "siliconThickness.value", "name"].map(filmOf)).toEqual([12, null, null]);
  });
});

describe("differences", () => {
  const of = (after: StackText, before = TEXT) => stackDifferences(before, after, CHOICES);
  const labels = (after: StackText, before = TEXT) => of(after, before).map(({ label }) => label);

  it("are none between texts that mean the same", () => {
    expect(of(TEXT)).toEqual([]);
    expect(of(withLayer(1, { thickness: { value: "5 µm", source: "measured here" } }))).toEqual([]);
    expect(of({ ...TEXT, siliconThickness: { ...TEXT.siliconThickness, value: "0.25 mm" } })).toEqual([]);
  });

  it("name the field, its film, and both values", () => {
    expect(of(withLayer(1, { thickness: { value: "6 um", source: "measured here" } }))).toEqual([
      {
        key: "layers[1].thickness.value",
        label: "Thickness of Plated copper A",
        before: "5 um",
        after: "6 um",
        field: "layers[1].thickness.value",
      },
    ]);
    expect(labels(withLayer(2, { film: COPPER.id }))).toEqual(["Choice of Polymer dielectric A, 3 of 3"]);
    expect(labels({ ...TEXT, name: "other", silicon: "" })).toEqual(["Name", "Silicon"]);
    expect(of({ ...TEXT, silicon: "" })[0]).toMatchObject({ after: "not chosen" });
    expect(of(withLayer(0, { film: "gone" }))[0]).toMatchObject({ after: "no longer in the library" });
  });

  it("tell films that came, went and moved", () => {
    const [first, second, third] = TEXT.layers;
    if (!first || !second || !third) throw new Error("The sample has three films.");
    expect(of(withLayers([first, third]))).toMatchObject([
      {
        label: "Film Plated copper A",
        before: "5 um, device side, 2 of 3 from the top",
        after: "taken out",
        field: null,
      },
    ]);
    expect(of(withLayers([second, first, third]))).toMatchObject([
      { label: expect.stringMatching(/^Place of/) as string },
    ]);
    expect(of(withLayers([first, third, { ...second, side: "back" }]))).toMatchObject([
      { label: "Place of Plated copper A", after: "back side, 3 of 3 from the top" },
    ]);
    const both = withLayers(mirroredDeviceSide([first, second]));
    expect(labels(both, withLayers([first, second]))).toEqual(["Film Plated copper A", "Film Polymer dielectric A"]);
  });

  it("say in a few words what was done", () => {
    expect(changeWords(of(withLayer(1, { coverage: "40 %" })))).toBe(
      "Area coverage of Plated copper A: 40 %, was 0.35",
    );
    expect(changeWords(of({ ...TEXT, name: "other", note: "n" }))).toBe("Name: other, was Tern T-9, trial, and 1 more");
    expect(changeWords([])).toBe("Wording");
  });
});
