import { WriteIn } from "./WriteIn.tsx";

/** What to do when a wafer breaks, and whom to call. */
export function Emergency() {
  return (
    <div className="space-y-[1mm] text-[11pt]/[14pt]">
      <h2 className="inline font-semibold">If a wafer breaks: stop.</h2>{" "}
      <p className="inline">Razor-sharp shards: gloves and eye protection. Site procedure; tell the shift lead.</p>
      <p className="flex flex-col gap-[0.6mm]">
        <WriteIn label="Shift lead" width="36mm" />
        <WriteIn label="Process owner" width="28mm" />
      </p>
    </div>
  );
}
