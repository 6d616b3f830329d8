import { request as newRequest } from "@playwright/test";
import { accountOf, expect, signIn, test } from "./support.ts";

test("every page carries an enforced policy with a nonce of its own", async ({ request }) => {
  const [first, second] = [await request.get("/sign-in"), await request.get("/sign-in")];
  const policy = first.headers()["content-security-policy"] ?? "";
  expect(policy).toContain("default-src 'self'");
  expect(policy).toContain("frame-ancestors 'none'");
  expect(policy).not.toMatch(/script-src[^;]*'unsafe-inline'/);
  expect(policy).not.toBe(second.headers()["content-security-policy"]);
  const nonce = /'nonce-([^']+)'/.exec(policy)?.[1] ?? "none";
  const scripts = (await first.text()).match(/<script[^>]*>/g) ?? [];
  expect(scripts.length).toBeGreaterThan(0);
  for (const script of scripts) expect(script).toContain(`nonce="${nonce}"`);
  expect(first.headers()["x-content-type-options"]).toBe("nosniff");
  expect(first.headers()["referrer-policy"]).toBe("same-origin");
  expect(first.headers()["cache-control"]).toContain("no-store");
});

test("files are served as what they are and kept for good", async ({ request }) => {
  const page = await (await request.get("/sign-in")).text();
  const file = /\/assets\/[^"]+\.js/.exec(page)?.[0] ?? "";
  const answer = await request.get(file);
  expect(answer.headers()["x-content-type-options"]).toBe("nosniff");
  expect(answer.headers()["cache-control"]).toContain("immutable");
  for (const path of [file, "/unreachable.html", "/mark.svg"])
    expect((await request.get(path)).headers()["content-security-policy"], path).toBe("frame-ancestors 'none'");
});

test("a form that another site sends is not carried out", async ({ page, baseURL }) => {
  await signIn(page, "engineer");
  const cookies = await page.context().cookies();
  const foreign = await newRequest.newContext({
    baseURL: baseURL ?? "",
    extraHTTPHeaders: {
      Origin: "http://elsewhere.example",
      Cookie: cookies.map(({ name, value }) => `${name}=${value}`).join("; "),
    },
  });
  expect((await foreign.post("/sign-out", { form: {} })).status()).toBe(403);
  expect((await foreign.post("/api/v1/estimates", { data: {} })).status()).toBe(403);
  await foreign.dispose();
  await page.goto("/films");
  await expect(page.getByRole("heading", { name: "Films", level: 1 })).toBeVisible();
});

test("the session cookie is out of reach of scripts and of other sites' forms", async ({ page }) => {
  await signIn(page, "engineer");
  const [cookie, ...others] = await page.context().cookies();
  expect(others).toEqual([]);
  expect(cookie).toMatchObject({ name: "planeward_session", httpOnly: true, sameSite: "Lax" });
});

test("the token that a browser brings is never the one it is given at the door", async ({ page, baseURL }) => {
  const { email, password } = accountOf("engineer");
  await page
    .context()
    .addCookies([{ name: "planeward_session", value: "chosen by somebody else", url: baseURL ?? "" }]);
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page.getByRole("navigation", { name: "Places" })).toBeVisible();
  const [cookie] = await page.context().cookies();
  expect(cookie?.value).not.toContain("chosen");
});
