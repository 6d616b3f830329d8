import { Form, Link } from "react-router";
import { Choices } from "#app/components/forms/Choices.tsx";
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

const LENGTH_WORDS: Record<Preferences["length"], string> = {
  µm: "µm",
  mil: "mil, a thousandth of an inch",
};
const STRESS_WORDS: Record<Preferences["stress"], string> = {
  MPa: "MPa, moduli in GPa",
  ksi: "ksi, moduli in Msi",
};
const TEMPERATURE_WORDS: Record<Preferences["temperature"], string> = { "°C": "°C", "°F": "°F" };
const DECIMAL_MARK_WORDS: Record<Preferences["decimalMark"], string> = {
  point: "1.5, with commas between columns",
  comma: "1,5, with semicolons between columns",
};

interface Props {
  preferences: Preferences;
  saved: boolean;
}

/** How the program looks and answers keys, for the person alone and on every device that they sign in on. */
export function PreferencesPage({ preferences, saved }: Props) {
  const { theme, density, singleKeys, length, stress, temperature, decimalMark } = preferences;
  return (
    <>
      <PageHead
        title="Preferences"
        remark="For you alone, wherever you sign in"
        actions={
          <>
            <Link to="/account" className="btn">
              Account
            </Link>
            <Link to="/preferences/mail" className="btn">
              E-mail
            </Link>
          </>
        }
      />
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
        <Choices title="Lengths below 1 mm" name="length" words={LENGTH_WORDS} chosen={length}>
          From 1 mm on they stay in mm, and what is in nm stays in nm.
        </Choices>
        <Choices title="Stresses" name="stress" words={STRESS_WORDS} chosen={stress} />
        <Choices title="Temperatures" name="temperature" words={TEMPERATURE_WORDS} chosen={temperature}>
          Differences, and what is per degree, stay in K.
        </Choices>
        <p className="border-b border-line p-4 text-quiet tablet:px-6">
          You read figures in these units. What is stored, sent to other programs, put into files and printed on sheets
          stays in µm, MPa and °C. A field takes any unit, whichever you read, and keeps what was typed.
        </p>
        <Choices title="Figures in CSV files" name="decimalMark" words={DECIMAL_MARK_WORDS} chosen={decimalMark}>
          For your spreadsheet. Films are read back from either.
        </Choices>
        <div className="p-4 tablet:px-6">
          <SubmitButton busy="Saving">Save preferences</SubmitButton>
        </div>
      </Form>
    </>
  );
}
