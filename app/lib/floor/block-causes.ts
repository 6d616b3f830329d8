/** Who clears a hold or a stop: the shift lead alone what the shift can settle, the process owner everything. */
export type ClearedBy = "shift lead" | "process owner";

/** Why a lot is held or a step stopped, and who may clear it. */
export const BLOCK_CAUSES = {
  "tool trouble": "shift lead",
  "carrier, tape or material missing": "shift lead",
  "waits for people or a tool": "shift lead",
  "reading beyond the sheet": "process owner",
  "wafer broken, chipped or cracked": "process owner",
  "sheet wrong or unclear": "process owner",
  "something else": "process owner",
} as const satisfies Record<string, ClearedBy>;

export type BlockCause = keyof typeof BLOCK_CAUSES;

export const BLOCK_CAUSE_NAMES = Object.keys(BLOCK_CAUSES) as [BlockCause, ...BlockCause[]];

/** 'shift lead or process owner': whom to ask. */
export function whoClears(cause: BlockCause): string {
  return BLOCK_CAUSES[cause] === "shift lead" ? "shift lead or process owner" : "process owner";
}
