import { createMemoryRouter, MemoryRouter, RouterProvider } from "react-router";
import { describe, expect, it } from "vitest";
import { bondingMaterialList, bondingMaterialView } from "#app/components/carriers/bonding-material-view.tsx";
import { CarrierPieces } from "#app/components/carriers/CarrierPieces.tsx";
import { LimitsTable } from "#app/components/carriers/LimitsTable.tsx";
import { resistanceText } from "#app/components/carriers/resistance-words.ts";
import { siliconView } from "#app/components/carriers/silicon-view.tsx";
import { TemperatureBand } from "#app/components/carriers/TemperatureBand.tsx";
import { toolView } from "#app/components/carriers/tool-view.tsx";
import { BLANK_MATERIAL_HANDLING, BLANK_TOOL_HANDLING } from "#app/lib/blank-handling.ts";
import { usesLeft, type CarrierUnitRow } from "#app/lib/carrier-units.ts";
import type { LimitGroup } from "#app/lib/limit-rows.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { attributes, render, words } from "../drawings/render.ts";

/** Temperatures in K, stresses in Pa, lengths in m. */
const celsius = (temperature: number) => temperature + 273.15;
const stated = (value: number) => ({ value, tolerance: null, source: "supplier" as const });
const plain = (text: string | undefined) => (text ?? "").replaceAll("\u00A0", " ");
const SITE = { adhesiveMargin: 20 };

const SLIDE: LibraryRecords["bondingMaterial"] = {
  id: "a",
  name: "Slide adhesive A",
  note: "",
  flows: true,
  softening: stated(celsius(120)),
  glassTransition: null,
  flowPoint: null,
  bondTemperature: stated(celsius(180)),
  temperatureLimit: stated(celsius(200)),
  effectiveModulus: { ...stated(0.15e9), tolerance: 0.045e9, source: "assumed" },
  dataSheetModulus: stated(1.6e9),
  poissonsRatio: stated(0.38),
  expansionBelow: stated(60e-6),
  expansionAbove: stated(190e-6),
  leastThickness: 10e-6,
  mostThickness: 40e-6,
  thicknessVariationShare: stated(0.05),
  release: "thermal slide",
  releaseTemperature: stated(celsius(200)),
  thermalCycles: null,
  vacuum: "not known",
  solvent: "not known",
  acid: "not known",
  base: "not known",
  handling: BLANK_MATERIAL_HANDLING,
};
const LASER = { ...SLIDE, flows: false, softening: stated(celsius(150)), temperatureLimit: stated(celsius(280)) };

describe("a bonding material", () => {
  it("says what its softening point means", () => {
    expect(plain(bondingMaterialView(SLIDE, SITE).answer)).toBe("Flows above 120 °C; never in vacuum above it.");
    expect(plain(bondingMaterialView(LASER, SITE).answer)).toBe(
      "Stays coupled above 150 °C: it is cross-linked and does not flow.",
    );
    expect(bondingMaterialView({ ...LASER, softening: null }, SITE).answer).toContain("no softening point");
  });

  it("is clear below its softening point when it flows, else below its limit with the site's margin", () => {
    expect(plain(bondingMaterialView(SLIDE, SITE).because)).toContain(
      "clear below 120 °C and does not run beyond 200 °C",
    );
    expect(plain(bondingMaterialView(LASER, SITE).because)).toContain("clear below 260 °C");
    expect(plain(bondingMaterialView(LASER, { adhesiveMargin: 30 }).because)).toContain("clear below 250 °C");
    const wax = { ...SLIDE, softening: stated(celsius(75)), temperatureLimit: stated(celsius(80)) };
    expect(plain(bondingMaterialView(wax, SITE).because)).toContain("clear below 60 °C");
  });

  it("sets the locked-in modulus beside the data sheet's", () => {
    expect(plain(bondingMaterialView(SLIDE, SITE).because)).toContain(
      "The locked-in modulus, 150 ± 45 MPa, couples the pair, not the 1600 MPa of the data sheet.",
    );
    const cell = bondingMaterialList(SITE).columns.find(({ key }) => key === "modulus");
    expect(words(render(cell?.cell(SLIDE)))).toBe("150 ± 45 data sheet 1600");
  });
});

