/* What follows from a stack, as the server sends it: the screen's figures are the API's. */
import { MemoryRouter } from "react-router";
import { describe, expect, it } from "vitest";
import { AssumedInputs } from "#app/components/stacks/AssumedInputs.tsx";
import { bowOf, exaggerationOf } from "#app/components/stacks/bow-of.ts";
import { BowModels } from "#app/components/stacks/BowModels.tsx";
import { PanelStatus } from "#app/components/stacks/PanelStatus.tsx";
import { StackAnswer } from "#app/components/stacks/StackAnswer.tsx";
import { StackChart } from "#app/components/stacks/StackChart.tsx";
import { stackCutLayers } from "#app/components/stacks/stack-cut-layers.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { stackDraft } from "#app/lib/stack-draft.ts";
import { newLayer, type StackText } from "#app/lib/stack-text.ts";
import { lengthWords, radiusWords } from "#app/lib/stack-words.ts";
import { answerEstimate, stackPanel } from "#app/services/estimate-answer.ts";
import { readEstimateRequest } from "#app/services/estimate-request.ts";
import { CHOICES, layerText, TEXT } from "#tests/unit/stacks/samples.ts";
import { attributes, render, words } from "../drawings/render.ts";

const limits = defaultLimits();
const plain = (text: string) => text.replaceAll("\u00A0", " ");

function panelOf(text: StackText, temperature: number | null = null) {
  const panel = stackPanel(stackDraft(text, CHOICES), temperature, limits);
  if (!panel) throw new Error("The sample is complete.");
  return panel;
}
const at = (thickness: string): StackText => ({ ...TEXT, siliconThickness: { value: thickness, tolerance: "3 µm" } });
const answer = (text: StackText, temperature: number | null = null) =>
  plain(words(render(<StackAnswer panel={panelOf(text, temperature)} limits={limits} status={{ kind: "current" }} />)));

describe("the answer", () => {
  it("shows the very figures that the API gives for the same request", () => {
    for (const thickness of ["725 µm", "350 µm", "100 µm"]) {
      const said = answer(at(thickness), 518.15);
      for (const { request } of Object.values(panelOf(at(thickness), 518.15)).flatMap((each) => each ?? [])) {
        const { shape, film_force } = answerEstimate(readEstimateRequest(JSON.parse(JSON.stringify(request))), limits);
        const figures =
          shape.roll_radius_m === null
            ? [lengthWords(shape.warp_m), `bow ${lengthWords(shape.bow_m, true)}`]
            : [radiusWords(shape.roll_radius_m), `edge lift ${lengthWords(shape.warp_m)}`];
        for (const figure of figures) expect(said).toContain(plain(figure));
        const force = formatQuantity(film_force.front_N_per_m, "forcePerLength", { significant: 3, sign: true });
        if (request.temperature_K === undefined) expect(said).toContain(plain(force));
      }
    }
  });

  it("says the level with its word, and why", () => {
    expect(answer(at("725 µm"))).toMatch(/^Clear bare at 725 µm Safe to lift bare down to/);
    expect(answer(at("100 µm"))).toMatch(/^Needs support tape or ring at 100 µm/);
    expect(answer(at("40 µm"))).toMatch(/^Needs support carrier at 40 µm/);
    expect(answer(at("100 µm"))).toContain("Judged at 97 µm, nominal minus tolerance");
  });

  it("gives a curled wafer a roll radius and never a bow", () => {
    const said = answer(at("60 µm"));
    expect(said).toContain("Roll radius, 25 °C");
    expect(said).not.toContain("device side up");
    expect(said.match(/\bbow\b/g)).toHaveLength(1);
    expect(said).toMatch(/Stoney’s bow −[\d.]+ mm [\d.]+ % (more|less) than the edge lift/);
  });

  it("says what it waits for before there is anything", () => {
    const status = {
      kind: "waiting",
      what: "silicon",
      more: 1,
      fieldId: "stack-silicon",
      goTo: () => undefined,
    } as const;
    const markup = render(<StackAnswer panel={null} limits={limits} status={status} />);
    expect(words(markup)).toContain("Waiting for silicon and 1 more");
    expect(attributes(markup, "href")).toEqual(["#stack-silicon"]);
  });
});

describe("the state of the figures", () => {
  it("is silent while they are current, and says a problem with a way on", () => {
    expect(words(render(<PanelStatus status={{ kind: "current" }} />))).toBe("");
    const problem = { kind: "problem", sentence: "The estimate did not come.", retry: () => undefined } as const;
    expect(words(render(<PanelStatus status={problem} />))).toBe("Out of date. The estimate did not come. Try again");
  });
});

