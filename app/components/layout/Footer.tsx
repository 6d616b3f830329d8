import { Link } from "react-router";

/** The sentence that stands under everything. */
export function Footer() {
  return (
    <footer className="screen-only mx-auto max-w-page px-4 pb-8 text-label text-quiet tablet:px-6">
      Estimates support, never replace, qualified process engineering and the site’s own procedures and safety rules.{" "}
      <Link to="/method#cautions" className="link">
        Cautions
      </Link>
      {" · "}
      <Link to="/method#keys" className="link">
        Keys
      </Link>
    </footer>
  );
}
