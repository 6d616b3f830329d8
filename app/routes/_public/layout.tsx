import { Outlet } from "react-router";

/** Pages that need nobody to be signed in. The loader is there so that middleware also runs on client navigation. */
export function loader() {
  return null;
}

export default function PublicLayout() {
  return <Outlet />;
}
