import type { ReadProfileFigures, ScanReadingDetail } from "#app/schemas/scan-reading.ts";
import { importProfileOf } from "./scan-reading/import-profile-of.ts";

/** A stored reading as the API gives it: SI, its units in the names. */
export function readingJson(detail: ScanReadingDetail) {
  const { content, file, settings, reading } = detail;
  return {
    id: detail.id,
    program: detail.program.slug,
    file: { id: file.id, name: file.name, size_bytes: file.size, sha256: file.hash },
    read_at: detail.createdAt,
    read_by: detail.createdBy,
    engine_version: detail.engineVersion,
    edge_exclusion_m: settings.edgeExclusion,
    /** reads the same file in the same way */
    import_profile: { ...importProfileOf(reading), ...settings.profile },
    kind: content.kind,
    ...(content.kind === "profiles"
      ? {
          rows: content.rows,
          faulty_rows: content.faulty,
          faults: content.faults,
          profiles: content.profiles.map(profileJson),
        }
      : { content }),
  };
}

function profileJson({ name, along, points, x, z, fit }: ReadProfileFigures) {
  return {
    name,
    along,
    points_in_file: points,
    points_kept: x.length < points ? "means of equal stretches" : "every point",
    fit: fit && {
      curvature_per_m: fit.curvature,
      curvature_standard_uncertainty_per_m: fit.standardUncertainty,
      curvature_expanded_uncertainty_per_m: fit.expandedUncertainty,
      rms_m: fit.rms,
      points_used: fit.used,
      points_rejected: fit.rejected,
      not_spherical: fit.notSpherical,
    },
    x_m: x,
    z_m: z,
  };
}
