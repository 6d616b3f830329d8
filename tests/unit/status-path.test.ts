import { expect, it } from "vitest";
import { statusPath, statusPathIn } from "#app/lib/status-path.ts";

const TOKEN = "H8SOoI4jsoC-KNoCO1w9qg";

it.each(["https://planeward.site.example", "http://10.0.0.7:3000"])(
  "a code made for %s leads to the status here",
  (origin) => {
    expect(statusPathIn(`${origin}${statusPath(TOKEN)}`)).toBe(`/s/${TOKEN}`);
    expect(statusPathIn(` ${origin}${statusPath(TOKEN)}\n`)).toBe(`/s/${TOKEN}`);
  },
);

it.each([
  "T-0412",
  `/s/${TOKEN}`,
  `https://planeward.site.example/s/${TOKEN}/more`,
  `https://planeward.site.example/s/short`,
  `https://planeward.site.example/s/${TOKEN}?to=//elsewhere.example`,
  `javascript:alert(1)//x/s/${TOKEN}`,
])("%s is no such code", (text) => {
  expect(statusPathIn(text)).toBeNull();
});
