const PATHS = {
  up: "M3 10.5 8 5.5l5 5",
  down: "M3 5.5l5 5 5-5",
  copy: "M5.5 5.5V2.5h8v8h-3M2.5 5.5h8v8h-8z",
  insert: "M8 5v8M4 9h8M2 2.5h12",
  remove: "M4 4l8 8M12 4l-8 8",
  drag: "M5 3.5h2M9 3.5h2M5 8h2M9 8h2M5 12.5h2M9 12.5h2",
  undo: "M5.5 3 2.5 6l3 3M2.5 6h7a3.5 3.5 0 0 1 0 7H6",
  redo: "M10.5 3l3 3-3 3M13.5 6h-7a3.5 3.5 0 0 0 0 7H10",
  more: "M2.5 8h2M7 8h2M11.5 8h2",
} as const;

/** Sign of what can be done to a row; the button that holds it carries the words. */
export function StepIcon({ kind }: { kind: keyof typeof PATHS }) {
  return (
    <svg
      width="16"
      height="16"
      viewBox="0 0 16 16"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.5"
      aria-hidden="true"
    >
      <path d={PATHS[kind]} />
    </svg>
  );
}
