import { expect, test } from "vitest";
import { localPath } from "#app/lib/local-path.ts";

test.each(["/", "/films?q=copper%20on", "/flows/1#steps", "/a//b"])("%s is followed", (path) => {
  expect(localPath(path)).toBe(path);
});

test.each([
  null,
  "",
  "films",
  "//elsewhere.example/",
  "///elsewhere.example/",
  "/\\elsewhere.example/",
  "\\\\elsewhere.example/",
  "/\t/elsewhere.example/",
  "/\n/elsewhere.example/",
  "/\r\nSet-Cookie: a=b",
  "\t//elsewhere.example/",
  "https://elsewhere.example/",
  "javascript:alert(1)",
])("%j leads home", (path) => {
  expect(localPath(path)).toBe("/");
  // Whatever it says, a browser stays on the site.
  expect(new URL(localPath(path), "https://planeward.site.example").host).toBe("planeward.site.example");
});
