import { beforeAll, describe, expect, test } from "vitest";
import { filmsCsv } from "#app/lib/film-csv/write.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const importing = () => import("#app/services/films/import-films.server.ts");
const library = () => import("#app/services/library/library.server.ts");

let engineer: ActorScope;
beforeAll(async () => {
  await Promise.all([importing(), library()]);
  engineer = await scopeOfPerson(database, "engineer");
}, 60_000);

const films = async () => (await library()).allOfLibrary(engineer, "film");
async function filmOf(name: string) {
  const film = (await films()).find((each) => each.name === name);
  if (!film) throw new Error(`no film ${name}`);
  return film;
}
async function planned(text: string) {
  const answer = await (await importing()).planFilmImport(engineer, text);
  if (answer.outcome !== "plan") throw new Error(JSON.stringify(answer));
  return answer.plan;
}
async function applied(text: string) {
  const { changed } = await planned(text);
  return (await importing()).applyFilmImport(engineer, text, new Map(changed.map(({ id, version }) => [id, version])));
}

const NEW = [
  "name;kind;stress_MPa;stress_source;youngs_modulus_GPa;youngs_modulus_source;poissons_ratio;poissons_ratio_source;expansion_ppm_per_K;expansion_source",
  "Trial oxide;inorganic;-80,5;assumed;70;handbook;0,17;handbook;0,5;handbook",
].join("\n");

describe("a table of films", () => {
  test.each(["point", "comma"] as const)(
    "that was downloaded with a %s changes nothing when it comes back",
    async (mark) => {
      const all = await films();
      expect(all.length).toBeGreaterThan(20);
      const plan = await planned(filmsCsv(all, mark));
      expect(plan).toMatchObject({ added: [], changed: [], refused: [], unread: [], same: all.length });
    },
  );

  test("says what it would change, and leaves out what has a fault", async () => {
    const text = [
      "name,stress_MPa,stress_tolerance_MPa,colour",
      "Polymer dielectric A,33,2,blue",
      "Plated copper A,2e9 MPa,,red",
      "Polymer dielectric A,34,2,blue",
      "Nobody knows,10,1,",
    ].join("\n");
    const plan = await planned(text);
    expect(plan.unread).toEqual(["colour"]);
    expect(plan.changed).toMatchObject([
      {
        row: 2,
        name: "Polymer dielectric A",
        changes: [{ label: "stress", to: expect.stringContaining("33.0 ± 2.0") as string }],
      },
    ]);
    expect(plan.changed[0]?.uses).toBeGreaterThan(0);
    expect(plan.refused.map(({ row }) => row)).toEqual([3, 4, 5]);
    expect(plan.refused[0]?.reasons.join()).toMatch(/^stress: .* is outside/);
    expect(plan.refused[1]?.reasons).toEqual(["stands in row 2 already"]);
    expect(plan.refused[2]?.reasons.join(" ")).toContain("kind: Choose the kind of film.");
  });

  test("is applied whole, with units of its heads, a decimal comma and what it leaves out as it was", async () => {
    const before = await filmOf("Titanium, sputtered");
    // A known film whose row leaves a value's source blank is left out, not half taken.
    const plan = await planned(`${NEW}\nTitanium, sputtered;;-90;;;;;;;\n`);
    expect(plan.added).toMatchObject([{ row: 2, name: "Trial oxide" }]);
    expect(plan.refused.map(({ name }) => name)).toEqual(["Titanium, sputtered"]);
    const own = `name;youngs_modulus_MPa;youngs_modulus_source\nTitanium, sputtered;121000;handbook\n`;
    expect(await applied(NEW)).toEqual({ outcome: "done", added: 1, changed: 0 });
    expect(await applied(own)).toEqual({ outcome: "done", added: 0, changed: 1 });
    expect((await filmOf("Trial oxide")).stress).toMatchObject({ value: -80.5e6, tolerance: null, source: "assumed" });
    const after = await filmOf("Titanium, sputtered");
    expect(after.youngsModulus).toMatchObject({ value: 121e9, source: "handbook" });
    expect(after.stress).toMatchObject(before.stress);
  });

  test("is not applied over what somebody saved since it was looked at", async () => {
    const text = 'name,stress_MPa\n"Silicon nitride, plasma, tensile",410\n';
    const { changed } = await planned(text);
    await asOwner(database, "update film set version = version + 1 where id = ?", [changed[0]?.id]);
    const seen = new Map(changed.map(({ id, version }) => [id, version]));
    const answer = await (await importing()).applyFilmImport(engineer, text, seen);
    expect(answer).toMatchObject({ outcome: "plan", conflict: expect.stringContaining("Somebody saved") as string });
    expect((await filmOf("Silicon nitride, plasma, tensile")).stress.value).not.toBe(410e6);
  });

  test("that is none is refused in words", async () => {
    const { planFilmImport } = await importing();
    for (const [text, reason] of [
      ["stress_MPa\n3", /names no column ‘name’/],
      ["name,stress_MPa,stress_GPa\nx,1,2", /stands there twice/],
      ["name\n", /no row below/],
      [`name\n${"x\n".repeat(2001)}`, /up to 2000/],
      ["name\n\uFFFD", /UTF-8/],
    ] as const)
      expect(await planFilmImport(engineer, text)).toMatchObject({
        outcome: "refused",
        reason: expect.stringMatching(reason) as string,
      });
  });

  test("is not for a technician, nor for a guest", async () => {
    const { planFilmImport, applyFilmImport } = await importing();
    for (const role of ["technician", "guest"]) {
      const scope = await scopeOfPerson(database, role);
      await expect(planFilmImport(scope, NEW)).rejects.toMatchObject({ init: { status: 403 } });
      await expect(applyFilmImport(scope, NEW, new Map())).rejects.toMatchObject({ init: { status: 403 } });
    }
  });

  test("keeps names that a spreadsheet would run", async () => {
    const odd = NEW.replace("Trial oxide", "'=cmd()");
    expect(await applied(odd)).toEqual({ outcome: "done", added: 1, changed: 0 });
    const csv = filmsCsv([await filmOf("=cmd()")]);
    expect(csv).toContain("\n'=cmd(),inorganic");
    expect(await planned(csv)).toMatchObject({ same: 1, added: [] });
  });
});
