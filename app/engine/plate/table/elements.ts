/** Element of an array that must be there: a miss is a mistake in an index, not a zero. */
export function at(values: Float64Array, index: number): number {
  const value = values[index];
  if (value === undefined) throw new RangeError(`no element ${index} among ${values.length}`);
  return value;
}

/** The same for a list of indices; apart, so that both stay fast. */
export function indexAt(values: Int32Array, index: number): number {
  const value = values[index];
  if (value === undefined) throw new RangeError(`no element ${index} among ${values.length}`);
  return value;
}
