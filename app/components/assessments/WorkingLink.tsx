import { Link } from "react-router";

/** Link to the calculation behind a figure; nothing where there is none. */
export function WorkingLink({ path, of }: { path: string | null; of: string }) {
  if (path === null) return null;
  return (
    <Link to={path} className="link whitespace-nowrap">
      Working<span className="sr-only"> of {of}</span>
    </Link>
  );
}
