/** One thing to choose, with the sentence that helps to choose it. */
export interface ExplainedChoice {
  id: string;
  name: string;
  words: string;
}

/** One piece of a kind of carrier. */
export interface PieceChoice {
  id: string;
  mark: string;
  /** id and name of its kind */
  carrier: string;
  carrierName: string;
  words: string;
}

/** What the form of a step offers. */
export interface StepChoices {
  films: ExplainedChoice[];
  tools: ExplainedChoice[];
  carriers: ExplainedChoice[];
  /** none where no piece may be named, as in a step for every flow */
  pieces: PieceChoice[];
  materials: ExplainedChoice[];
  tapes: ExplainedChoice[];
}
