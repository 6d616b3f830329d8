import type { RateRow } from "./incident-rates.ts";

const MINUS = "\u2212";

/** A share in percent with as many digits as it needs to be told apart from nothing: '0.12 %'. */
export function percentWords(share: number): string {
  const percent = share * 100;
  if (percent === 0) return "0\u00A0%";
  const digits = percent >= 10 ? 0 : percent >= 1 ? 1 : Math.min(4, 1 - Math.floor(Math.log10(percent)));
  return `${percent.toFixed(digits).replace("-", MINUS)}\u00A0%`;
}

/** '1.2 % (0.3 to 4.1 %)'; null where nobody counted the wafers. */
export function rateWords({ rate }: Pick<RateRow, "rate">): string | null {
  if (!rate) return null;
  return `${percentWords(rate.share)} (${percentWords(rate.low).replace(/\u00A0%$/, "")} to ${percentWords(rate.high)})`;
}

/** How a row stands to all others: 'above' where its whole interval lies above the share of all, 'below' where under it. */
export function against({ rate }: Pick<RateRow, "rate">, all: Pick<RateRow, "rate">): "above" | "below" | null {
  if (!rate || !all.rate) return null;
  if (rate.low > all.rate.share) return "above";
  return rate.high < all.rate.share ? "below" : null;
}

/** What is known of all of them, in a sentence. */
export function ratesSentence(all: RateRow): string {
  const { incidents, broken, through } = all;
  if (incidents === 0 && through === 0)
    return "Nothing is known yet: no step was entered as done, and nothing reported.";
  const words = rateWords(all);
  const reported = `${incidents === 1 ? "1 incident" : `${incidents} incidents`}, ${broken === 1 ? "1 wafer" : `${broken} wafers`} broken or scrapped`;
  if (words === null) return `${reported}. Nobody has counted the wafers that went through, so there is no rate.`;
  return `${reported}. Of ${through} passes of a wafer through a step that were counted, ${words} ended in a broken or scrapped wafer.`;
}