describe("the three models", () => {
  it("stand side by side with their difference in percent", () => {
    const { room } = panelOf(at("725 µm"));
    const said = plain(words(render(<BowModels estimated={room} />)));
    for (const bow of [room.answer.stoney.bow_m, room.answer.laminate.bow_m, room.answer.shape.bow_m])
      expect(said).toContain(plain(lengthWords(bow, true)));
    expect(said).toMatch(/Stoney’s formula, thin films −[\d.]+ µm [\d.]+ % (more|less) than the free wafer/);
  });

  it("say of a curled wafer that it has no bow", () => {
    const said = plain(words(render(<BowModels estimated={panelOf(at("60 µm")).room} />)));
    expect(said).toContain("curled, edge lift");
    expect(said).toContain("A curled wafer has no bow");
  });

  it("warn where the thin-film formula is off by more than 5 % against the laminate", () => {
    const layers = [layerText({ thickness: { value: "10 µm" }, stress: { value: "100 MPa" } })];
    const off = (thickness: string) =>
      words(render(<BowModels estimated={panelOf({ ...at(thickness), layers }).room} />));
    expect(off("725 µm")).not.toContain("no thin films");
    expect(off("60 µm")).toContain("than the laminate: the films are no thin films here");
  });
});

describe("the chart", () => {
  it("brings its figures along as a file that needs no script", () => {
    const panel = panelOf(at("250 µm"));
    const markup = render(<StackChart name="Tern T-9" panel={panel} overlay={null} limits={limits} options={null} />);
    const file = attributes(markup, "href").find((href) => href.startsWith("data:text/csv"));
    expect(attributes(markup, "download")).toEqual(["tern-t-9-warp.csv"]);
    const lines = decodeURIComponent(file?.split(",").slice(1).join(",") ?? "").split("\r\n");
    expect(lines).toHaveLength(122);
    expect(lines[1]).toMatch(/^Tern T-9,298\.15,20,/);
  });

  it("says so when there is nothing to draw", () => {
    const panel = panelOf({ ...at("250 µm"), layers: [] });
    const said = words(render(<StackChart name="Bare" panel={panel} overlay={null} limits={limits} options={null} />));
    expect(said).toContain("It stays flat within");
    expect(warpless(panel.room.answer.sweep)).toBe(true);
  });

  const warpless = (sweep: { warp_m: number }[] | undefined) => (sweep ?? []).every(({ warp_m }) => warp_m === 0);
});

describe("what is assumed", () => {
  const said = (text: StackText) =>
    words(
      render(
        <MemoryRouter>
          <AssumedInputs draft={stackDraft(text, CHOICES)} />
        </MemoryRouter>,
      ),
    );

  it("is named, each with the film that it comes from", () => {
    expect(said(TEXT)).toBe(
      "3 inputs are assumed Stress of Polymer dielectric A Open the film Thickness of Polymer dielectric A Stress of Polymer dielectric A Open the film",
    );
  });

  it("is left out when nothing is", () => {
    const measured = { value: "5 µm", source: "measured here" };
    const layers = [{ ...newLayer("front"), film: CHOICES.films[0]?.id ?? "", thickness: measured }];
    expect(said({ ...TEXT, layers })).toBe("");
  });
});

describe("the cut", () => {
  it("lists the silicon between the films, and marks the selected part", () => {
    const layers = stackCutLayers(stackDraft(TEXT, CHOICES), 1);
    expect(layers.map(({ part }) => part)).toEqual([0, 1, "silicon", 2]);
    expect(layers.map(({ layer }) => layer.selected)).toEqual([false, true, false, false]);
    expect(layers.map(({ layer }) => layer.assumed)).toEqual([true, false, undefined, true]);
  });

  it("draws what is not chosen yet as a blank", () => {
    const [first] = stackCutLayers(stackDraft({ ...TEXT, layers: [newLayer("front")] }, CHOICES), 0);
    expect(first?.layer).toMatchObject({ kind: "blank", name: "Film not chosen", thicknessText: "?", notes: [] });
  });
});

describe("bow lines of several wafers", () => {
  const wafers = (thicknesses: string[]) =>
    thicknesses.map((thickness) => {
      const { request, answer: found } = panelOf(at(thickness)).room;
      return { shape: found.shape, diameter: request.wafer.diameter_m };
    });

  it("share the largest scale that suits the largest bow, rolled ones left out", () => {
    const scale = exaggerationOf(wafers(["725 µm", "400 µm", "60 µm"]));
    expect(scale).toBe(exaggerationOf(wafers(["400 µm"])));
    expect(scale).toBeGreaterThan(1);
    expect(exaggerationOf(wafers(["60 µm"]))).toBe(1);
  });

  it("are arcs when rolled, edges up under tension on the device side", () => {
    const [rolled, bowed] = wafers(["60 µm", "725 µm"]).map(({ shape }) => bowOf(shape));
    expect(rolled).toMatchObject({ kind: "rolled", edgesUp: true });
    expect(bowed?.kind).toBe("bowed");
  });
});

it("uses only glyphs of the shipped fonts", () => {
  const text = answer(at("250 µm"), 400) + words(render(<BowModels estimated={panelOf(at("60 µm")).room} />));
  expect(text).not.toMatch(/[\u2080-\u2089\u2190-\u21FF\u2264\u2265\u207B\u2713\u2714]/);
});
