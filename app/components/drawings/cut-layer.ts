import type { MaterialKind } from "./CutMaterial.tsx";

/** One layer of a cut. Numbers are SI, what is printed comes as text. */
export interface CutLayer {
  role: "silicon" | "film" | "adhesive" | "carrier";
  kind: MaterialKind;
  /** Thickness, m, and as printed with its unit. */
  thickness: number;
  thicknessText: string;
  /** Film stress, Pa, tension positive: drawn as arrows, apart in tension and together in compression. */
  stress?: number;
  /** Share of the area that the layer covers, 0 to 1; below 1 a metal is drawn as lines in the polymer around it. */
  coverage?: number;
  name: string;
  /** At most three short lines under the name: stress with its word, what it is, where the value comes from. */
  notes: readonly string[];
  /** Adds the word 'assumed' in the colour of a caution as the last line. */
  assumed?: boolean;
  selected?: boolean;
}
