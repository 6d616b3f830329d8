import type { Deflection, InPlane, SectorPoint } from "./disc-basis.ts";
import { solveDense } from "./dense.ts";

/**
 * Large deflection of a plate of radius 1 and free edge under its own weight by von Karman's energy, minimised over given
 * deflections (each zero on the supports) and displacements in the plane. Deflection in thicknesses, up positive; the load is
 * Q = q a⁴/(D h), down.
 *
 * Energy per D h²/a²: bending ½ ∫ (κ_r + κ_θ)² − 2 (1 − ν)(κ_r κ_θ − κ_rθ²), stretching 6 ∫ ε_r² + ε_θ² + 2ν ε_r ε_θ +
 * (1 − ν)/2 γ² with ε_r = u_r,r + w_r²/2 and so on, weight Q ∫ w. Newton's method, the load rising in steps.
 */
export class VonKarmanPlate {
  readonly points: readonly SectorPoint[];
  readonly deflections: readonly Deflection[];
  readonly inPlane: readonly InPlane[];
  readonly nu: number;
  readonly bending: Float64Array[];
  readonly weight: Float64Array;

  constructor(i: { points: readonly SectorPoint[]; deflections: Deflection[]; inPlane: InPlane[]; nu: number }) {
    this.points = i.points;
    this.deflections = i.deflections;
    this.inPlane = i.inPlane;
    this.nu = i.nu;
    this.bending = this.deflections.map((a) => Float64Array.from(this.deflections, (b) => this.bendingEnergy(a, b)));
    this.weight = Float64Array.from(this.deflections, (a) =>
      this.points.reduce((sum, { weight }, n) => sum + weight * (a.value[n] ?? 0), 0),
    );
  }

  private bendingEnergy(a: Deflection, b: Deflection): number {
    const { nu } = this;
    let sum = 0;
    this.points.forEach(({ weight }, n) => {
      const [ar, at, as] = [a.bendR[n] ?? 0, a.bendT[n] ?? 0, a.twist[n] ?? 0];
      const [br, bt, bs] = [b.bendR[n] ?? 0, b.bendT[n] ?? 0, b.twist[n] ?? 0];
      sum += weight * (ar * br + at * bt + nu * (ar * bt + at * br) + 2 * (1 - nu) * as * bs);
    });
    return sum;
  }

  /** Coefficients of the deflections and displacements at load `q`, from those at a load nearby. */
  solve(q: number, start: readonly number[]): number[] {
    let unknowns = [...start];
    for (let round = 0; round < 40; round += 1) {
      const { gradient, hessian } = this.tangent(q, unknowns);
      const step = solveDense(hessian, gradient);
      unknowns = unknowns.map((value, n) => value - (step[n] ?? 0));
      const size = Math.max(...unknowns.map(Math.abs));
      if (Math.max(...step.map(Math.abs)) < 1e-9 * Math.max(size, 1e-6)) return unknowns;
    }
    throw new Error(`no equilibrium found at load ${q}`);
  }

  start(): number[] {
    return new Array<number>(this.deflections.length + this.inPlane.length).fill(0);
  }

  /** Height at any place, in thicknesses. */
  height(unknowns: readonly number[], r: number, angle: number): number {
    return this.deflections.reduce((sum, d, n) => sum + (unknowns[n] ?? 0) * d.at(r, angle), 0);
  }

  /** First and second derivative of the energy. */
  private tangent(q: number, unknowns: readonly number[]) {
    const { nu, deflections: ws, inPlane: us } = this;
    const [nw, total] = [ws.length, ws.length + us.length];
    const gradient = new Float64Array(total);
    const hessian = Array.from({ length: total }, () => new Float64Array(total));
    ws.forEach((_, i) => {
      const row = this.bending[i];
      const target = hessian[i];
      if (!row || !target) return;
      row.forEach((value, j) => {
        target[j] = value;
        gradient[i] = (gradient[i] ?? 0) + value * (unknowns[j] ?? 0);
      });
      gradient[i] = (gradient[i] ?? 0) + q * (this.weight[i] ?? 0);
    });
    // Per unknown: change of ε_r, ε_θ and γ at one point.
    const [er, et, eg] = [new Float64Array(total), new Float64Array(total), new Float64Array(total)];
    this.points.forEach(({ weight }, n) => {
      let [sr, st] = [0, 0];
      ws.forEach((w, i) => {
        sr += (unknowns[i] ?? 0) * (w.slopeR[n] ?? 0);
        st += (unknowns[i] ?? 0) * (w.slopeT[n] ?? 0);
      });
      let [strainR, strainT, shear] = [(sr * sr) / 2, (st * st) / 2, sr * st];
      us.forEach((u, j) => {
        const k = nw + j;
        er[k] = u.stretchR[n] ?? 0;
        et[k] = u.stretchT[n] ?? 0;
        eg[k] = u.shear[n] ?? 0;
        const b = unknowns[k] ?? 0;
        strainR += b * (er[k] ?? 0);
        strainT += b * (et[k] ?? 0);
        shear += b * (eg[k] ?? 0);
      });
      ws.forEach((w, i) => {
        const [a, b] = [w.slopeR[n] ?? 0, w.slopeT[n] ?? 0];
        er[i] = sr * a;
        et[i] = st * b;
        eg[i] = sr * b + st * a;
      });
      const c = 12 * weight;
      const [forceR, forceT, forceS] = [
        c * (strainR + nu * strainT),
        c * (strainT + nu * strainR),
        ((c * (1 - nu)) / 2) * shear,
      ];
      for (let i = 0; i < total; i += 1) {
        const [ri, ti, gi] = [er[i] ?? 0, et[i] ?? 0, eg[i] ?? 0];
        gradient[i] = (gradient[i] ?? 0) + forceR * ri + forceT * ti + forceS * gi;
        const [pr, pt, ps] = [c * (ri + nu * ti), c * (ti + nu * ri), ((c * (1 - nu)) / 2) * gi];
        const row = hessian[i];
        if (!row) continue;
        for (let j = 0; j <= i; j += 1) {
          row[j] = (row[j] ?? 0) + pr * (er[j] ?? 0) + pt * (et[j] ?? 0) + ps * (eg[j] ?? 0);
        }
        if (i >= nw) continue;
        const [ai, bi] = [ws[i]?.slopeR[n] ?? 0, ws[i]?.slopeT[n] ?? 0];
        for (let j = 0; j <= i; j += 1) {
          const [aj, bj] = [ws[j]?.slopeR[n] ?? 0, ws[j]?.slopeT[n] ?? 0];
          row[j] = (row[j] ?? 0) + forceR * ai * aj + forceT * bi * bj + forceS * (ai * bj + bi * aj);
        }
      }
    });
    // Bending was entered in full, the rest in the lower half.
    const full = hessian.map((row, i) => Array.from(row, (value, j) => (j <= i ? value : (hessian[j]?.[i] ?? 0))));
    return { gradient: [...gradient], hessian: full };
  }
}
