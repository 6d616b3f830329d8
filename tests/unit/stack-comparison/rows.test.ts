/* What counts as a difference, and which film of one stack is which of the other. */
import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { figureGroups } from "#app/lib/stack-comparison/figure-rows.ts";
import { filmSlots } from "#app/lib/stack-comparison/film-slots.ts";
import { onlyDifferences } from "#app/lib/comparison/only-differences.ts";
import { inputGroups } from "#app/lib/stack-comparison/rows.ts";
import { layer, stack } from "./samples.ts";

const polymer = { filmId: "polymer", filmName: "Polymer dielectric A" };
const plain = (text: string | undefined) => text?.replaceAll("\u00A0", " ");
const limits = defaultLimits();

describe("the films of several stacks", () => {
  it("are one list, top to bottom, each film beside itself", () => {
    const slots = filmSlots([
      { layers: [layer(), layer(polymer), layer({ side: "back" })] },
      { layers: [layer(polymer), layer(), layer(polymer)] },
    ]);
    expect(slots.map(({ name, side, occurrence, places }) => [name, side, occurrence, places])).toEqual([
      ["Polymer dielectric A", "front", 2, [null, 2]],
      ["Polymer dielectric A", "front", 1, [1, 0]],
      ["Plated copper A", "front", 1, [0, 1]],
      ["Plated copper A", "back", 1, [2, null]],
    ]);
  });
});

describe("rows of inputs", () => {
  const rowsOf = (...stacks: Parameters<typeof inputGroups>[0]) => inputGroups(stacks).flatMap(({ rows }) => rows);
  const differing = (...stacks: Parameters<typeof inputGroups>[0]) =>
    rowsOf(...stacks)
      .filter(({ differs }) => differs)
      .map(({ label }) => label);

  it("do not differ for stacks that are alike", () => {
    const groups = inputGroups([stack("A", [layer(), layer(polymer)]), stack("B", [layer(), layer(polymer)])]);
    expect(onlyDifferences(groups)).toEqual([]);
  });

  it("differ by value, tolerance and cut, and by nothing else", () => {
    const one = stack("A", [layer()]);
    expect(differing(one, stack("B", [layer({ MPa: 210 })]))).toEqual(["Stress at 25\u00a0°C", "Force per width"]);
    expect(differing(one, stack("B", [layer({ coverage: 0.5 })]))).toEqual(["Covers", "Force per width"]);
    expect(differing(one, stack("B", [layer({ tolerance: 10 })]))).toEqual(["Thickness", "Stress at 25\u00a0°C"]);
    expect(differing(one, stack("B", [layer()], { um: 250, tolerance: 3 }))).toEqual(["Remaining thickness"]);
  });

  it("tell a film that one has and the other has not, and another order", () => {
    const one = stack("A", [layer(), layer(polymer)]);
    const rows = rowsOf(one, stack("B", [layer()]));
    const cells = rows.find(({ key }) => key === "front polymer 1 thickness")?.cells;
    expect(cells?.map(({ text, differs }) => [plain(text), differs])).toEqual([
      ["5 µm", false],
      ["none", true],
    ]);
    expect(differing(one, stack("B", [layer(polymer), layer()]))).toEqual(["Device side"]);
  });

  it("give the force of each film with its share of all of them", () => {
    const cells = rowsOf(stack("A", [layer({ um: 3, MPa: 200 }), layer({ side: "back", um: 1, MPa: -200 })]))
      .filter(({ label }) => label === "Force per width")
      .map(({ cells: [first] }) => [plain(first?.text), plain(first?.note ?? "")]);
    expect(cells).toEqual([
      ["+600 N/m", "75 % of all film forces"],
      ["−200 N/m", "25 % of all film forces"],
    ]);
  });
});

describe("rows of figures", () => {
  const rows = figureGroups(
    [
      stack("A", [layer({ um: 1, tolerance: 10 })], { um: 700, tolerance: 3 }),
      stack("B", [layer({ um: 1, MPa: 300, tolerance: 10 })], { um: 700, tolerance: 3 }),
      { ...stack("C", []), figures: null },
    ],
    "25 °C",
    limits,
  ).flatMap((group) => group.rows);
  const textsOf = (label: string) => rows.find((row) => row.label === label)?.cells.map(({ text }) => plain(text));

  it("have the signed bow with ±, what it lies like, the warp and how far it is from the first", () => {
    const [a = "", b = "", c] = textsOf("Bow, device side up") ?? [];
    expect(a).toMatch(/^−\d+(\.\d+)? ± \d+(\.\d+)? µm$/);
    expect(b).toMatch(/^−\d+(\.\d+)? ± \d+(\.\d+)? µm$/);
    expect(c).toBe("cannot be estimated");
    expect(textsOf("Lies")?.[1]).toMatch(/^edges up \d/);
    const warp = rows.find((row) => row.label === "Warp");
    expect(warp?.cells[0]?.note).toBeNull();
    expect(plain(warp?.cells[1]?.note ?? "")).toMatch(/^[\d.]+ µm more$/);
  });

  it("have the warp at every thickness, from the same model as the estimate", () => {
    for (const at of ["775", "200", "100", "50", "20"]) expect(textsOf(`Warp at ${at}\u00A0µm`)?.[0]).toBeTruthy();
    expect(textsOf("Least thickness without support")?.[0]).toMatch(/µm$/);
  });

  it("call no bow what has rolled", () => {
    const rolled = figureGroups([stack("A", [layer({ um: 20, MPa: 400 })], { um: 50 })], "25 °C", limits);
    const cell = rolled[0]?.rows[0]?.cells[0];
    expect(cell?.text).toBe("none, it rolls");
    expect(cell?.note).toMatch(/^radius about/);
  });
});
