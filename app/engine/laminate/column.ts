/** Numbers in a piece of memory that columns are cut from: dozens of columns, little to keep alive for one of them. */
const PIECE = 4096;

let piece = /* @__PURE__ */ new ArrayBuffer(PIECE * Float64Array.BYTES_PER_ELEMENT);
let used = 0;

/**
 * A column of zeros. A flow asks for hundreds of thousands of short ones, and memory of its own for each would cost more than
 * what is done with it, so they are cut from larger pieces, each place once.
 */
export function newColumn(count: number): Float64Array {
  if (count > PIECE / 8) return new Float64Array(count);
  if (used + count > PIECE) {
    piece = new ArrayBuffer(PIECE * Float64Array.BYTES_PER_ELEMENT);
    used = 0;
  }
  const column = new Float64Array(piece, used * Float64Array.BYTES_PER_ELEMENT, count);
  used += count;
  return column;
}
