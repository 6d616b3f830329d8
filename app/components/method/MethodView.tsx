import { Cautions } from "#app/components/cautions/Cautions.tsx";
import { ShortcutList } from "#app/components/keyboard/ShortcutList.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { Equation } from "#app/engine/equations.ts";
import { CHUCK } from "#app/engine/equations/chuck.ts";
import { DIE } from "#app/engine/equations/die.ts";
import { DIRECTIONAL } from "#app/engine/equations/directional.ts";
import { GRAVITY } from "#app/engine/equations/gravity.ts";
import { HANDLING } from "#app/engine/equations/handling.ts";
import { LAMINATE } from "#app/engine/equations/laminate.ts";
import { METROLOGY } from "#app/engine/equations/metrology.ts";
import { PLATE } from "#app/engine/equations/plate.ts";
import { SILICON } from "#app/engine/equations/silicon.ts";
import { STRENGTH } from "#app/engine/equations/strength.ts";
import { THIN_FILM } from "#app/engine/equations/thin-film.ts";
import { METHOD_SECTIONS } from "#app/lib/method-sections.ts";
import { CONVENTIONS, GLOSSARY, leftOut } from "#app/lib/method-words.ts";
import type { RuleText } from "#app/schemas/rule-text.ts";
import { Bibliography } from "./Bibliography.tsx";
import { EquationEntry } from "./EquationEntry.tsx";
import { MethodSection } from "./MethodSection.tsx";
import { RuleEntry } from "./RuleEntry.tsx";
import { TermList } from "./TermList.tsx";

const GROUPS: readonly { id: string; title: string; equations: Record<string, Equation> }[] = [
  { id: "thin-film", title: "Thin film on a thick wafer", equations: THIN_FILM },
  { id: "silicon", title: "Silicon", equations: SILICON },
  { id: "laminate", title: "Stack of layers", equations: LAMINATE },
  { id: "directional", title: "Films and silicon that differ by direction", equations: DIRECTIONAL },
  { id: "plate", title: "Shape of a free wafer", equations: PLATE },
  { id: "gravity", title: "Sag under its own weight", equations: GRAVITY },
  { id: "chuck", title: "Held flat on a chuck", equations: CHUCK },
  { id: "strength", title: "Strength", equations: STRENGTH },
  { id: "die", title: "Die after dicing, thickness budget", equations: DIE },
  { id: "metrology", title: "Scans and uncertainty", equations: METROLOGY },
  { id: "handling", title: "Handling", equations: HANDLING },
];

interface Props {
  rules: RuleText[];
  engineVersion: string;
}

/** How every figure comes about: signs, rules, equations, what is left out, cautions, words, sources. */
export function MethodView({ rules, engineVersion }: Props) {
  return (
    <>
      <nav aria-label="On this page" className="screen-only border-t border-ink py-3">
        <ul className="flex flex-wrap gap-x-6 gap-y-1">
          {METHOD_SECTIONS.map(({ id, title }) => (
            <li key={id}>
              <a href={`#${id}`} className="link inline-block py-1">
                {title}
              </a>
            </li>
          ))}
        </ul>
      </nav>
      <MethodSection id="model" title="What is computed">
        <p>
          Films pull or push on silicon and bend it. The stack of layers gives the curvature that small deflections
          would have, at any temperature; the free wafer’s shape follows from it beyond small bows, up to the roll of a
          thin wafer. A flow is walked step by step: films come and go, metals yield in heat, silicon gets thinner, a
          carrier is bonded and let go. At every step the rules hold what comes out against the site’s limits and the
          tool’s. The thin-film relation stands beside the better model so that both can be seen.
        </p>
        <p className="mt-2 text-quiet">Engine {engineVersion}. Every assessment keeps the version that made it.</p>
      </MethodSection>
      <MethodSection id="conventions" title="Signs and words">
        <TermList terms={CONVENTIONS} />
      </MethodSection>
      <MethodSection id="rules" title="Handling rules">
        {rules.map((rule) => (
          <RuleEntry key={rule.number} rule={rule} />
        ))}
      </MethodSection>
      <MethodSection id="equations" title="Equations" aside={<GroupLinks />}>
        {GROUPS.map(({ id, title, equations }) => (
          <section key={id} aria-labelledby={`equations-${id}`} className="mb-6">
            <h3 id={`equations-${id}`} className="mb-3 scroll-mt-4 border-b border-ink pb-1 text-lead font-medium">
              {title}
            </h3>
            <div>
              {Object.entries(equations).map(([key, equation]) => (
                <EquationEntry key={key} id={key} equation={equation} />
              ))}
            </div>
          </section>
        ))}
      </MethodSection>
      <MethodSection id="left-out" title="What is left out">
        <ul className="list-disc space-y-1 pl-5">
          {leftOut(rules.map(({ number }) => number)).map((text) => (
            <li key={text}>{noBreak(text)}</li>
          ))}
        </ul>
      </MethodSection>
      <MethodSection id="cautions" title="Cautions">
        <Cautions />
      </MethodSection>
      <MethodSection id="glossary" title="Glossary">
        <TermList terms={GLOSSARY} />
      </MethodSection>
      <MethodSection id="keys" title="Keys">
        <ShortcutList />
        <p className="mt-2 text-quiet">
          The key ? can be switched off in the preferences, which open by your name above.
        </p>
      </MethodSection>
      <MethodSection id="sources" title="Sources">
        <Bibliography />
      </MethodSection>
    </>
  );
}

function GroupLinks() {
  return (
    <ul className="mt-2 screen-only">
      {GROUPS.map(({ id, title }) => (
        <li key={id}>
          <a href={`#equations-${id}`} className="link inline-block py-0.5">
            {title}
          </a>
        </li>
      ))}
    </ul>
  );
}
