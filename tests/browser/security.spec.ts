import { randomUUID } from "node:crypto";
import { request as rawRequest } from "node:http";
import { request as newRequest, type APIRequestContext } from "@playwright/test";
import { asOwner } from "./door-ids.ts";
import { accountOf, expect, test, type Role } from "./support.ts";

/*
 * What somebody with bad intent sends, as plain HTTP without a page: everything here is a request that no page of ours makes.
 */

/** Somebody's requests, signed in or not; redirects are answers. */
async function asking(baseURL: string | undefined, role: Role | null, headers: Record<string, string> = {}) {
  const context = await newRequest.newContext({ baseURL: baseURL ?? "", maxRedirects: 0, extraHTTPHeaders: headers });
  if (role !== null) expect((await signInBy(context, role)).status()).toBe(302);
  return context;
}

function signInBy(context: APIRequestContext, role: Role, next = "") {
  const { email, password } = accountOf(role);
  const query = next && `?next=${encodeURIComponent(next)}`;
  return context.post(`/sign-in${query}`, { form: { email, password }, maxRedirects: 0 });
}

/** An answer to a request whose path goes out letter by letter, which clients otherwise tidy up. */
function raw(baseURL: string | undefined, method: string, path: string): Promise<{ status: number; body: string }> {
  const { hostname, port } = new URL(baseURL ?? "");
  return new Promise((resolve, reject) => {
    rawRequest({ hostname, port, method, path }, (response) => {
      let body = "";
      response.setEncoding("utf8").on("data", (piece: string) => (body += piece));
      response.on("end", () => resolve({ status: response.statusCode ?? 0, body }));
    })
      .on("error", reject)
      .end();
  });
}

const cookieOf = async (context: APIRequestContext) => {
  const { cookies } = await context.storageState();
  return cookies.find(({ name }) => name === "planeward_session")?.value ?? "";
};
const programId = () =>
  asOwner(async (query) => (await query<{ id: string }>("select id from program where slug = 'tern'"))[0]?.id ?? "");

test("a path that climbs out of what is served leads nowhere", async ({ baseURL }) => {
  const climbing = [
    "/../package.json",
    "/assets/../../../package.json",
    "/assets/..%2f..%2f..%2fpackage.json",
    "/assets/%2e%2e/%2e%2e/%2e%2e/package.json",
    "/assets/%252e%252e/%252e%252e/package.json",
    "/assets/..%5c..%5c..%5cpackage.json",
    "/assets/....//....//package.json",
    "/%2e%2e/%2e%2e/etc/passwd",
    "/assets/%00/../../package.json",
    "/build/server/index.js",
    "/.planeward/secrets.json",
    "/.git/HEAD",
  ];
  for (const path of climbing) {
    const { status, body } = await raw(baseURL, "GET", path);
    expect(status, path).not.toBe(200);
    expect(status, path).toBeLessThan(500);
    expect(body, path).not.toMatch(/"dependencies"|root:|"database"|refs\/heads/);
  }
});

test("a method that nothing here answers is not answered", async ({ baseURL }) => {
  for (const method of ["TRACE", "TRACK", "CONNECTION"]) {
    const { status, body } = await raw(baseURL, method, "/sign-in").catch(() => ({ status: 0, body: "" }));
    expect(status === 0 || status >= 400, `${method} ${status}`).toBe(true);
    expect(body).not.toContain(method);
  }
});

test("the door leads to no other site, whatever it is told", async ({ baseURL }) => {
  const context = await asking(baseURL, "guest");
  const told = ["//e.example", "/\\e.example", "/\t/e.example", "/\n/e.example", "https://e.example", "\\\\e.example"];
  for (const next of told) {
    const { location = "" } = (await signInBy(context, "guest", next)).headers();
    expect(new URL(location, baseURL).origin, JSON.stringify(next)).toBe(new URL(baseURL ?? "").origin);
    const signedIn = await context.get(`/sign-in?next=${encodeURIComponent(next)}`);
    expect(new URL(signedIn.headers()["location"] ?? "", baseURL).href, JSON.stringify(next)).toBe(`${baseURL}/`);
    const back = await context.post("/saved-filters", { form: { intent: "forget", filter: randomUUID(), back: next } });
    expect(new URL(back.headers()["location"] ?? "", baseURL).origin, JSON.stringify(next)).toBe(
      new URL(baseURL ?? "").origin,
    );
  }
  await context.dispose();
});

