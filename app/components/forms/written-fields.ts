/** Whether the page's scripts answered before, so that what is drawn now is drawn by them and nobody has typed into it. */
export const scriptsWereAtWork = () => document.documentElement.dataset["scripts"] === "at work";

/** Whether a field holds something else than what the page was written with: typed before the scripts came, or put back by the browser. */
export function isEditedField(element: Element): boolean {
  if (element instanceof HTMLSelectElement) {
    const written = writtenOptions(element);
    // Where the page's text chose none, a browser chooses the first.
    return written.length > 0 ? !written.every(({ selected }) => selected) : element.selectedIndex > 0;
  }
  if (element instanceof HTMLTextAreaElement) return element.value !== element.defaultValue;
  if (!(element instanceof HTMLInputElement)) return false;
  return isTick(element) ? element.checked !== element.defaultChecked : element.value !== element.defaultValue;
}

const writtenOptions = ({ options }: HTMLSelectElement) =>
  [...options].filter(({ defaultSelected }) => defaultSelected);
const isTick = ({ type }: HTMLInputElement) => type === "checkbox" || type === "radio";
