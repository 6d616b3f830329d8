import { readTold } from "./read-told.ts";
import { unreadable, type FileAsked, type FileSaid } from "./told.ts";

/** How often progress is told at most, ms. */
const TOLD_EVERY = 60;

const say = (said: FileSaid) => globalThis.postMessage(said);

/** Bytes of a file as the browser reads them from the disk. */
async function* piecesOf(file: File): AsyncGenerator<Uint8Array> {
  const reader = file.stream().getReader();
  try {
    for (;;) {
      const { done, value } = await reader.read();
      if (done) return;
      yield value;
    }
  } finally {
    await reader.cancel();
  }
}

async function read({ key, revision, file, profile }: FileAsked): Promise<void> {
  let told = -Infinity;
  const onBytes = (done: number) => {
    const now = performance.now();
    if (now - told < TOLD_EVERY) return;
    told = now;
    say({ key, revision, kind: "progress", done, of: file.size });
  };
  say({ key, revision, kind: "told", told: await readTold(piecesOf(file), file.name, profile, onBytes).catch(unread) });
}

/** A file that was moved, renamed or rewritten since it was chosen. */
const unread = (error: unknown) =>
  unreadable(
    error instanceof DOMException
      ? "The browser cannot read this file any more. Choose it again."
      : "This file could not be read in the browser. Export it anew, or upload the pair by the form.",
  );

/** The revision that was last asked for, by file: an earlier one need not be read any more. */
const newest = new Map<string, number>();
let last = Promise.resolve();

/** Reads one file after the other, as they are asked for; nothing leaves the browser. */
globalThis.addEventListener("message", ({ data }: MessageEvent<FileAsked>) => {
  newest.set(data.key, data.revision);
  last = last.then(() => (newest.get(data.key) === data.revision ? read(data) : undefined));
});
