/**
 * The sums through a stack of layers that its bending follows from, for many stacks at once: the one place where layers are
 * added up, for a single laminate as for the draws of sampling.
 *
 * It works in memory of its own and of fixed size, which V8 checks and addresses once, when it compiles: over arrays that are
 * handed in, the same loop takes half as long again (measured). V8 does so for what a function made once finds as constants around
 * it, which is why it is made by another (a bundler turns the constants of a module into variables), and reads them by names of
 * its own.
 */

/** Stacks that are bent together at most: few enough that their layers stay in the fastest memory. */
export const MOST_STACKS = 128;

/** Layers of a stack at most. */
export const MOST_LAYERS = 4096;

/** Numbers that the layers of all stacks may take together, four for each layer. */
const ROOM = 32768;

function makeKernel() {
  const values = new Float64Array(ROOM);
  const factors = new Float64Array(MOST_LAYERS);
  // Of each stack: the sum of s; twice that of s z; 4 A times the bending stiffness; the sum of f; the curvature.
  const stretching = new Float64Array(MOST_STACKS);
  const firstMoment = new Float64Array(MOST_STACKS);
  const rigidity = new Float64Array(MOST_STACKS);
  const force = new Float64Array(MOST_STACKS);
  const curvature = new Float64Array(MOST_STACKS);

  function bendStacks(
    stacks: number,
    count: number,
    bottom: number,
    stressAt = 2 * count,
    stressStep = 3 * count,
  ): void {
    const x = values;
    const k = factors;
    const sumOfStiffness = stretching;
    const sumOfMoments = firstMoment;
    const stiff = rigidity;
    const sumOfForces = force;
    const bent = curvature;
    let i = 0;
    let l = stressAt;
    for (let stack = 0; stack < stacks; stack += 1) {
      let top = bottom;
      let a = 0;
      let b = 0;
      let d = 0;
      let f = 0;
      let m = 0;
      let j = (i + count) | 0;
      const end = j;
      for (let n = 0; i < end; n = (n + 1) | 0) {
        const height = x[i] ?? 0;
        const below = top;
        top = below + height;
        const twice = below + top;
        const stiffness = (k[n] ?? 0) * (x[j] ?? 0) * height;
        const pull = (x[l] ?? 0) * height;
        a += stiffness;
        b += stiffness * twice;
        d += stiffness * (twice * twice - below * top);
        f += pull;
        m += pull * twice;
        i = (i + 1) | 0;
        j = (j + 1) | 0;
        l = (l + 1) | 0;
      }
      i = (j + count) | 0;
      l = (l + stressStep - count) | 0;
      // Here b, m and d are 2 B, 2 M and 3 D.
      const rigid = d * a * (4 / 3) - b * b;
      sumOfStiffness[stack] = a;
      sumOfMoments[stack] = b;
      stiff[stack] = rigid;
      sumOfForces[stack] = f;
      bent[stack] = (2 * (m * a - f * b)) / rigid;
    }
  }

  return { values, factors, stretching, firstMoment, rigidity, force, curvature, bendStacks };
}

const kernel = /* @__PURE__ */ makeKernel();

/**
 * What `bendStacks` reads: stack after stack, each with the thickness of its layers from the bottom up (m), then their moduli
 * (Pa), then their stresses while held at the reference strain (Pa, tension positive; over the whole area where a layer covers a
 * part of it). Whoever bends anything fills it anew, so it is to be filled and used in one go.
 */
export const LAYER_VALUES = kernel.values;

/** By what the modulus of each layer is multiplied, the same in all stacks: times the thickness it is the stiffness of the layer. */
export const MODULUS_FACTORS = kernel.factors;

/** How many stacks of so many layers `LAYER_VALUES` has room for, with their stresses a second time. */
export function stacksThatFit(layers: number): number {
  return Math.min(MOST_STACKS, Math.floor(ROOM / (4 * layers)));
}

/**
 * Bends so many stacks of `count` layers, whose lowest face is at the height `bottom` (m) over the reference. With the stiffness
 * s of a layer (N/m), its force f = stress times thickness (N/m) and its faces at b and t, so that its middle is z = (b + t)/2:
 *
 *   A = sum of s,  B = sum of s z,  D = sum of s (b² + b t + t²)/3,  F = sum of f,  M = sum of f z,
 *
 * from which follow the neutral plane B/A, the bending stiffness D − B²/A and the curvature (M − F B/A)/(D − B²/A), positive when
 * the top is concave. Stresses are read from the place `stressAt` of `LAYER_VALUES` on, `stressStep` places from stack to stack;
 * by default where they stand in the stacks. Nothing is checked and nothing allocated: a stack without stiffness gives no number.
 */
export const bendStacks = kernel.bendStacks;

const { stretching, firstMoment, rigidity, force, curvature } = kernel;

/** Curvature of a stack that was bent, 1/m. */
export function curvatureOf(stack: number): number {
  return curvature[stack] ?? 0;
}

/** Its stretching stiffness A, N/m. */
export function stretchingOf(stack: number): number {
  return stretching[stack] ?? 0;
}

/** Its neutral plane over the reference height, m. */
export function neutralPlaneOf(stack: number): number {
  return (0.5 * (firstMoment[stack] ?? 0)) / (stretching[stack] ?? 0);
}

/** What its layers pull with while held at the reference strain, N/m. */
export function forceOf(stack: number): number {
  return force[stack] ?? 0;
}

/**
 * Its bending stiffness about the neutral plane, N·m. Sums about a plane far from the neutral one lose digits here; near it none.
 */
export function bendingStiffnessOf(stack: number): number {
  return (0.25 * (rigidity[stack] ?? 0)) / (stretching[stack] ?? 0);
}
