import { beforeAll, describe, expect, test } from "vitest";
import { profilesCsv } from "#app/lib/reading-csv.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import { waferFiguresCsv } from "#app/lib/wafer-figures-csv.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { WaferPage } from "#app/schemas/wafer-page.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const pages = () => import("#app/services/film-analysis/wafer-page.server.ts");

let technician: ActorScope;
let waferId: string;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await pages();
  technician = await scopeOfPerson(database, "technician");
  const [wafer] = await asOwner<{ id: string }>(database, "select id from wafer where name = 'M-0412'");
  waferId = wafer?.id ?? "";
}, 60_000);

async function page(scope = technician): Promise<WaferPage> {
  const { getWaferPage } = await pages();
  return getWaferPage(scope, waferId, null);
}

describe("a wafer scanned along four lines", () => {
  test("gives curvature in all directions, shape, stress and its budget with the instrument's repeatability", async () => {
    const { film, lot, slot, films } = await page();
    expect({ lot: lot?.name, slot, films: films.length, scans: film?.scans.length }).toEqual({
      lot: "T-2611",
      slot: 3,
      films: 1,
      scans: 4,
    });
    const analysis = film?.analysis;
    if (!analysis) throw new Error(film?.fault ?? "no film");
    const { stress, directions, budget, shape, directional } = analysis;
    expect(Math.abs(stress.stoney.value - 31e6)).toBeLessThan(stress.stoney.uncertainty);
    expect(directions.change.all?.word).toBe("bowl");
    expect(
      Math.abs((directions.change.all?.x.value ?? 0) / (directions.change.all?.y.value ?? 1) - 1.04 / 0.96),
    ).toBeLessThan(0.02);
    expect(directional?.x).toBeGreaterThan(directional?.y ?? 0);
    expect(budget.tools).toEqual(["Stylus 1"]);
    const rows = new Map(budget.rows.map((row) => [row.input, row]));
    expect(rows.get("repeatability of the tool")?.contribution).toBeGreaterThan(0);
    expect(rows.get("curvature of the tool's reference")).toMatchObject({ contribution: 0, shared: "common, cancels" });
    if ("why" in shape) throw new Error(shape.why);
    expect(shape.shapes.map(({ of }) => of)).toEqual(["after the film", "before the film", "change by the film"]);
    const change = shape.shapes[2];
    const bow = change?.figures.find(({ name }) => name === "bow");
    // The mean change over the three points, 97 mm from the centre or on the rim of what was scanned: −κ r²/2.
    const r = Math.min(0.097, change?.map.radius ?? 0);
    expect((bow?.value.value ?? 0) / (-directions.change.mean.value * r * r * 0.5)).toBeCloseTo(1, 2);
    expect(analysis.mistakes).toHaveLength(16);
    expect(analysis.mistakes.filter(({ state }) => state === "seen")).toEqual([]);
  });

  test("gives its matched profiles as a file that reads back without a change, and its figures", async () => {
    const { getWaferProfiles } = await pages();
    const { profiles } = await getWaferProfiles(technician, waferId, null);
    for (const mark of ["point", "comma"] as const) {
      const read = readScanFile(new TextEncoder().encode(profilesCsv(profiles, mark)), "again.csv");
      if (read.outcome !== "read" || read.content.kind !== "profiles") throw new Error("the file asks a question");
      expect(read.content.profiles.map(({ along, x, z }) => ({ along, x: [...x], z: [...z] }))).toEqual(profiles);
      expect(profiles).toHaveLength(8);
    }
    const { film } = await page();
    if (!film?.analysis) throw new Error("no film");
    const lines = waferFiguresCsv("M-0412", "Polymer dielectric A", film.analysis).trim().split("\r\n");
    expect(lines[1]).toBe(
      `M-0412,Polymer dielectric A,film stress,thin-film relation,${film.analysis.stress.stoney.value},${film.analysis.stress.stoney.uncertainty},Pa,tension positive`,
    );
    expect(lines.filter((line) => line.includes(",bow,"))).toHaveLength(3);
  });

  test("with the same scans under two films is asked for by film", async () => {
    const before = await page();
    await asOwner(database, `update scan set film_id = null where wafer_id = ? and azimuth < 0.1`, [waferId]);
    const { getWaferPage } = await pages();
    const { films } = await page();
    expect(films.map(({ scans }) => scans).toSorted()).toEqual([1, 3]);
    const alone = films.find(({ name }) => name === "film not named");
    const { film } = await getWaferPage(technician, waferId, alone?.key ?? "");
    expect(film?.scans).toHaveLength(1);
    expect(film?.analysis?.directions.change.all).toBeNull();
    expect(film?.analysis?.shape).toHaveProperty("why");
    await asOwner(database, "update scan set film_id = ? where wafer_id = ?", [before.film?.filmId, waferId]);
  });

  test("without a study its budget holds the scatter alone and says so", async () => {
    await asOwner(database, "update repeatability_study set set_aside = 'test'");
    const { film } = await page();
    expect(film?.analysis?.budget.tools).toEqual([]);
    expect(film?.analysis?.budget.rows.map(({ input }) => input)).toContain("scatter of the scans");
    await asOwner(database, "update repeatability_study set set_aside = null");
  });

  test("is not there for a guest, nor for who has left the program", async () => {
    const guest = await scopeOfPerson(database, "guest");
    await expect(page(guest)).rejects.toMatchObject({ init: { status: 404 } });
    await leave(database, "engineer", "tern");
    const engineer = await scopeOfPerson(database, "engineer");
    await expect(page(engineer)).rejects.toMatchObject({ init: { status: 404 } });
  });
});
