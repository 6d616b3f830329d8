/**
 * A path within this site to go to next, or '/' for anything else: never another host. A control character makes it anything else: browsers
 * leave tabs and line ends out of an address, and '/', tab, '/elsewhere.example' would be another site's.
 */
export function localPath(asked: string | null): string {
  if (!asked || !/^\/(?!\/)[^\\\u0000-\u001f\u007f]*$/.test(asked)) return "/";
  return asked;
}
