/** What an editor's history is asked for. */
export type Direction = "undo" | "redo";

/** Control or command with Z takes back, with shift or with Y does again; null for every other key. */
export function undoKey({ ctrlKey, metaKey, altKey, shiftKey, key }: KeyboardEvent): Direction | null {
  if (!(ctrlKey || metaKey) || altKey) return null;
  const letter = key.toLowerCase();
  if (letter === "y") return "redo";
  return letter === "z" ? (shiftKey ? "redo" : "undo") : null;
}
