import { Form } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { Preferences } from "#app/lib/preferences.ts";

const THEME_WORDS: Record<Preferences["theme"], string> = {
  system: "As my device is set",
  light: "Light",
  dark: "Dark",
};
const DENSITY_WORDS: Record<Preferences["density"], string> = {
  roomy: "Roomy",
  tight: "Tight: more rows on a screen",
};

interface Props {
  preferences: Preferences;
  saved: boolean;
}

/** How the program looks and answers keys, for the person alone and on every device that they sign in on. */
export function PreferencesPage({ preferences: { theme, density, singleKeys }, saved }: Props) {
  return (
    <>
      <PageHead title="Preferences" remark="For you alone, wherever you sign in" />
      {saved && <Notice kind="done" title="Your preferences are saved." />}
      <Form method="post" className="frame max-w-160">
        <Choices title="Theme" name="theme" words={THEME_WORDS} chosen={theme}>
          What is printed is always black on white.
        </Choices>
        <Choices title="Tables and lists" name="density" words={DENSITY_WORDS} chosen={density} />
        <fieldset className="border-b border-line p-4 tablet:px-6">
          <legend className="contents">
            <span className="font-semibold">Keys</span>
          </legend>
          <label className="flex min-h-8 items-center gap-2 max-tablet:min-h-11">
            <input type="checkbox" name="singleKeys" defaultChecked={singleKeys} />
            The key ? shows the keys of the program
          </label>
          <p className="text-quiet">
            Switch it off if you speak to your device, or press keys by accident. Keys with control or command stay.
          </p>
        </fieldset>
        <div className="p-4 tablet:px-6">
          <SubmitButton busy="Saving">Save preferences</SubmitButton>
        </div>
      </Form>
    </>
  );
}

interface ChoicesProps<Value extends string> {
  title: string;
  name: string;
  words: Record<Value, string>;
  chosen: Value;
  children?: string;
}

function Choices<Value extends string>({ title, name, words, chosen, children }: ChoicesProps<Value>) {
  return (
    <fieldset className="border-b border-line p-4 tablet:px-6">
      <legend className="contents">
        <span className="font-semibold">{title}</span>
      </legend>
      {Object.entries<string>(words).map(([value, label]) => (
        <label key={value} className="flex min-h-8 items-center gap-2 max-tablet:min-h-11">
          <input type="radio" name={name} value={value} defaultChecked={value === chosen} />
          {label}
        </label>
      ))}
      {children && <p className="text-quiet">{children}</p>}
    </fieldset>
  );
}
