/**
 * Moves label centres apart until neighbours no longer overlap, symmetrically and as little as possible, then keeps the
 * whole row of them between `from` and `to`.
 * @param centres wanted centres in ascending order, px
 * @param sizes the room that each label takes along the axis, px
 */
export function spreadLabels(
  centres: readonly number[],
  sizes: readonly number[],
  from = -Infinity,
  to = Infinity,
): number[] {
  const place = [...centres];
  const pitch = (index: number) => ((sizes[index - 1] ?? 0) + (sizes[index] ?? 0)) / 2;
  // Relaxation: each overlap is shared by its two neighbours. It converges quickly for the dozen labels of a drawing.
  for (let round = 0; round < 400; round += 1) {
    let moved = false;
    for (let index = 1; index < place.length; index += 1) {
      const before = place[index - 1] ?? 0;
      const here = place[index] ?? 0;
      const overlap = pitch(index) - (here - before);
      if (overlap > 0.01) {
        place[index - 1] = before - overlap / 2;
        place[index] = here + overlap / 2;
        moved = true;
      }
    }
    if (!moved) break;
  }
  for (let index = 0; index < place.length; index += 1) {
    const least = index === 0 ? from + (sizes[0] ?? 0) / 2 : (place[index - 1] ?? 0) + pitch(index);
    place[index] = Math.max(place[index] ?? 0, least);
  }
  for (let index = place.length - 1; index >= 0; index -= 1) {
    const most = index === place.length - 1 ? to - (sizes[index] ?? 0) / 2 : (place[index + 1] ?? 0) - pitch(index + 1);
    place[index] = Math.min(place[index] ?? 0, most);
  }
  return place;
}
