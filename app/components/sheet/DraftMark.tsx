/** 'Draft, not for the floor' across a page, in outline: nobody works from it unaware, and what lies under it stays legible. */
export function DraftMark({ width, height }: { width: number; height: number }) {
  const angle = (-Math.atan2(height, width) * 180) / Math.PI;
  return (
    <svg
      className="pointer-events-none absolute inset-0 z-10 size-full max-tablet:hidden print:block"
      viewBox={`0 0 ${width} ${height}`}
      aria-hidden="true"
    >
      <text
        x={width / 2}
        y={height / 2}
        textAnchor="middle"
        dominantBaseline="middle"
        transform={`rotate(${angle} ${width / 2} ${height / 2})`}
        style={{ fontSize: 22, fontWeight: 600, fill: "none", stroke: "var(--edge)", strokeWidth: 0.35 }}
      >
        Draft, not for the floor
      </text>
    </svg>
  );
}
