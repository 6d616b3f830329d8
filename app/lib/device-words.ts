/** What kind of device a browser says that it runs on. */
export function deviceWords(userAgent: string): string {
  if (userAgent === "") return "A device that says nothing of itself";
  return /Mobi/.test(userAgent) ? "A phone or tablet" : "A computer";
}
