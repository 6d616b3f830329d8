import { index, layout, prefix, route, type RouteConfig } from "@react-router/dev/routes";

export default [
  route("healthz", "routes/healthz.ts"),
  route("readyz", "routes/readyz.ts"),
  layout("routes/_public/layout.tsx", [route("sign-in", "routes/_public/sign-in.tsx")]),
  route("sign-out", "routes/_auth/sign-out.ts"),
  ...prefix("api/v1", [route("estimates", "routes/api.v1/estimates.ts")]),
  layout("routes/_print/layout.tsx", [
    route("sheets/:assessmentId", "routes/_print/sheet.tsx"),
    route("assessments/change-request/print", "routes/_print/change-request.tsx"),
  ]),
  layout("routes/_app/layout.tsx", [
    index("routes/_app/today.tsx"),
    ...prefix("films", [
      index("routes/_app/films/list.tsx"),
      route("new", "routes/_app/films/new.tsx"),
      route(":filmId", "routes/_app/films/detail.tsx"),
      route(":filmId/edit", "routes/_app/films/edit.tsx"),
    ]),
    ...prefix("stacks", [
      index("routes/_app/stacks/list.tsx"),
      route("new", "routes/_app/stacks/new.tsx"),
      route(":stackId", "routes/_app/stacks/stack.tsx"),
    ]),
    ...prefix("flows", [
      index("routes/_app/flows/list.tsx"),
      route("new", "routes/_app/flows/new.tsx"),
      ...prefix("library", [
        route(":kind", "routes/_app/flows/library.tsx"),
        route("steps/new", "routes/_app/flows/new-step-template.tsx"),
        route("steps/:templateId", "routes/_app/flows/step-template.tsx"),
        route("flows/:templateId", "routes/_app/flows/flow-template.tsx"),
      ]),
      route(":flowId", "routes/_app/flows/flow.tsx"),
      route(":flowId/edit", "routes/_app/flows/edit.tsx"),
      route(":flowId/keep", "routes/_app/flows/keep.tsx"),
      route(":flowId/what-if", "routes/_app/flows/what-if.ts"),
      route(":flowId/steps/new", "routes/_app/flows/new-step.tsx"),
      route(":flowId/steps/:stepId", "routes/_app/flows/step.tsx"),
    ]),
    route("assessments/change-request", "routes/_app/assessments/change-request.tsx"),
    ...prefix("assessments/:assessmentId", [
      index("routes/_app/assessments/assessment.tsx"),
      route("working", "routes/_app/assessments/working.tsx"),
      route("compare", "routes/_app/assessments/compare.tsx"),
      route("remedies", "routes/_app/assessments/remedies.tsx"),
      route("carriers", "routes/_app/assessments/carriers.tsx"),
      route("window", "routes/_app/assessments/window.tsx"),
      route("carriers.csv", "routes/_app/assessments/carriers-csv.ts"),
      route("lot", "routes/_app/assessments/lot.tsx"),
    ]),
    ...prefix("carriers", [
      index("routes/_app/carriers/index.tsx"),
      route("limits", "routes/_app/carriers/limits.tsx"),
      route("bonding-materials/:materialId/calibrate", "routes/_app/carriers/calibrate.tsx"),
      ...prefix(":kind", [
        index("routes/_app/carriers/list.tsx"),
        route("new", "routes/_app/carriers/new.tsx"),
        route(":recordId", "routes/_app/carriers/detail.tsx"),
        route(":recordId/edit", "routes/_app/carriers/edit.tsx"),
      ]),
    ]),
    ...prefix("scans", [
      index("routes/_app/scans/list.tsx"),
      route("new", "routes/_app/scans/new.tsx"),
      route("files/:fileId", "routes/_app/scans/file.ts"),
      route(":scanId", "routes/_app/scans/scan.tsx"),
    ]),
    route("sheets", "routes/_app/sheets/list.tsx"),
    route("method", "routes/_app/method.tsx"),
    route("*", "routes/_app/nowhere.tsx"),
  ]),
] satisfies RouteConfig;
