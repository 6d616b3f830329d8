import { beforeAll, expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const pages = () => import("#app/services/library/kind-pages.server.ts");

// The first import reads the whole server: that is no test's time.
beforeAll(async () => void (await pages()), 60_000);

test("a list is filtered and sorted by what its address says, and an unknown word changes nothing", async () => {
  const { listKind } = await pages();
  const scope = await scopeOfPerson(database, "technician");
  const names = async (search: string) =>
    (await listKind(scope, "bonding-materials", new URLSearchParams(search))).page.rows.map(({ name }) => name);
  const all = await names("");
  const [flowing, crossLinked] = [await names("class=flows"), await names("class=cross-linked")];
  expect(flowing.length).toBeGreaterThan(0);
  expect([...flowing, ...crossLinked].sort()).toEqual([...all].sort());
  expect(await names("class=no+such+class&sort=nothing")).toEqual(all);
  const limits = (await listKind(scope, "bonding-materials", new URLSearchParams("sort=-limit"))).page.rows.map(
    ({ temperatureLimit }) => temperatureLimit.value,
  );
  expect(limits).toEqual(limits.toSorted((a, b) => b - a));
});

test("a record's page names the flows that use it, only those of the reader's programs", async () => {
  const { getKindPage, listKind } = await pages();
  const engineer = await scopeOfPerson(database, "engineer");
  const { page } = await listKind(engineer, "tools", new URLSearchParams("q=Reflow oven"));
  const id = page.rows[0]?.id;
  const uses = (scope: typeof engineer) =>
    getKindPage(scope, "tools", id, new URLSearchParams()).then((data) =>
      data.uses.map(({ kind, name }) => [kind, name]),
    );
  const tern = ["flow", "Tern T-2, to 100 µm on tape"];
  const all = await uses(engineer);
  expect(all).toContainEqual(tern);
  const elsewhere = engineer.actor.memberships.filter(({ programSlug }) => programSlug !== "tern");
  expect(await uses({ ...engineer, actor: { ...engineer.actor, memberships: elsewhere } })).toEqual(
    all.filter(([, name]) => !name?.startsWith("Tern")),
  );
});

test("a carrier is tried with a material that can let go of it, and with what the address asks for", async () => {
  const { getKindPage, listKind } = await pages();
  const scope = await scopeOfPerson(database, "engineer");
  const find = async (slug: "carriers" | "bonding-materials", name: string) => {
    const { page } = await listKind(scope, slug, new URLSearchParams({ q: name }));
    return page.rows[0]?.id ?? "";
  };
  const glass = await find("carriers", "Glass carrier 3.0 ppm");
  const laser = await find("bonding-materials", "Laser-release adhesive B");
  const trial = async (id: string, search: Record<string, string>) =>
    (await getKindPage(scope, "carriers", id, new URLSearchParams(search))).trial;
  expect((await trial(glass, {}))?.pair).toMatchObject({ cannotRelease: null, siliconLeft: 775e-6 });
  const tried = await trial(glass, { material: laser, silicon: "50 um" });
  expect(tried?.pair).toMatchObject({
    material: { name: "Laser-release adhesive B" },
    bondThickness: expect.closeTo(50e-6, 12),
    siliconLeft: expect.closeTo(50e-6, 12),
  });
  for (const silicon of ["12 parsecs", "-5 um", "900 um"]) {
    const refused = await trial(glass, { silicon });
    expect(refused).toMatchObject({ pair: null, chosen: { silicon } });
    expect(refused?.fault).toBeTruthy();
  }
  const silicon = await find("carriers", "Silicon carrier 775 µm");
  expect((await trial(silicon, { material: laser }))?.pair?.cannotRelease).toContain("laser through glass");
});

test("every kind is kept by process owners and administrators, read by the staff, and closed to guests", async () => {
  const { listKind } = await pages();
  const mayEdit = async (account: string) =>
    (await listKind(await scopeOfPerson(database, account), "silicon", new URLSearchParams())).mayEdit;
  expect(await mayEdit("process-owner")).toBe(true);
  expect(await mayEdit("administrator")).toBe(true);
  for (const account of ["engineer", "technician", "shift-lead"]) expect(await mayEdit(account)).toBe(false);
  await expect(mayEdit("guest")).rejects.toMatchObject({ init: { status: 403 } });
});

test("a record that is no kind of this place is not there", async () => {
  const { getKindPage, requireKind } = await pages();
  const scope = await scopeOfPerson(database, "engineer");
  const [film] = await asOwner<{ id: string }>(database, "select id from film limit 1");
  await expect(getKindPage(scope, "carriers", film?.id, new URLSearchParams())).rejects.toMatchObject({
    init: { status: 404 },
  });
  for (const word of [undefined, "films", "limits", "constructor", "__proto__"]) {
    let refused: unknown;
    try {
      requireKind(word);
    } catch (error) {
      refused = error;
    }
    expect(refused).toMatchObject({ init: { status: 404 } });
  }
});
