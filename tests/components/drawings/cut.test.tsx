import { describe, expect, it } from "vitest";
import { Cut } from "#app/components/drawings/Cut.tsx";
import { cutLayout, layerHeight } from "#app/components/drawings/cut-layout.ts";
import { CutMaterial, type MaterialKind } from "#app/components/drawings/CutMaterial.tsx";
import { attributes, render, words } from "./render.ts";
import { LAYERS } from "./samples.ts";

const ends = { top: { words: "Back side, up on the tool" }, bottom: { words: "Carrier, down" } };

describe("height of a layer", () => {
  it("is 26 + k·log10(1 + t/0.5 µm), k 50 to five layers and 30 beyond", () => {
    expect(layerHeight(0, 3)).toBe(26);
    expect(layerHeight(4.5e-6, 5)).toBeCloseTo(76, 9);
    expect(layerHeight(4.5e-6, 6)).toBeCloseTo(56, 9);
    expect(layerHeight(700e-6, 5)).toBeCloseTo(26 + 50 * Math.log10(1401), 9);
  });

  it("grows with thickness", () => {
    const heights = [0.1e-6, 1e-6, 10e-6, 100e-6, 775e-6].map((thickness) => layerHeight(thickness, 4));
    expect([...heights].sort((a, b) => a - b)).toEqual(heights);
  });
});

describe("layout", () => {
  const layers = (count: number, thickness: number) =>
    Array.from({ length: count }, () => ({
      thickness,
      name: "Polymer dielectric A",
      notes: ["+32 MPa tension", "supplier"],
    }));

  it("stacks bands without gaps, top to bottom", () => {
    const { places, top, bottom } = cutLayout(layers(4, 5e-6), 58);
    expect(places[0]?.y).toBe(top);
    places
      .slice(1)
      .forEach((place, index) => expect(place.y).toBe((places[index]?.y ?? 0) + (places[index]?.height ?? 0)));
    expect(bottom).toBe((places.at(-1)?.y ?? 0) + (places.at(-1)?.height ?? 0));
  });

  it("keeps labels at least 56 px apart and inside the drawing, however thin the layers", () => {
    const { places, foot } = cutLayout(layers(12, 0.05e-6), 58);
    places
      .slice(1)
      .forEach((place, index) => expect(place.labelY - (places[index]?.labelY ?? 0)).toBeGreaterThan(55.9));
    const first = places[0];
    expect((first?.labelY ?? 0) - (first?.labelHeight ?? 0) / 2).toBeGreaterThanOrEqual(3.9);
    expect(foot).toBeGreaterThanOrEqual((places.at(-1)?.labelY ?? 0) + 28);
  });

  it("breaks a long name instead of letting it leave the drawing", () => {
    const { places } = cutLayout(
      [{ thickness: 1e-6, name: "Back-side metal A (titanium, nickel, silver)", notes: [] }],
      58,
    );
    expect(places[0]?.name.length).toBeGreaterThan(1);
    expect(places[0]?.name.join(" ")).toContain("titanium");
  });
});

describe("the cut", () => {
  it("makes every layer a link that works without scripts, with everything that is drawn in its name", () => {
    const markup = render(<Cut {...ends} layers={LAYERS} label="The cut" hrefFor={(index) => `?layer=${index}`} />);
    expect(attributes(markup, "href")).toEqual(LAYERS.map((_, index) => `?layer=${index}`));
    expect(markup).toContain('aria-label="Passivation nitride, 0.8 µm, −150 MPa compression, assumed"');
    expect(markup.match(/aria-current="true"/g)).toHaveLength(1);
  });

  it("makes layers buttons when there is only a handler, and named pictures when there is none", () => {
    const buttons = render(<Cut {...ends} layers={LAYERS} label="The cut" onSelect={() => undefined} />);
    expect(buttons.match(/role="button" tabindex="0"/g)).toHaveLength(LAYERS.length);
    const still = render(<Cut {...ends} layers={LAYERS} label="The cut" />);
    expect(still.match(/role="img"/g)).toHaveLength(LAYERS.length);
    expect(still).not.toContain("tabindex");
  });

  it("says which side is which at both ends, and offers to add a film", () => {
    const markup = render(
      <Cut
        layers={LAYERS}
        label="The cut"
        top={{ words: "Device side", add: { words: "Add a film on top", href: "?add" } }}
        bottom={{ words: "Back side" }}
      />,
    );
    expect(words(markup)).toContain("Device side Add a film on top");
    expect(words(markup)).toContain("Back side");
  });

  it("draws arrows apart in tension and together in compression", () => {
    const heads = (stress: number) => {
      const layer = {
        ...LAYERS[1],
        stress,
        role: "film",
        kind: "inorganic",
        thickness: 1e-6,
        thicknessText: "1 µm",
        name: "A",
        notes: [],
      } as const;
      const markup = render(<Cut {...ends} layers={[layer]} label="The cut" />);
      const path = attributes(markup, "d").find((d) => /^M[\d.]+ [\d.]+l-?7 -3.6v7.2zM/.test(d)) ?? "";
      return [...path.matchAll(/M([\d.]+) [\d.]+l(-?7)/g)].map((match) => ({
        tip: Number(match[1]),
        back: Number(match[2]),
      }));
    };
    const [left, right] = heads(100e6);
    expect(left).toMatchObject({ back: 7 });
    expect(right).toMatchObject({ back: -7 });
    expect((right?.tip ?? 0) - (left?.tip ?? 0)).toBeGreaterThan(150);
    const [inward, backward] = heads(-100e6);
    expect(inward).toMatchObject({ back: -7 });
    expect(backward).toMatchObject({ back: 7 });
  });

  it("draws patterned metal as five lines as wide as their share of the area", () => {
    const markup = render(<Cut {...ends} layers={LAYERS.slice(0, 1)} label="The cut" />);
    const outlines = [
      ...markup.matchAll(
        /<rect x="[\d.]+" y="\d+" width="([\d.]+)" height="\d+" fill="none" stroke="var\(--copper\)"/g,
      ),
    ];
    expect(outlines).toHaveLength(5);
    expect(Number(outlines[0]?.[1])).toBeCloseTo((180 / 5) * 0.38, 6);
  });

  it("breaks silicon and carrier, which are drawn shortened, and nothing else", () => {
    const zigzags = (layers: typeof LAYERS) =>
      render(<Cut {...ends} layers={layers} label="c" />).match(/l6 -9l10 18l6 -9/g)?.length ?? 0;
    expect(zigzags(LAYERS.filter((layer) => layer.role === "silicon" || layer.role === "carrier"))).toBe(6);
    expect(zigzags(LAYERS.filter((layer) => layer.role === "film" || layer.role === "adhesive"))).toBe(0);
  });
});

describe("materials", () => {
  const kinds: MaterialKind[] = ["metal", "polymer", "inorganic", "solder", "silicon", "glass", "adhesive"];
  const fill = (kind: MaterialKind) =>
    render(
      <svg>
        <CutMaterial kind={kind} x={0} y={0} width={180} height={44} />
      </svg>,
    );

  it("never use a diagonal, which means severity", () => {
    for (const kind of kinds) {
      for (const path of attributes(fill(kind), "d")) expect(path, kind).not.toMatch(/[Ll]/);
    }
  });

  it("differ from each other without colour", () => {
    expect(new Set(kinds.map((kind) => fill(kind).replace(/var\(--(?!siwash)[a-z]+\)/g, ""))).size).toBe(kinds.length);
  });
});