describe("what a bonding material stands", () => {
  it("gives the word of the rules with the words of the data sheet, and names what is missing", () => {
    const material = {
      ...SLIDE,
      base: "ok 30 min",
      handling: { ...BLANK_MATERIAL_HANDLING, base: { word: "resists" as const, longest: 1800 } },
    };
    const { facts, properties } = bondingMaterialView(material, SITE);
    const fact = (label: string) => plain(words(render(<>{facts.find((each) => each.label === label)?.value}</>)));
    expect(fact("Base")).toBe("resists for 30 min ok 30 min");
    expect(fact("Acid")).toBe("not given");
    expect(fact("Not given")).toContain("temperature limit in vacuum, weight loss in vacuum");
    expect(fact("Not given")).not.toContain("peel force");
    expect(properties.map(({ label }) => label)).not.toContain("Weight loss in vacuum");
  });

  it("asks for the peel of what is peeled off", () => {
    const { facts } = bondingMaterialView({ ...LASER, release: "mechanical peel" }, SITE);
    expect(facts.find(({ label }) => label === "Not given")?.value).toContain("bend radius at the peel front");
  });

  it.each([
    [{ word: "attacked", longest: 600 }, "attacked after 10 min"],
    [{ word: "resists", longest: 7200 }, "resists for 2 h"],
    [{ word: "attacked" }, "attacked"],
    [{ word: "unknown" }, "not known"],
  ] as const)("says %j in words", (resistance, text) => {
    expect(plain(resistanceText(resistance))).toBe(text);
  });
});

describe("the pieces of a carrier", () => {
  const unit: CarrierUnitRow = {
    id: "u",
    mark: "G30-0411",
    uses: 20,
    state: "cleaned",
    lastUsedOn: null,
    thicknessVariation: null,
    stamp: { version: 3, updatedAt: "2026-11-18T08:00:00.000Z", updatedBy: "Mikael Lindqvist" },
  };
  const params = { query: "", sort: "mark", descending: false, page: 1, filters: {} };
  const pieces = (mayEdit: boolean, row = unit) =>
    render(
      <RouterProvider
        router={createMemoryRouter([
          {
            path: "/",
            element: (
              <CarrierPieces
                units={{ page: { rows: [row], total: 1, params }, all: 1 }}
                limit={20}
                mayEdit={mayEdit}
                answer={null}
              />
            ),
          },
        ])}
      />,
    );

  it("says what is left of the uses", () => {
    expect(words(pieces(false))).toContain("none left");
    expect(usesLeft({ uses: 22, state: "in use" }, 20)).toBe("2 beyond its limit");
    expect(usesLeft({ uses: 7, state: "in use" }, 20)).toBe("13 left");
    expect(usesLeft({ uses: 7, state: "scrapped" }, 20)).toBe("none, scrapped");
  });

  it("offers what its state allows, and only to those who may", () => {
    expect(attributes(pieces(true), "aria-label")).toEqual(
      expect.arrayContaining(["Count a use: G30-0411", "Scrap: G30-0411"]),
    );
    expect(words(pieces(true))).not.toContain("Take back");
    expect(words(pieces(true, { ...unit, state: "scrapped" }))).toContain("Take back");
    expect(words(pieces(false))).not.toMatch(/Count a use|Add a piece/);
  });
});

