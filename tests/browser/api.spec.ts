import type { APIRequestContext } from "@playwright/test";
import { expect, signIn, test } from "./support.ts";

const PATH = "/api/v1/estimates";
const FILM = {
  side: "front",
  thickness_m: 5e-6,
  stress_Pa: 100e6,
  youngs_modulus_Pa: 117e9,
  poissons_ratio: 0.34,
  cte_per_K: 16.7e-6,
};
const GOOD = { wafer: { diameter_m: 0.3, thickness_m: 775e-6, orientation: "100" }, films: [FILM] };

const post = (request: APIRequestContext, data: unknown) => request.post(PATH, { data });

/** A refusal as the API gives it: its media type, that status in the body too, and the faults. */
async function refusal(answer: Awaited<ReturnType<typeof post>>) {
  expect(answer.headers()["content-type"]).toBe("application/problem+json");
  const body = (await answer.json()) as {
    type: string;
    title: string;
    status: number;
    detail: string;
    errors?: unknown;
  };
  expect(body).toMatchObject({ type: "about:blank", status: answer.status() });
  expect([body.title, body.detail].every((text) => text.length > 0)).toBe(true);
  return body;
}

test.describe("as an engineer", () => {
  test.beforeEach(async ({ page }) => signIn(page, "engineer"));

  test("a stack is estimated", async ({ page }) => {
    const answer = await post(page.request, GOOD);
    expect(answer.status()).toBe(200);
    const body = (await answer.json()) as Record<string, Record<string, unknown>>;
    expect(body["shape"]?.["regime"]).not.toBe("curled");
    expect(body["shape"]?.["roll_radius_m"]).toBeNull();
    expect(body["stoney"]?.["bow_m"]).toBeLessThan(0);
    expect(body["support"]?.["class"]).toBe("bare");
    expect(JSON.stringify(body)).not.toMatch(/NaN|Infinity/);
  });

  test("curve and working come on request", async ({ page }) => {
    const answer = await post(page.request, {
      ...GOOD,
      temperature_K: 500,
      sweep: { from_m: 50e-6, to_m: 775e-6, points: 12 },
      working: true,
    });
    const body = (await answer.json()) as { sweep: unknown[]; working: { shape: { equation: string } } };
    expect(body.sweep).toHaveLength(12);
    expect(body.working.shape.equation).toMatch(/^free-wafer-/);
  });

  test("every fault is pointed at", async ({ page }) => {
    const answer = await post(page.request, {
      wafer: { diameter_m: "0.3", thickness_m: -1e-4, orientation: "110", tilt: 1 },
      films: [{ ...FILM, stress_Pa: undefined }],
    });
    expect(answer.status()).toBe(422);
    const { errors } = await refusal(answer);
    expect((errors as { pointer: string }[]).map(({ pointer }) => pointer).toSorted()).toEqual([
      "/films/0/stress_Pa",
      "/wafer/diameter_m",
      "/wafer/orientation",
      "/wafer/thickness_m",
      "/wafer/tilt",
    ]);
  });

  test("what the engine refuses is pointed at as well", async ({ page }) => {
    const films = [FILM, { ...FILM, cte_per_K: undefined }];
    const answer = await post(page.request, { ...GOOD, films, temperature_K: 400 });
    expect(answer.status()).toBe(422);
    expect((await refusal(answer)).errors).toMatchObject([{ pointer: "/films/1/cte_per_K" }]);
  });

  test("what is no JSON, too large or of another type is refused as such", async ({ page }) => {
    const send = (data: string, type = "application/json") =>
      page.request.post(PATH, { data: Buffer.from(data), headers: { "Content-Type": type } });
    for (const [answer, status] of [
      [await send("{"), 400],
      [await send(""), 400],
      [await send(JSON.stringify(GOOD), "text/plain"), 415],
      [await send(`"${"x".repeat(257 * 1024)}"`), 413],
    ] as const) {
      expect(answer.status()).toBe(status);
      await refusal(answer);
    }
  });

  test("only POST is allowed", async ({ page }) => {
    for (const method of ["GET", "PUT", "PATCH", "DELETE"]) {
      const answer = await page.request.fetch(PATH, { method });
      expect(answer.status()).toBe(405);
      expect(answer.headers()["allow"]).toBe("POST");
      await refusal(answer);
    }
  });

  test("a page of another site cannot ask", async ({ page }) => {
    const answer = await page.request.post(PATH, { data: GOOD, headers: { Origin: "http://elsewhere.example" } });
    expect(answer.status()).toBe(403);
  });
});

test("who is not signed in is asked to sign in", async ({ request }) => {
  const answer = await post(request, GOOD);
  expect(answer.status()).toBe(401);
  await refusal(answer);
});

test("guests are refused, the staff is not", async ({ browser }) => {
  for (const [role, status] of [
    ["guest", 403],
    ["technician", 200],
    ["shift lead", 200],
    ["process owner", 200],
  ] as const) {
    const context = await browser.newContext();
    const page = await context.newPage();
    await signIn(page, role);
    const answer = await post(page.request, GOOD);
    expect(answer.status(), role).toBe(status);
    if (status === 403) await refusal(answer);
    await context.close();
  }
});
