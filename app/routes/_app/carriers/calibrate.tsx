import { CalibrationChoice } from "#app/components/carriers/CalibrationChoice.tsx";
import { CalibrationForm } from "#app/components/carriers/CalibrationForm.tsx";
import { CalibrationOutcome } from "#app/components/carriers/CalibrationOutcome.tsx";
import { CarrierPlaces } from "#app/components/carriers/CarrierPlaces.tsx";
import { PairStepTable } from "#app/components/carriers/PairStepTable.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { KINDS, kindPath } from "#app/lib/library-kinds.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { calibrationForm } from "#app/services/library/calibration-form.server.ts";
import { calibrationPage } from "#app/services/library/calibration.server.ts";
import type { Route } from "./+types/calibrate";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Calibrate ${loaderData?.material.name ?? "a bonding material"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  return calibrationPage(scopeOf(context), params.materialId, url.searchParams);
}

export async function action({ request, context, params }: Route.ActionArgs) {
  return calibrationForm(request, scopeOf(context), params.materialId);
}

export default function Calibrate({ loaderData, actionData }: Route.ComponentProps) {
  const { material, flows, chosen, mayUse } = loaderData;
  const list = kindPath("bonding-materials");
  return (
    <>
      <CarrierPlaces />
      <PageHead
        title="Calibrate on measured pairs"
        crumbs={[
          { name: KINDS["bonding-materials"].title, path: list },
          { name: material.name, path: `${list}/${material.id}` },
        ]}
      />
      {actionData?.result && <CalibrationOutcome result={actionData.result} mayUse={mayUse} />}
      <CalibrationChoice material={material} flows={flows} chosen={chosen} />
      {chosen?.fault === null &&
        (chosen.mayCalibrate ? (
          <CalibrationForm key={chosen.id} flow={chosen} lastResult={actionData?.lastResult} />
        ) : (
          <PairStepTable steps={chosen.steps} />
        ))}
    </>
  );
}
