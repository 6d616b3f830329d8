import { directionalLaminateWorking } from "../directional/working.ts";
import type { Working } from "../working.ts";
import { dieAfterDicing, type DieInput } from "./die-after-dicing.ts";

/** The warp of `dieAfterDicing` at one temperature (K) as data. */
export function dieWarpWorking(i: DieInput, temperature: number): Working {
  const { worst: die } = dieAfterDicing({ ...i, temperatures: [temperature] });
  const critical: Working[] =
    die.criticalEdge === null
      ? []
      : [
          {
            equation: "die-critical-size",
            inputs: [
              { symbol: "κ_x", meaning: "curvature along x", value: die.curvatureX, unit: "1/m" },
              { symbol: "κ_y", meaning: "curvature along y", value: die.curvatureY, unit: "1/m" },
              { symbol: "t", meaning: "twist", value: die.twist, unit: "1/m" },
            ],
            result: {
              symbol: "a_cr",
              meaning: "edge of the square die that would start to roll",
              value: die.criticalEdge,
              unit: "m",
            },
            note: "An estimate from the disc of equal area.",
          },
        ];
  return {
    equation: "die-warp",
    inputs: [
      { symbol: "T", meaning: "temperature", value: temperature, unit: "K", temperaturePoint: true },
      { symbol: "a", meaning: "edge along x", value: i.length, unit: "m" },
      { symbol: "b", meaning: "edge along y", value: i.width, unit: "m" },
      { symbol: "κ_x", meaning: "curvature along x", value: die.curvatureX, unit: "1/m" },
      { symbol: "κ_y", meaning: "curvature along y", value: die.curvatureY, unit: "1/m" },
      { symbol: "t", meaning: "twist", value: die.twist, unit: "1/m" },
    ],
    result: { symbol: "w", meaning: "highest less lowest place of the die", value: die.warp, unit: "m" },
    note: die.linearValid ? undefined : "Near or past the size at which a free die would roll: an upper bound.",
    from: [
      directionalLaminateWorking(i.layers, "curvatureX", { temperature }),
      directionalLaminateWorking(i.layers, "curvatureY", { temperature }),
      ...critical,
    ],
  };
}
