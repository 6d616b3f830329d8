import { asOwner } from "./door-ids.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

/** A lot of Tern that is held, so that it is on the floor without a sheet. */
const heldLot = (name: string) =>
  asOwner(async (query) => {
    const [lot] = await query<{ id: string }>(
      `insert into lot (id, program_id, name, note, created_at, created_by_id)
         select gen_random_uuid(), program_id, ?, '', now(), person_id from membership m
           join program p on p.id = m.program_id where p.slug = 'tern' and m.role = 'process owner' limit 1
         returning id`,
      [name],
    );
    await query(
      `insert into lot_hold (id, program_id, lot_id, cause, reason, opened_at, opened_by_id)
         select gen_random_uuid(), program_id, id, 'tool trouble', 'The chuck leaks', now(), created_by_id from lot where id = ?`,
      [lot?.id],
    );
  });

test.use({ refusals: true });

test("a place is handed over by one shift and taken by the next", async ({ page }) => {
  const lot = `H-${Date.now().toString(36)}`;
  const place = `Grinding bay ${Date.now().toString(36)}`;
  await heldLot(lot);
  await page.setViewportSize({ width: 390, height: 844 });
  await signIn(page, "technician");
  await page.goto("/floor");
  await page.getByRole("link", { name: /^Hand-overs/ }).click();
  await expectNoAxeFindings(page);
  await page.getByRole("link", { name: "Hand a place over" }).click();
  await expectNoAxeFindings(page);
  await page.getByLabel("Place", { exact: true }).fill(place);
  await page.getByRole("button", { name: "Hand it over" }).click();
  await expect(page.getByText("Tick the lots that are there.")).toBeVisible();
  await expect(page.getByLabel("Place", { exact: true })).toHaveValue(place);
  await page.getByRole("checkbox", { name: lot }).check();
  await page.getByRole("button", { name: "Hand it over" }).click();
  await expect(page.getByText("Say which carrier, frame or tool it is on.")).toBeVisible();
  await expect(page.getByRole("checkbox", { name: lot })).toBeChecked();
  await expectNoAxeFindings(page);
  await page.getByLabel(`Lot ${lot} is on`).fill("frame 7");
  await page.getByRole("button", { name: "Hand it over" }).click();
  await expect(page.getByText("The place is handed over.")).toBeVisible();
  await page.getByRole("link", { name: place }).click();
  await expect(page.getByText("Not taken yet; somebody else takes it.")).toBeVisible();
  await expect(page.getByRole("button", { name: "I take it over" })).toHaveCount(0);
  const address = page.url();

  await signIn(page, "shift lead");
  await page.goto(`/floor/hand-overs?place=${encodeURIComponent(place)}`);
  await page.getByRole("link", { name: place }).click();
  await expect(page).toHaveURL(address);
  await expect(page.getByText(`Lot ${lot} is held: tool trouble.`)).toBeVisible();
  await expect(page.getByText("frame 7")).toBeVisible();
  await expectNoAxeFindings(page);
  const take = page.getByRole("button", { name: "I take it over" });
  expect((await take.boundingBox())?.height).toBeGreaterThanOrEqual(104);
  await page.getByLabel("What you found otherwise").fill("All there");
  await take.click();
  await expect(page.getByText(/^Taken by /)).toBeVisible();
  await expect(page.getByText("“All there”")).toBeVisible();
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(390);
});
