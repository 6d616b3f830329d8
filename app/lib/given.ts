type Given<Value> = { [Key in keyof Value]?: NonNullable<Value[Key]> };

/** What is given of a record; what is missing is left out, so that an answer does not change when a question is added. */
export function given<Value extends object>(record: Value): Given<Value> {
  return Object.fromEntries(
    Object.entries(record).filter(([, value]) => value !== null && value !== undefined),
  ) as Given<Value>;
}
