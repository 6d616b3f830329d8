import { afterEach, expect, test, vi } from "vitest";

afterEach(() => {
  vi.unstubAllEnvs();
  vi.resetModules();
});

async function sealing(secret: string | undefined) {
  vi.resetModules();
  vi.stubEnv("DATABASE_URL", "postgresql://nobody@127.0.0.1:1/none");
  vi.stubEnv("SECRET_KEY", secret);
  return import("#app/server/sealed-secret.server.ts");
}

const SECRET = "of-tests-and-nowhere-else-0123456789-0123456";

test("what is sealed is read again for its purpose alone, under the same secret alone", async () => {
  const { seal, unseal } = await sealing(SECRET);
  const sealed = seal("pwh_µ", "webhook 1");
  expect(sealed).not.toContain("pwh_");
  expect(unseal(sealed, "webhook 1")).toBe("pwh_µ");
  expect(seal("pwh_µ", "webhook 1")).not.toBe(sealed);
  expect(unseal(sealed, "webhook 2")).toBeNull();
  const parts = sealed.split(".");
  for (const index of [1, 2, 3]) {
    const part = parts[index] ?? "";
    const changed = parts.with(index, `${part.startsWith("A") ? "B" : "A"}${part.slice(1)}`);
    expect(unseal(changed.join("."), "webhook 1"), `part ${index}`).toBeNull();
  }
  for (const other of ["", "s1", "s2.a.b.c", parts.with(2, "").join(".")])
    expect(unseal(other, "webhook 1")).toBeNull();
  const again = await sealing(`${SECRET}0`);
  expect(again.unseal(sealed, "webhook 1")).toBeNull();
});

test("a key that is missing or short stops the start", async () => {
  for (const key of [undefined, "short"]) await expect(sealing(key)).rejects.toThrow(/SECRET_KEY: /);
});
