import { index, layout, prefix, route, type RouteConfig } from "@react-router/dev/routes";

export default [
  route("healthz", "routes/healthz.ts"),
  route("readyz", "routes/readyz.ts"),
  layout("routes/_public/layout.tsx", [route("sign-in", "routes/_public/sign-in.tsx")]),
  route("sign-out", "routes/_auth/sign-out.ts"),
  ...prefix("api/v1", [route("estimates", "routes/api.v1/estimates.ts")]),
  layout("routes/_app/layout.tsx", [
    index("routes/_app/today.tsx"),
    route("method", "routes/_app/method.tsx"),
    route("*", "routes/_app/nowhere.tsx"),
  ]),
] satisfies RouteConfig;
