/** One thing to choose, with the sentence that helps to choose it. */
export interface ExplainedChoice {
  id: string;
  name: string;
  words: string;
}

/** What the form of a step offers. */
export interface StepChoices {
  films: ExplainedChoice[];
  tools: ExplainedChoice[];
  carriers: ExplainedChoice[];
  materials: ExplainedChoice[];
  tapes: ExplainedChoice[];
}
