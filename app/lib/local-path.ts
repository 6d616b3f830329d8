/** A path within this site to go to next, or '/' for anything else: never another host. */
export function localPath(asked: string | null): string {
  if (!asked || !asked.startsWith("/") || asked.startsWith("//") || asked.includes("\\")) return "/";
  return asked;
}
