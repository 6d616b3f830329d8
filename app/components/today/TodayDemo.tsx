import { Link } from "react-router";
import { Notice } from "#app/components/ui/Notice.tsx";

/** Where the demo is on the site: which programs are of it, and the way to take it out. */
export function TodayDemo({ programs }: { programs: readonly string[] }) {
  return (
    <section aria-labelledby="demo" className="border-t border-ink pt-3">
      <h2 id="demo" className="font-semibold">
        The demo
      </h2>
      <p className="mt-1 text-quiet">
        {programs.length < 2 ? programs.join("") : `${programs.slice(0, -1).join(", ")} and ${programs.at(-1)}`}{" "}
        {programs.length === 1 ? "is an example" : "are examples"}, with films and carriers of their own.{" "}
        <Link to="/demo" className="link whitespace-nowrap">
          Remove the demo
        </Link>
      </p>
    </section>
  );
}

const TOLD: Record<string, string> = {
  loaded: "The demo is loaded. Open one of its flows, or take it out again under The demo.",
  removed: "The demo is removed. It can be loaded again at any time.",
  gone: "The demo had been removed already, by somebody else. Nothing was left to do.",
};

/** What has just happened to the demo, as the address says, where it is so. */
export function DemoTold({ told, here }: { told: string | null; here: boolean }) {
  const sentence = told === null ? undefined : TOLD[told];
  if (sentence === undefined || here !== (told === "loaded")) return null;
  return <Notice kind="done" title={sentence} />;
}
