import { notFound } from "#app/server/problem.server.ts";

/** Any address that nothing else answers, inside the frame of the application. */
export function loader() {
  throw notFound("page");
}

export default function Nowhere() {
  return null;
}
