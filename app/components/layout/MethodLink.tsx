import { Link, useLocation } from "react-router";
import { methodPart } from "#app/lib/method-part.ts";

/** The way to what the method page says of the page that one is on. */
export function MethodLink() {
  const part = methodPart(useLocation().pathname);
  if (!part) return null;
  return (
    <Link to={`/method#${part.anchor}`} className="link whitespace-nowrap">
      Method: {part.title}
    </Link>
  );
}
