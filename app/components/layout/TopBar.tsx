import { Form, Link, NavLink } from "react-router";
import { Mark } from "#app/components/drawings/Mark.tsx";
import type { Place } from "#app/policies/places.ts";

interface Props {
  person: { name: string; role: string };
  places: Place[];
}

/** Mark, who am I, and the places in the order of the job. */
export function TopBar({ person, places }: Props) {
  return (
    <header className="screen-only mx-auto max-w-page px-4 tablet:px-6">
      <a href="#main" className="btn btn-primary absolute top-2 left-2 z-10 -translate-y-20 focus:translate-y-0">
        Skip to content
      </a>
      <div className="flex min-h-12 flex-wrap items-center gap-x-6 gap-y-1 py-1">
        <Link
          to="/"
          className="flex items-center gap-2 text-lead font-semibold no-underline"
          aria-label="Planeward, Today"
        >
          <Mark />
          <span>Planeward</span>
        </Link>
        <p className="ml-auto text-quiet">
          {person.name}, {person.role}
        </p>
        <Form method="post" action="/sign-out">
          <button type="submit" className="link min-h-8 cursor-pointer">
            Sign out
          </button>
        </Form>
      </div>
      <nav aria-label="Places" className="overflow-x-auto border-b border-ink">
        <ul className="flex gap-7">
          {places.map(({ name, path }) => (
            <li key={path}>
              <NavLink
                to={path}
                end={path === "/"}
                className="block py-2 whitespace-nowrap text-quiet no-underline aria-[current=page]:border-b-4 aria-[current=page]:border-ink aria-[current=page]:pb-1 aria-[current=page]:font-semibold aria-[current=page]:text-ink"
              >
                {name}
              </NavLink>
            </li>
          ))}
        </ul>
      </nav>
    </header>
  );
}
