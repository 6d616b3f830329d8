import { bareWithExpanded, sizeOf, slopeText } from "#app/lib/prediction-words.ts";
import type { Predicted, PredictionGroup } from "#app/schemas/prediction.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

interface Props {
  of: Predicted;
  /** what each of them is */
  what: "Step" | "Film" | "Flow";
  groups: readonly PredictionGroup[];
}

/** Each step, film or flow with what the model is off by there; those that it is off at come first. */
export function ParityGroups({ of, what, groups }: Props) {
  const unit = of === "bow" ? "µm" : "MPa";
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={`Each ${what.toLowerCase()}`}>
      <table className="table">
        <caption className="sr-only">{`Each ${what.toLowerCase()}`}</caption>
        <thead>
          <tr>
            <th scope="col">{what}</th>
            <th scope="col" className="num">
              Points
            </th>
            <th scope="col" className="num">
              Bias
              <span className="block">
                <OwnHead unit={`${unit}, k = 2`} />
              </span>
            </th>
            <th scope="col" className="num max-tablet:hidden">
              Spread
            </th>
            <th scope="col" className="num max-tablet:hidden">
              Slope
              <span className="block">k = 2</span>
            </th>
            <th scope="col">In words</th>
          </tr>
        </thead>
        <tbody>
          {groups.map((group) => (
            <tr key={group.step}>
              <th scope="row" className="font-normal wrap-anywhere">
                {group.step}
              </th>
              <td className="num">{group.count}</td>
              <td className="num">
                <OwnFigure unit={unit}>{bareWithExpanded(of, group.bias, group.biasUncertainty)}</OwnFigure>
              </td>
              <td className="num max-tablet:hidden">{group.count > 1 ? sizeOf(of, group.spread) : "one point"}</td>
              <td className="num max-tablet:hidden">{slopeText(group)}</td>
              <td className={group.isOff ? "font-semibold text-caution" : undefined}>{group.sentence}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
