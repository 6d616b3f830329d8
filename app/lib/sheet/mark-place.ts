import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "../paper-size.ts";

/** Width of the outline of a mark, mm. */
export const MARK_LINE = 0.45;

/** Where a mark lies across the frame: from corner to corner, as large as its words leave room for; mm, and degrees clockwise. */
export interface MarkPlace {
  x: number;
  y: number;
  angle: number;
  size: number;
}

/** Share of the diagonal that the words may take. */
const SHARE = 0.72;
const LARGEST = 34;

/** @param widthAtOne width of the words at a size of one */
export function markPlace(paper: Paper, widthAtOne: number): MarkPlace {
  const { width, height } = PAPERS[paper];
  const [across, down] = [width - FILING_MARGIN - MARGIN, height - 2 * MARGIN];
  return {
    x: FILING_MARGIN + across / 2,
    y: MARGIN + down / 2,
    angle: (-Math.atan2(down, across) * 180) / Math.PI,
    size: Math.min(LARGEST, (SHARE * Math.hypot(across, down)) / widthAtOne),
  };
}
