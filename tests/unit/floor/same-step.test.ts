import { expect, test } from "vitest";
import { concernsStep } from "#app/lib/floor/same-step.ts";

const STOP = { revision: "a", step: 4, title: "Grind" };
const ALL = [{ title: "Receive" }, { title: "Grind" }, { title: "Clean" }];

test("a stop concerns its own number in the revision that it was made in", () => {
  expect(concernsStep(STOP, "a", { number: 4, title: "Grind" }, ALL)).toBe(true);
  expect(concernsStep(STOP, "a", { number: 5, title: "Grind" }, ALL)).toBe(false);
});

test("in another revision it concerns the step of the same name, wherever that stands", () => {
  expect(concernsStep(STOP, "b", { number: 2, title: "Grind" }, ALL)).toBe(true);
  expect(concernsStep(STOP, "b", { number: 4, title: "Clean" }, ALL)).toBe(false);
});

test("where the name is gone it stays at its number, so that no stop is lost", () => {
  const renamed = [{ title: "Receive" }, { title: "Grind fine" }];
  expect(concernsStep(STOP, "b", { number: 4, title: "Grind fine" }, renamed)).toBe(true);
});
