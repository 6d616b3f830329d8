import { noBreak } from "#app/components/drawings/no-break.ts";

/** A figure of a flow with its unit. */
export interface FlowFigure {
  label: string;
  value: string;
}

/** The figures that say what kind of flow this is. */
export function FlowFigures({ figures }: { figures: readonly FlowFigure[] }) {
  return (
    <dl className="grid grid-cols-2 overflow-hidden border-t border-ink tablet:grid-cols-5">
      {figures.map(({ label, value }) => (
        <div
          key={label}
          className="-mt-px -ml-px border-t border-l border-line px-4 py-2 max-tablet:first:col-span-2 nth-[6]:col-span-full tablet:px-6"
        >
          <dt className="text-label text-quiet">{label}</dt>
          <dd className="text-lead font-medium">{noBreak(value)}</dd>
        </div>
      ))}
    </dl>
  );
}
