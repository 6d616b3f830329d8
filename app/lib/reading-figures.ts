import { fitScan } from "#app/engine/profile/fit-scan.ts";
import type { ReadProfileFigures, ScanReadingResult } from "#app/schemas/scan-reading.ts";
import { profilePoints } from "./scan-reading/profile-points.ts";
import type { FileProfile } from "./scan-reading/profile-rows.ts";
import { ScanFileError } from "./scan-reading/refusal.ts";
import type { ScanRead } from "./scan-reading/scan-reader.ts";

/**
 * What a file says, with a parabola through all points of each of its profiles.
 * @throws ScanFileError for a file that leaves a question open, with every question in its sentence; EngineInputError for a profile
 *   that gives no curvature
 */
export function readingFigures(fileName: string, read: ScanRead, edgeExclusion: number): ScanReadingResult {
  const { reading } = read;
  if (read.outcome === "question") {
    const open = reading.ambiguities.filter(({ blocks }) => blocks).map(({ sentence }) => sentence);
    throw new ScanFileError(`${fileName}: ${open.join(" ")}`);
  }
  const { content } = read;
  if (content.kind !== "profiles") return { reading, content };
  const { rows, faulty, faults } = content;
  const profiles = content.profiles.map((profile) => fitted(profile, edgeExclusion));
  return { reading, content: { kind: "profiles", profiles, rows, faulty, faults } };
}

function fitted(profile: FileProfile, edgeExclusion: number): ReadProfileFigures {
  const { position, height, name, along } = profile;
  const kept = profilePoints(profile);
  const [x, z] = [kept.map((point) => point.x), kept.map((point) => point.z)];
  const about = { position, height, name, along, points: profile.x.length, x, z };
  if (along === "radius") return { ...about, fit: null };
  const { curvature, standardUncertainty, expandedUncertainty, rms, used, rejected, shape } = fitScan(profile, {
    edgeExclusion,
    robust: true,
  });
  return {
    ...about,
    fit: {
      curvature,
      standardUncertainty,
      expandedUncertainty,
      rms,
      used,
      rejected: rejected.length,
      notSpherical: shape.notSpherical,
    },
  };
}
