import { Link } from "react-router";

interface Props {
  stacks: number;
  scans: number;
  mayAssess: boolean;
  mayUpload: boolean;
}

interface Step {
  title: string;
  words: string;
  link: { words: string; to: string };
  done: boolean;
}

/** Where nothing has been done yet: the way from films to an assessment and back to measured films, each with what it is for. */
export function FirstSteps({ stacks, scans, mayAssess, mayUpload }: Props) {
  const steps = [...(mayAssess ? toAssess(stacks) : []), ...(mayUpload ? [toMeasure(scans)] : [])];
  return (
    <section className="empty" aria-labelledby="first-steps">
      <h2 id="first-steps" className="font-semibold">
        No flow has been set yet
      </h2>
      {!mayAssess && (
        <p className="mt-1 text-quiet">
          An engineer of your program starts with a stack and sets the steps. What they find shows here.
        </p>
      )}
      <ol className={steps.length > 1 ? "mt-2 list-decimal space-y-2 pl-5" : "mt-2"}>
        {steps.map(({ title, words, link, done }) => (
          <li key={title}>
            <b>{title}.</b> {done ? "Done." : words}{" "}
            <Link to={link.to} className="link whitespace-nowrap">
              {link.words}
            </Link>
          </li>
        ))}
      </ol>
    </section>
  );
}

const toAssess = (stacks: number): Step[] => [
  {
    title: "Films",
    words: "Look through the library; add what your line deposits, with its stress and where that comes from.",
    link: { words: "See the films", to: "/films" },
    done: false,
  },
  {
    title: "First stack",
    words: "Films on silicon as they are after thinning: how the free wafer bows shows while you type.",
    link: stacks > 0 ? { words: "See the stacks", to: "/stacks" } : { words: "Make a stack", to: "/stacks/new" },
    done: stacks > 0,
  },
  {
    title: "First flow",
    words:
      "The steps from the incoming wafer to dicing, begun from a stack or a template. Assess it: every step says what support it needs, and what must not happen.",
    link: { words: "Set the steps", to: "/flows/new" },
    done: false,
  },
];

const toMeasure = (scans: number): Step => ({
  title: "First scan",
  words:
    "Profiles of a monitor wafer before a film and after it: the film’s stress as it is measured here, in place of one that is assumed.",
  link: scans > 0 ? { words: "See the scans", to: "/scans" } : { words: "Upload a pair", to: "/scans/new" },
  done: scans > 0,
});
