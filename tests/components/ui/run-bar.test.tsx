import { renderToStaticMarkup } from "react-dom/server";
import { expect, test } from "vitest";
import { RunBar } from "#app/components/ui/RunBar.tsx";
import type { RunState } from "#app/components/ui/use-worker-run.ts";

const nothing = () => undefined;

function shown(state: RunState<string>, more: { done?: string; begin?: string } = {}): string {
  return renderToStaticMarkup(
    <RunBar
      state={state}
      label="Wafers drawn"
      noun="wafers"
      onStart={nothing}
      onStop={nothing}
      otherwise={<a href="/elsewhere">Let the server look</a>}
      {...more}
    />,
  );
}

test("while it runs: a bar with a name, its figures beside it, and a way to stop", () => {
  const html = shown({ kind: "running", done: 5120, of: 20_000, found: null });
  expect(html).toMatch(/<progress[^>]* aria-label="Wafers drawn"/);
  expect(html).toMatch(/value="5120"/);
  expect(html).toContain("5,120 of 20,000");
  expect(html).toContain(">Stop</button>");
});

test("before anything is known of its length the bar says no share", () => {
  const html = shown({ kind: "running", done: 0, of: 0, found: null });
  expect(html).toContain("Reading the inputs");
  expect(html).not.toMatch(/<progress[^>]* value=/);
});

test("stopped: where, and the way to begin again", () => {
  const html = shown({ kind: "stopped", done: 4, of: 15, found: "some" });
  expect(html).toMatch(/role="status"[^>]*>Stopped at 4 of 15 wafers\./);
  expect(html).toContain(">Start again</button>");
  expect(html).not.toContain("<progress");
  expect(shown({ kind: "stopped", done: 0, of: 0, found: null })).toContain("Stopped before it began.");
});

test("failed: why, another way, and the way to try again", () => {
  const html = shown({ kind: "failed", why: "The inputs could not be read.", found: null });
  expect(html).toContain("The inputs could not be read.");
  expect(html).toContain('href="/elsewhere"');
  expect(html).toContain(">Start again</button>");
});

test("done: nothing is left to say unless something is to be said", () => {
  expect(shown({ kind: "done", found: "all" })).toBe("");
  expect(shown({ kind: "done", found: "all" }, { done: "All of them." })).toContain("All of them.");
});

test("idle: no button, or the one that begins, and the place where its end will be said", () => {
  const html = shown({ kind: "idle", found: null });
  expect(html).toContain('role="status"');
  expect(html).not.toContain("<button");
  expect(shown({ kind: "idle", found: null }, { begin: "Draw 20,000 wafers" })).toContain(
    ">Draw 20,000 wafers</button>",
  );
});
