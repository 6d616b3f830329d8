import { Swatch } from "#app/components/drawings/Swatch.tsx";

/** Something unusual that does not block: the swatch of a caution and words. */
export function Remark({ children }: { children: string }) {
  return (
    <p className="mt-1 flex items-baseline gap-1.5 text-label text-caution">
      <Swatch level="caution" />
      <span>{children}</span>
    </p>
  );
}