test("a session has a token of its own making, and one that has ended opens nothing", async ({ baseURL }) => {
  const chosen = "chosen-by-somebody-else";
  const fixed = await asking(baseURL, null, { Cookie: `planeward_session=${chosen}` });
  const given = (await signInBy(fixed, "guest")).headers()["set-cookie"] ?? "";
  expect(given).not.toContain(chosen);
  expect(given).toMatch(/; HttpOnly; SameSite=Lax$/);
  expect((await fixed.get("/sheets")).status()).toBe(302);
  await fixed.dispose();

  const context = await asking(baseURL, "guest");
  const former = await cookieOf(context);
  await signInBy(context, "guest");
  expect(await cookieOf(context)).not.toBe(former);
  const latest = await cookieOf(context);
  await context.post("/sign-out", { form: {} });
  const replayed = await asking(baseURL, null, { Cookie: `planeward_session=${latest}` });
  expect((await replayed.get("/sheets")).status()).toBe(302);
  await Promise.all([context.dispose(), replayed.dispose()]);
});

test("a token counts in its header alone, and nothing else counts as one", async ({ baseURL }) => {
  const context = await asking(baseURL, "engineer");
  const form = { intent: "make", name: "Misused", program: await programId(), scopes: "stacks:read", days: "7" };
  const [token = ""] = /pwd_[\w-]{43}/.exec(await (await context.post("/tokens", { form })).text()) ?? [];
  expect(token).not.toBe("");
  const stranger = await asking(baseURL, null);
  expect((await stranger.get("/api/v1/stacks", { headers: { Authorization: `Bearer ${token}` } })).status()).toBe(200);
  for (const place of [`?access_token=${token}`, `?token=${token}`, `?api_key=${token}`])
    expect((await stranger.get(`/api/v1/stacks${place}`)).status(), place).toBe(401);
  const session = await cookieOf(context);
  const asHeaders: Record<string, string>[] = [
    { Authorization: `Basic ${Buffer.from(`x:${token}`).toString("base64")}` },
    { Authorization: `Bearer ${token}x` },
    { Authorization: `Bearer ${token.toUpperCase()}` },
    { Authorization: `Bearer ${session}` },
    { Authorization: "Bearer" },
    { "X-Api-Key": token },
    { Cookie: `planeward_session=${token}` },
  ];
  for (const headers of asHeaders)
    expect((await stranger.get("/api/v1/stacks", { headers })).status(), JSON.stringify(headers)).toBe(401);
  // With a token nobody makes another, nor anything else that a person makes.
  const bearing = { headers: { Authorization: `Bearer ${token}` }, form };
  for (const page of ["/tokens", "/webhooks", "/account"])
    expect((await stranger.post(page, bearing)).headers()["location"], page).toMatch(/^\/sign-in/);
  await Promise.all([context.dispose(), stranger.dispose()]);
});

test("of a form nothing is taken but its fields", async ({ baseURL }) => {
  const context = await asking(baseURL, "technician");
  const id = randomUUID();
  const program = await programId();
  const [other] = await asOwner((query) =>
    query<{ id: string }>("select id from person where email = ?", [accountOf("engineer").email]),
  );
  const smuggled = {
    id,
    createdBy: other?.id ?? "",
    created_by_id: other?.id ?? "",
    person: other?.id ?? "",
    siteRole: "administrator",
    site_role: "administrator",
    role: "process owner",
    state: "off",
    sealedSecret: "known",
    tokenHash: "known",
    expiresAt: "2099-01-01",
    "__proto__.siteRole": "administrator",
    "constructor.prototype.siteRole": "administrator",
  };
  const name = `Smuggled ${id}`;
  const hook = { name, program, address: "https://receiver.example/", events: "sheet.released" };
  expect((await context.post("/webhooks", { form: { ...smuggled, ...hook } })).status()).toBe(200);
  const token = { intent: "make", name, program, scopes: "stacks:read", days: "7" };
  expect((await context.post("/tokens", { form: { ...smuggled, ...token } })).status()).toBe(200);
  await context.post("/preferences", { form: { ...smuggled, theme: "dark" } });
  const stored = await asOwner(async (query) => ({
    hooks: await query(
      "select p.email, w.state, w.id = ? as given, w.sealed_secret = 'known' as known from webhook w join person p on p.id = w.created_by_id where w.name = ?",
      [id, name],
    ),
    tokens: await query(
      "select p.email, t.id = ? as given, t.token_hash = 'known' as known, t.expires_at < now() + interval '8 days' as soon from api_token t join person p on p.id = t.person_id where t.name = ?",
      [id, name],
    ),
    people: await query("select site_role from person where email = ?", [accountOf("technician").email]),
    roles: await query(
      "select distinct m.role from membership m join person p on p.id = m.person_id where p.email = ?",
      [accountOf("technician").email],
    ),
  }));
  const { email } = accountOf("technician");
  expect(stored).toEqual({
    hooks: [{ email, state: "on", given: false, known: false }],
    tokens: [{ email, given: false, known: false, soon: true }],
    people: [{ site_role: null }],
    roles: [{ role: "technician" }],
  });
  await context.dispose();
});
