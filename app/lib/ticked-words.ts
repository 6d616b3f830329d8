import { count } from "./count-words.ts";

/** What can be done with rows that are ticked. */
export interface TickAction {
  /** what the button says */
  label: string;
  /** where what is ticked is sent, as `of` */
  to: string;
  /** 'get' opens a page about what is ticked, 'post' does it there and then */
  method?: "get" | "post";
  /** how many it takes, from 1 on when not said */
  least?: number;
  most?: number;
  /** takes something away */
  removes?: boolean;
  /** answers with a file, not with a page */
  file?: boolean;
}

/** Why an action does not take so many, with what to do; null when it does, or when nothing is ticked. */
function unfit({ label, least = 1, most = Infinity }: TickAction, ticked: number): string | null {
  if (ticked === 0) return null;
  if (ticked < least) return `${label}: tick ${count(least - ticked)} more.`;
  return ticked > most ? `${label}: at most ${count(most)}, untick ${count(ticked - most)}.` : null;
}

/** What the bar says of the number that is ticked. */
export function tickedWords(ticked: number, [one, many]: readonly [string, string], actions: readonly TickAction[]) {
  if (ticked === 0) return `No ${one} ticked.`;
  const reasons = actions.map((action) => unfit(action, ticked)).filter((reason) => reason !== null);
  return [`${ticked} ${ticked === 1 ? one : many} ticked.`, ...reasons].join(" ");
}
