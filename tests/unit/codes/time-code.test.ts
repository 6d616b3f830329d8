import { generateSync } from "otplib";
import { expect, test } from "vitest";
import { appAddress, newTimeSecret, stepOfCode } from "#app/services/codes/time-code.ts";

/** RFC 6238, appendix B: seconds since 1970 and the code of eight digits with SHA-1; its secret is the ASCII text 12345678901234567890. */
const APPENDIX_B = [
  [59, "94287082"],
  [1_111_111_109, "07081804"],
  [1_111_111_111, "14050471"],
  [1_234_567_890, "89005924"],
  [2_000_000_000, "69279037"],
  [20_000_000_000, "65353130"],
] as const;
const SECRET = "GEZDGNBVGY3TQOJQGEZDGNBVGY3TQOJQ";

test.each(APPENDIX_B)("at %d s the code is that of the standard", (at, eight) => {
  expect(generateSync({ secret: SECRET, epoch: at, digits: 8 })).toBe(eight);
  // Fewer digits are the last ones of more: both are one number modulo a power of ten (RFC 4226, 5.3).
  expect(stepOfCode(SECRET, eight.slice(2), at, null)).toBe(Math.floor(at / 30));
});

const at = (step: number) => step * 30 + 15;
const codeOf = (step: number) => generateSync({ secret: SECRET, epoch: at(step) });

test("a clock may be one step ahead or behind, and no more", () => {
  const now = 59_000_000;
  for (const drift of [-1, 0, 1]) expect(stepOfCode(SECRET, codeOf(now + drift), at(now), null)).toBe(now + drift);
  for (const drift of [-2, 2, -20, 20]) expect(stepOfCode(SECRET, codeOf(now + drift), at(now), null)).toBeNull();
});

test("a code counts once: neither its step nor one before the newest that was taken is good again", () => {
  const now = 59_000_000;
  expect(stepOfCode(SECRET, codeOf(now), at(now), now)).toBeNull();
  expect(stepOfCode(SECRET, codeOf(now - 1), at(now), now)).toBeNull();
  expect(stepOfCode(SECRET, codeOf(now + 1), at(now), now)).toBe(now + 1);
});

test("what is no code of six digits is not good, whatever it is", () => {
  for (const typed of ["", "12345", "1234567", "12345a", "１２３４５６", " 123456", "-12345"])
    expect(stepOfCode(SECRET, typed, at(1), null)).toBeNull();
});

test("a secret has 160 random bits, and its address says what apps ask for", () => {
  const secrets = new Set(Array.from({ length: 100 }, newTimeSecret));
  expect(secrets.size).toBe(100);
  for (const secret of secrets) expect(secret).toMatch(/^[A-Z2-7]{32}$/);
  const address = new URL(appAddress(SECRET, "engineer@kestrel-ridge.example"));
  expect(address.protocol).toBe("otpauth:");
  expect(decodeURIComponent(address.pathname)).toContain("Planeward:engineer@kestrel-ridge.example");
  expect(address.searchParams.get("secret")).toBe(SECRET);
});
