/** Room to write by hand: a label and a rule of its own width. */
export function WriteIn({ label, width, strong = false }: { label: string; width: string; strong?: boolean }) {
  return (
    <span className="inline-flex items-end gap-[1.5mm] whitespace-nowrap">
      {strong ? <strong>{label}</strong> : label}
      <span className="mb-[0.8mm] inline-block border-b-[0.2mm] border-ink" style={{ width }} />
    </span>
  );
}
