import type { EstimateAnswer } from "./estimate.ts";

/** A stack in a list, with what its free wafer does; `answer` is null where that cannot be computed. */
export interface StackRow {
  id: string;
  name: string;
  program: string;
  diameter: number;
  thickness: number;
  films: number;
  updatedAt: string;
  updatedBy: string;
  answer: EstimateAnswer | null;
}
