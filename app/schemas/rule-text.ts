/** A limit of the site with the value that was delivered. Texts, so that the rules themselves stay out of the browser. */
export interface RuleLimit {
  title: string;
  value: string;
  /** null where the site kept the delivered one */
  delivered: string | null;
  source: string;
}

/** A handling rule in words. */
export interface RuleText {
  number: number;
  title: string;
  asks: string;
  /** null for guests, who see no values of the site */
  limits: RuleLimit[] | null;
}
