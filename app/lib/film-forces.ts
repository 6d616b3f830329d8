import type { Side } from "#app/engine/vocabulary.ts";
import type { Estimated } from "./stack-words.ts";

/** What one film contributes. */
export interface FilmForce {
  side: Side;
  /** per width of wafer, N/m, tension positive */
  force: number;
  /** the same as it bends the wafer: tension on the device side and compression on the back lift the edges, positive */
  bends: number;
  /** of what all films bend, whichever way, 0 to 1; null where none does */
  share: number | null;
}

/** The forces of a stack's films in the order of the request, with the sums of the sides and what is left to bend the wafer, N/m. */
export function filmForces({ request, answer }: Estimated): {
  films: FilmForce[];
  front: number;
  back: number;
  net: number;
} {
  const { front_N_per_m: front, back_N_per_m: back, films_N_per_m: forces } = answer.film_force;
  const whole = forces.reduce((sum, force) => sum + Math.abs(force), 0);
  const films = request.films.map(({ side }, index): FilmForce => {
    const force = forces[index] ?? 0;
    return {
      side,
      force,
      bends: side === "front" ? force : -force,
      share: whole === 0 ? null : Math.abs(force) / whole,
    };
  });
  return { films, front, back, net: front - back };
}
