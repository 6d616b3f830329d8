import { Link } from "react-router";

interface Props {
  stacks: number;
  mayAssess: boolean;
}

/** Where nothing has been done yet: the way from films to an assessment, and the first thing to do. */
export function FirstSteps({ stacks, mayAssess }: Props) {
  const steps = [
    {
      title: "Films",
      words: "Look through the library; add what your line deposits, with its stress and where that comes from.",
      link: { words: "See the films", to: "/films" },
    },
    {
      title: "First stack",
      words: stacks > 0 ? "Done." : "Films on silicon, as they are after thinning: the bow shows while you type.",
      link: { words: "Make a stack", to: "/stacks/new" },
    },
    {
      title: "First flow",
      words: "The steps from the incoming wafer to dicing, with carrier and bond; then assess it.",
      link: { words: "Set the steps", to: "/flows/new" },
    },
  ];
  return (
    <section className="empty" aria-labelledby="first-steps">
      <h2 id="first-steps" className="font-semibold">
        No flow has been set yet
      </h2>
      {mayAssess ? (
        <ol className="mt-2 list-decimal space-y-2 pl-5">
          {steps.map(({ title, words, link }) => (
            <li key={title}>
              <b>{title}.</b> {words}{" "}
              <Link to={link.to} className="link">
                {link.words}
              </Link>
            </li>
          ))}
        </ol>
      ) : (
        <p className="mt-1 text-quiet">
          An engineer of your program starts with a stack and sets the steps. What they find shows here.
        </p>
      )}
    </section>
  );
}
