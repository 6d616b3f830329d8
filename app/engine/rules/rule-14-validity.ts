import { glassTransition } from "../flow/bond.ts";
import type { StepState } from "../flow/walk.ts";
import { inSentence } from "../in-sentence.ts";
import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import { stoneyCurvature } from "../stoney/stoney.ts";
import { reaches } from "./against-limit.ts";
import { bondsStaying, isBonded, whatLies } from "./bonded.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit } from "./make-finding.ts";
import { celsius, percent } from "./words.ts";

const TITLE = "Validity of the model";
const make = findingsOf(14, TITLE);

/** Thickness over which a film force is spread for the thin-film formula, which knows their product alone, m. */
const THIN = 1e-6;

/** How far the thin-film formula is off the laminate; said where it matters, because the laminate is what is used. */
function thinFilm({ flow, limits, workings }: RuleContext, state: StepState): Finding[] {
  const { atRoom, after, step, filmForce } = state;
  // The shape that a wafer came in with is no film's, so the film forces alone do not make the bow.
  if (!atRoom || isBonded(after) || after.incoming || step.adds.length === 0 || atRoom.warp <= limits.flatWithin.value)
    return [];
  const input = {
    filmStress: (filmForce.front - filmForce.back) / THIN,
    filmThickness: THIN,
    substrateThickness: after.silicon.value,
    biaxialModulus: siliconBiaxialModulus(flow.wafer.orientation),
  };
  const thin = stoneyCurvature(input);
  const off = Math.abs(thin - atRoom.linearCurvature) / Math.abs(atRoom.linearCurvature);
  if (!reaches(off, limits.stoneyWithin.value)) return [];
  return [
    make(
      state,
      "clear",
      `The thin-film formula would be ${percent(off)} off the laminate here; the laminate is used.`,
      {
        figures: [
          { label: "Thin-film formula off by", value: off, unit: "1" },
          {
            label: "Curvature by the thin-film formula",
            value: thin,
            unit: "1/m",
            working: workings?.stoneyCurvature(input) ?? null,
          },
        ],
        limit: siteLimit(limits, "stoneyWithin"),
      },
    ),
  ];
}

/** A roll that closes is beyond what the shape can say. */
function closedRoll({ flow }: RuleContext, state: StepState): Finding[] {
  const shape = state.atRoom;
  if (!shape?.rollRadius || isBonded(state.after) || flow.wafer.diameter / 2 < Math.PI * shape.rollRadius) return [];
  return [
    make(
      state,
      "caution",
      "Left free it would roll up more than once round: its bow and warp are those of half a turn.",
      {
        remedy: "Hold it: plan tape, ring or carrier.",
        figures: [{ label: "Roll radius", value: shape.rollRadius, unit: "m" }],
      },
    ),
  ];
}

/** Above its softening point a bonding material creeps: the pair's shape there depends on how long it is hot. */
function softBond(state: StepState): Finding[] {
  const { step, atPeak, after } = state;
  if (!atPeak || step.equipment?.atPeak !== "free") return [];
  const names = after.bonds.length > 1;
  return bondsStaying(state).flatMap(({ material }) => {
    const softening = glassTransition(material);
    if (softening === null || !reaches(step.peakTemperature, softening)) return [];
    return [
      make(
        state,
        "caution",
        `At ${celsius(step.peakTemperature)} ${names ? material.name : "the bonding material"} is above its softening point, ${celsius(softening)}: the shape of ${inSentence(whatLies(after))} at peak is informative only.`,
        { remedy: "Measure the pair at peak, or hold it flat while it is hot." },
      ),
    ];
  });
}

function judge(context: RuleContext, state: StepState): Finding[] {
  return [...thinFilm(context, state), ...closedRoll(context, state), ...softBond(state)];
}

export const validityRule: Rule = {
  number: 14,
  title: TITLE,
  judge,
};

export const aboutValidity: RuleAbout = {
  asks: "Is the answer within the range of the models: the laminate where thin-film formulas end, a shape that does not close, a pair below the softening of its bond where it is free?",
  limits: ["stoneyWithin", "flatWithin"],
};
