import { Outlet } from "react-router";

export function loader() {
  return null;
}

export default function Layout() {
  return <Outlet />;
}
