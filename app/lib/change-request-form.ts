import type { Change, ChangeSubject } from "#app/schemas/change-request.ts";
import { changeableProperties, subjectKey, type ChangeableProperty } from "./change-request.ts";
import { readQuantity } from "./read-quantity.ts";

/** What somebody asks, as it stands in the address. */
export interface ChangeFields {
  of: string;
  property: string;
  value: string;
  title: string;
  program: string;
}

export type ChangeErrors = Partial<Record<"of" | "property" | "value", string>>;

export interface ChangeFormView {
  fields: ChangeFields;
  /** what a change can be about, by kind */
  groups: { label: string; options: { value: string; label: string }[] }[];
  /** what was chosen; null at first */
  subject: { kind: ChangeSubject["kind"]; name: string } | null;
  properties: { value: string; label: string }[];
  /** unit that the value is usually given in */
  unit: string;
  errors: ChangeErrors;
  /** the question in words, once it is whole: 'Polyimide, stress at 25 °C: 35 MPa' */
  question: string | null;
}

const GROUPS: readonly [kind: ChangeSubject["kind"], label: string][] = [
  ["film", "Films"],
  ["step", "Steps"],
  ["carrier", "Carriers"],
  ["bondingMaterial", "Bonding materials"],
  ["equipment", "Tools"],
  ["limit", "Site limits"],
];

const LONGEST = 100;

/** Reads a question from an address: the change that is asked about once it is whole, else what is missing or wrong. */
export function readChangeForm(
  search: URLSearchParams,
  subjects: readonly ChangeSubject[],
): { view: ChangeFormView; change: Change | null } {
  const text = (name: keyof ChangeFields) => (search.get(name) ?? "").replaceAll("\0", "").trim().slice(0, LONGEST);
  const fields: ChangeFields = {
    of: text("of"),
    property: text("property"),
    value: text("value"),
    title: text("title"),
    program: text("program"),
  };
  const errors: ChangeErrors = {};
  const subject = subjects.find((each) => subjectKey(each) === fields.of) ?? null;
  if (!subject && fields.of !== "") errors.of = "There is no such record any more. Choose another.";
  const properties = subject ? changeableProperties(subject) : [];
  const [only] = properties;
  const property =
    properties.find(({ name }) => name === fields.property) ?? (properties.length === 1 ? only : undefined);
  if (subject && fields.property !== "" && !property) errors.property = "Choose one of its properties.";
  const read = property && search.has("value") ? readQuantity(fields.value, property.rule) : null;
  if (subject && search.has("value") && !property && !errors.property) errors.property = "Choose what of it changes.";
  if (read && !read.ok) errors.value = read.message;
  const change =
    subject && property && read?.ok
      ? { subject, property: property.name, value: read.value, title: subject.kind === "step" ? fields.title : "" }
      : null;
  return {
    change,
    view: {
      fields,
      groups: groupsOf(subjects),
      subject: subject && { kind: subject.kind, name: subject.name },
      properties: properties.map(({ name, label }) => ({ value: name, label })),
      unit: (property ?? only)?.unit ?? "",
      errors,
      question: change && property && read?.ok ? questionOf(change, property, read.understood) : null,
    },
  };
}

function groupsOf(subjects: readonly ChangeSubject[]): ChangeFormView["groups"] {
  return GROUPS.map(([kind, label]) => ({
    label,
    options: subjects
      .filter((subject) => subject.kind === kind)
      .map((subject) => ({ value: subjectKey(subject), label: sentence(subject.name) })),
  })).filter(({ options }) => options.length > 0);
}

const sentence = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
const lower = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);

function questionOf({ subject, title }: Change, { label }: ChangeableProperty, understood: string): string {
  if (subject.kind === "limit") return `${label}: ${understood}`;
  if (subject.kind !== "step") return `${subject.name}, ${lower(label)}: ${understood}`;
  const which = title === "" ? `Every ${subject.name} step` : `Every ${subject.name} step with “${title}” in its name`;
  return `${which}, ${lower(label)}: ${understood}`;
}
