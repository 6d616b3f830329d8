const ID = "[0-9a-f]{8}-[0-9a-f-]{27}";

/**
 * The main pages, those of records with the first record of the demo.
 *
 * @param {import("./signed-in.mjs").SignedIn} person
 * @returns {Promise<Record<string, string>>}
 */
export async function addresses({ context }) {
  const page = await context.newPage();
  const records = async (/** @type {string} */ list, /** @type {string} */ kind) => {
    await page.goto(list);
    const links = await page
      .locator("main a[href]")
      .evaluateAll((all) => all.map((link) => link.getAttribute("href") ?? ""));
    return [...new Set(links.filter((href) => new RegExp(`^/${kind}/${ID}$`).test(href)))];
  };
  const stacks = await records("/stacks", "stacks");
  const [flow] = await records("/flows", "flows");
  const [film] = await records("/films", "films");
  const [assessment] = await records("/sheets", "assessments");
  const [scan] = await records("/scans", "scans");
  await page.close();
  const ids = stacks.map((path) => path.split("/").at(-1));
  return {
    "sign-in": "/sign-in",
    Today: "/",
    films: "/films",
    film: film ?? "",
    stacks: "/stacks",
    "stack editor": stacks[0] ?? "",
    "stacks compared": `/stacks/compare?of=${ids.slice(0, 6).join(",")}`,
    flows: "/flows",
    flow: flow ?? "",
    assessment: assessment ?? "",
    sheet: (assessment ?? "").replace("assessments", "sheets"),
    carriers: "/carriers/carriers",
    scans: "/scans",
    scan: scan ?? "",
    method: "/method",
    search: "/search?q=copper",
    preferences: "/preferences",
  };
}
