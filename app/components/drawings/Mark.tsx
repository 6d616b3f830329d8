import { colour } from "./colour.ts";

export interface MarkProps {
  /** Height in px; the mark is half as wide again. */
  size?: number;
}

/** The product's mark: a bowed wafer with its device side, over the plane it is measured from. Stands beside the name. */
export function Mark({ size = 24 }: MarkProps) {
  return (
    <svg width={size * 1.5} height={size} viewBox="0 0 39 26" aria-hidden="true">
      <path d="M1 19.5H38" stroke="currentColor" strokeDasharray="9 2 2 2" />
      <path d="M3 6.5Q19.5 27 36 6.5" fill="none" stroke={colour("silicon")} strokeWidth="3.2" />
      <path d="M3.6 3.3Q19.5 22.6 35.4 3.3" fill="none" stroke={colour("copper")} strokeWidth="1.2" />
    </svg>
  );
}
