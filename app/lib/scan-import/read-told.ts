import { profilePoints } from "#app/lib/scan-reading/profile-points.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import { scanReader, type FileContent } from "#app/lib/scan-reading/scan-reader.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { azimuthOfHead } from "./name-guess.ts";
import { UNTOLD, type Told } from "./told.ts";

/** Points that a small plot can show. */
const DRAWN_POINTS = 300;

/**
 * Reads a file as it comes and tells what the page shows of it. What it refuses is told too, with its form where that is known.
 * @param onBytes is told how many bytes are read
 */
export async function readTold(
  pieces: AsyncIterable<Uint8Array>,
  name: string,
  profile: ImportProfile,
  onBytes: (done: number) => void = () => undefined,
): Promise<Told> {
  const reader = scanReader(name, profile);
  try {
    let done = 0;
    for await (const bytes of pieces) {
      done += bytes.length;
      const more = reader.push(bytes);
      onBytes(done);
      if (!more) break;
    }
    const read = reader.end();
    const layout = { reading: read.reading, preview: read.preview };
    if (read.outcome === "question") return { ...UNTOLD, outcome: "question", layout };
    return { ...UNTOLD, outcome: "read", layout, ...shown(read.content) };
  } catch (error) {
    if (!(error instanceof ScanFileError)) throw error;
    return { ...UNTOLD, outcome: "refused", sentence: error.message, layout: reader.layout(), faults: error.faults };
  }
}

function shown(content: FileContent): Pick<Told, "profiles" | "rows" | "faults" | "footerLines"> {
  const { faults } = content;
  if (content.kind !== "profiles") {
    const rows = content.kind === "thickness map" ? content.sites.length : content.wafers.length;
    return { profiles: [], rows, faults, footerLines: content.footerLines };
  }
  return {
    profiles: content.profiles.map((profile) => ({
      name: profile.name,
      azimuth: azimuthOfHead(profile.name),
      points: profile.x.length,
      trace: profilePoints(profile, DRAWN_POINTS).toSorted((one, other) => one.x - other.x),
    })),
    rows: content.rows,
    faults,
    footerLines: content.footer?.lines ?? 0,
  };
}
