/** Why what was sent is not taken, in words; it stands before everything else. */
export function FloorRefusal({ sentence }: { sentence: string | null }) {
  if (sentence === null) return null;
  return (
    <div role="alert" className="mb-4 border-2 border-stop bg-raised p-4">
      <p className="text-lead font-semibold text-stop">Not entered</p>
      <p className="text-lead">{sentence}</p>
    </div>
  );
}
