/** What is compared, in the words of its pages. */
export interface ComparedKind {
  one: string;
  many: string;
  /** address of its list; the comparison is at `/compare` under it */
  path: string;
}

export const STACKS: ComparedKind = { one: "stack", many: "stacks", path: "/stacks" };
export const FLOWS: ComparedKind = { one: "flow", many: "flows", path: "/flows" };

/** Address of the comparison of a kind. */
export const comparisonPath = ({ path }: ComparedKind) => `${path}/compare`;

/** The letter of a column, by its place from 0. */
export const letterOf = (place: number) => String.fromCharCode(65 + place);
