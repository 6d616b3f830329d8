import { z } from "zod";
import type { UnitSymbol } from "#app/engine/working.ts";
import type { ShapeRegime, SupportClass } from "#app/engine/vocabulary.ts";
import type { ShownWorking } from "#app/lib/shown-working.ts";
import type { PhysicalRange } from "#app/lib/read-quantity.ts";
import { RULES } from "./ranges.ts";

/** A number in SI within the widest range that makes sense of it. */
function si(unit: UnitSymbol, range: PhysicalRange) {
  return z
    .number({
      error: ({ input }) =>
        input === undefined
          ? `is missing: a number in ${unit}`
          : typeof input === "number"
            ? "is not a finite number"
            : `has to be a number in ${unit}`,
    })
    .refine((value) => value >= range.least && value <= range.most, {
      // What is wrong by itself is not set against its neighbours as well.
      abort: true,
      error: ({ input }) => `${String(input)} ${unit} is outside ${range.words}`.replace(" 1 is", " is"),
    });
}

/** Half the width of an interval that holds a number of that range. */
const halfWidth = (unit: UnitSymbol, { least, most }: PhysicalRange) =>
  si(unit, { least: 0, most: most - least, words: "zero to the width of the range" });

const required = (expected: string) => ({
  error: ({ input }: { input?: unknown }) =>
    input === undefined ? `is missing: ${expected}` : `has to be ${expected}`,
});
const object = required("an object");

const wafer = z.strictObject(
  {
    diameter_m: si("m", RULES.diameter.range),
    thickness_m: si("m", RULES.siliconThickness.range),
    thickness_tolerance_m: si("m", {
      least: 0,
      most: RULES.siliconThickness.range.most,
      words: "zero to 2 mm",
    }).optional(),
    orientation: z.enum(["100", "111"], required("'100' or '111'")),
  },
  object,
);

const film = z.strictObject(
  {
    side: z.enum(["front", "back"], required("'front' or 'back'")),
    thickness_m: si("m", RULES.filmThickness.range),
    stress_Pa: si("Pa", RULES.stress.range),
    youngs_modulus_Pa: si("Pa", RULES.modulus.range),
    poissons_ratio: si("1", RULES.poissonsRatio.range),
    cte_per_K: si("1/K", RULES.expansion.range).optional(),
    reference_temperature_K: si("K", RULES.temperature.range).optional(),
    coverage: si("1", RULES.coverage.range).optional(),
    lines: z
      .strictObject(
        { width_m: si("m", RULES.lineWidth.range), direction_rad: si("rad", RULES.lineDirection.range) },
        object,
      )
      .optional(),
    thickness_tolerance_m: halfWidth("m", RULES.filmThickness.range).optional(),
    stress_tolerance_Pa: halfWidth("Pa", RULES.stress.range).optional(),
  },
  object,
);

const sweep = z.strictObject(
  {
    from_m: si("m", RULES.siliconThickness.range),
    to_m: si("m", RULES.siliconThickness.range),
    points: z.int(required("a whole number")).min(2, "has to be 2 to 500").max(500, "has to be 2 to 500"),
  },
  object,
);

/**
 * What `POST /api/v1/estimates` is asked: films on a free silicon wafer, SI units in the names. Films of a side are listed from
 * the silicon outwards. `stress_Pa` is that at the film's reference temperature on a thick wafer held flat, tension positive;
 * `cte_per_K` is needed as soon as a temperature differs from the reference, 298.15 K. `sweep` asks for the curve of warp against
 * silicon thickness, `working` for the calculations. `lines` cuts a
 * film into parallel lines that cover its `coverage`, at `direction_rad` counter-clockwise from x, the notch axis, seen from the
 * device side. Tolerances are half-widths; a value without one counts as exact.
 */
export const estimateSchema = z
  .strictObject(
    {
      wafer,
      films: z.array(film, required("a list of films, which may be empty")).max(60, "holds at most 60 films"),
      temperature_K: si("K", RULES.temperature.range).optional(),
      sweep: sweep.optional(),
      working: z.boolean("has to be true or false").optional(),
    },
    object,
  )
  .superRefine((request, context) => {
    const fail = (path: string[], message: string) => context.addIssue({ code: "custom", path, message });
    const { thickness_m, thickness_tolerance_m = 0 } = request.wafer;
    if (thickness_tolerance_m >= thickness_m)
      fail(["wafer", "thickness_tolerance_m"], "is as large as the silicon itself");
    request.films.forEach(({ thickness_m: film, thickness_tolerance_m: tolerance = 0 }, index) => {
      if (tolerance >= film) fail(["films", String(index), "thickness_tolerance_m"], "is as large as the film itself");
    });
    if (request.sweep && request.sweep.to_m <= request.sweep.from_m)
      fail(["sweep", "to_m"], "has to be thicker than from_m");
  });

export type EstimateRequest = z.output<typeof estimateSchema>;

/**
 * What is answered. Bows are standard ones: positive when the centre lies above the rim with the device side up, so a tensile film
 * on the device side gives a negative bow. No number is ever missing or not finite; `null` means that there is no such thing.
 */
export interface EstimateAnswer {
  engine_version: string;
  /** thin-film formula, films added up */
  stoney: { bow_m: number };
  /** laminate theory, small deflections */
  laminate: { bow_m: number };
  /** the free wafer beyond small deflections, gravity left out */
  shape: {
    regime: ShapeRegime;
    /** centre to rim; of a curled wafer along the rolled axis, where it is no bow but the lift of the edge */
    bow_m: number;
    /**
     * where a film is cut in lines, what lies across: bow along the other axis, and the angle of the axis that bends most,
     * counter-clockwise from x (the notch axis) with the device side up; null where all directions are alike
     */
    across: { bow_m: number; axis_rad: number } | null;
    /** peak to valley */
    warp_m: number;
    /** null unless curled */
    roll_radius_m: number | null;
    /** load over the load at which the wafer starts to roll */
    stability_ratio: number;
    /** first order in the tolerances that were given; null when none was */
    warp_standard_uncertainty_m: number | null;
    /** whether the warp is close to linear over these tolerances; null when none was given */
    warp_linear: boolean | null;
  };
  /** to lift it, at nominal minus tolerance; class null where the site has no limits for the diameter */
  support: { class: SupportClass | null; because: string };
  /** stress times thickness times coverage of each side and of each film, tension positive; of lines the mean of along and across */
  film_force: { front_N_per_m: number; back_N_per_m: number; films_N_per_m: number[] };
  /** free silicon thinner than this rolls about one axis; null when none from 1 µm to 2 mm does, 2 mm when all of it does */
  curls_below_m: number | null;
  sweep?: { thickness_m: number; warp_m: number; linear_warp_m: number; regime: ShapeRegime }[];
  /** each with the words of its equation */
  working?: { shape: ShownWorking; stoney: ShownWorking; film_forces: ShownWorking[] };
}

/** One thing wrong with a request: where, as a JSON pointer into it, and what. */
export interface EstimateFault {
  pointer: string;
  detail: string;
}
