/** Numbers that come one by one, in a typed array that grows. */
export class NumberColumn {
  #values: Float64Array;
  length = 0;

  constructor(capacity = 1024) {
    this.#values = new Float64Array(capacity);
  }

  push(value: number): void {
    if (this.length === this.#values.length) {
      const larger = new Float64Array(2 * this.length);
      larger.set(this.#values);
      this.#values = larger;
    }
    this.#values[this.length] = value;
    this.length += 1;
  }

  /** The numbers so far; not a copy. */
  values(): Float64Array {
    return this.#values.subarray(0, this.length);
  }
}