describe("the scale of temperature", () => {
  const material = { softening: celsius(120), flows: true, limit: celsius(200), margin: 20 };
  const markup = render(<TemperatureBand temperatures={material} bond={celsius(180)} release={celsius(200)} />);

  it("says in words all that it draws", () => {
    const [label = ""] = attributes(markup, "aria-label");
    expect(plain(label)).toContain("Step in air: clear from 0 °C to 120 °C, caution from 120 °C to 200 °C");
    expect(plain(label)).toContain("Step in vacuum: clear from 0 °C to 120 °C, do not run from 120 °C");
    expect(plain(label)).toContain("Bonds at 180 °C. Lets go at 200 °C. Limit 200 °C");
  });

  it("never shows a hatch without its word", () => {
    for (const word of ["Clear", "Caution", "Do not run"]) expect(words(markup)).toContain(word);
  });

  it("has one row for a cross-linked material, whose softening is no danger in vacuum", () => {
    const crossLinked = render(
      <TemperatureBand temperatures={{ ...material, flows: false }} bond={celsius(180)} release={celsius(25)} />,
    );
    expect(words(crossLinked)).toContain("Any step");
    expect(words(crossLinked)).not.toContain("vacuum");
  });

  it("paints with tokens and prints no pattern", () => {
    expect(markup).not.toMatch(/(?:fill|stroke)="(?:#|rgb|black|white)/);
    expect(markup).not.toContain("<pattern");
  });
});

describe("a tool", () => {
  const TOOL: LibraryRecords["equipment"] = {
    id: "t",
    name: "Coater",
    note: "",
    holding: "free on proximity pins",
    atPeak: "free",
    warpLimitEdgesUp: stated(400e-6),
    warpLimitEdgesDown: stated(500e-6),
    leastUnsupportedThickness: stated(300e-6),
    largestDiameter: stated(0.3),
    handling: BLANK_TOOL_HANDLING,
  };

  it("says the warp that it takes, edges up and edges down, and whether peak counts", () => {
    const { answer, because } = toolView(TOOL);
    expect(plain(answer)).toBe("Takes 400 µm edges up and 500 µm edges down, as loaded.");
    expect(plain(because)).toBe(
      "The wafer is free when it is hot, so its warp at peak is judged as well. Without support it takes silicon from 300 µm up.",
    );
    expect(toolView({ ...TOOL, atPeak: "held" }).because).toContain("held when it is hot");
  });

  it("tells no limit from a limit", () => {
    const frame = { ...TOOL, warpLimitEdgesUp: null, warpLimitEdgesDown: null, leastUnsupportedThickness: stated(0) };
    expect(toolView(frame).answer).toContain("No warp limit");
    expect(toolView(frame).because).toContain("any thickness");
    expect(plain(toolView({ ...TOOL, warpLimitEdgesUp: null }).answer)).toContain("any warp edges up and 500 µm");
  });
});

describe("a silicon wafer", () => {
  const wafer = { id: "s", name: "Silicon", note: "", diameter: 0.3, thickness: stated(775e-6) };

  it("takes its modulus from its face", () => {
    expect(plain(siliconView({ ...wafer, orientation: "100" }).answer)).toContain("biaxial modulus of 180.2 GPa");
    expect(plain(siliconView({ ...wafer, orientation: "111" }).answer)).toContain("biaxial modulus of 229.0 GPa");
  });

  it("gives moduli by direction only for the face on which they differ", () => {
    const labels = (orientation: "100" | "111") =>
      siliconView({ ...wafer, orientation }).properties.map(({ label }) => label);
    expect(labels("100")).toContain("Young’s modulus along <110>");
    expect(labels("111").join()).not.toContain("along");
  });
});

describe("the table of limits", () => {
  const GROUP: LimitGroup = {
    rule: 1,
    title: "Thickness and support",
    limits: [300e-6, 320e-6].map((value, index) => ({
      key: index === 0 ? "bareFrom150" : "bareFrom200",
      title: `Limit ${index}`,
      dimension: "length",
      unit: "µm",
      value,
      source: "our own trials",
      delivered: { value: 300e-6, source: "common practice, no source" },
      version: 1,
      updatedAt: null,
      updatedBy: null,
    })),
  };
  const table = (mayEdit: boolean, group = GROUP) =>
    render(
      <MemoryRouter>
        <LimitsTable group={group} mayEdit={mayEdit} />
      </MemoryRouter>,
    );

  it("sets the delivered value beside a changed one, and only there", () => {
    expect(plain(words(table(false)))).toContain("320 µm delivered 300 µm");
    expect(table(false).match(/delivered 300/g)).toHaveLength(1);
  });

  it("offers the change only to those who may make it", () => {
    expect(table(true)).toContain('href="/?rule=1#rule-1"');
    expect(table(false)).not.toContain("Change");
  });

  it("says so when this version does not judge by a rule", () => {
    expect(words(table(false, { ...GROUP, rule: 3, title: null }))).toContain("does not judge by it yet");
  });
});
