import { memory, type Source } from "./source.ts";

/** Uncertainty, sampling, inverse questions and fits to measurements. */
export const STATISTICS = {
  "gum-2008": {
    author: "Joint Committee for Guides in Metrology",
    title: "JCGM 100:2008, Guide to the expression of uncertainty in measurement",
    year: 2008,
    place: "JCGM, clauses 5.1.2 and 7.2.6",
    basis: "read",
  },
  "gum-supplement-1-2008": {
    author: "Joint Committee for Guides in Metrology",
    title: "JCGM 101:2008, Propagation of distributions using a Monte Carlo method",
    year: 2008,
    place: "JCGM, clauses 6.4, 7 and 9.2",
    basis: memory,
  },
  "blackman-vigna-2021": {
    author: "D. Blackman, S. Vigna",
    title: "Scrambled linear pseudorandom number generators",
    year: 2021,
    place: "ACM Transactions on Mathematical Software 47, article 36",
    basis: memory,
  },
  "marsaglia-tsang-2000": {
    author: "G. Marsaglia, W. W. Tsang",
    title: "The ziggurat method for generating random variables",
    year: 2000,
    place: "Journal of Statistical Software 5, number 8",
    basis: memory,
  },
  "wichura-1988": {
    author: "M. J. Wichura",
    title: "Algorithm AS 241: the percentage points of the normal distribution",
    year: 1988,
    place: "Applied Statistics 37, page 477",
    basis: memory,
  },
  "cranley-patterson-1976": {
    author: "R. Cranley, T. N. L. Patterson",
    title: "Randomization of number theoretic methods for multiple integration",
    year: 1976,
    place: "SIAM Journal on Numerical Analysis 13, page 904",
    basis: memory,
  },
  "cools-kuo-nuyens-2006": {
    author: "R. Cools, F. Y. Kuo, D. Nuyens",
    title: "Constructing embedded lattice rules for multivariate integration",
    year: 2006,
    place: "SIAM Journal on Scientific Computing 28, page 2162",
    basis: memory,
  },
  "sampling-layers": {
    author: "this program",
    title: "Draws in two layers, lattice along the steepest direction, control by the first-order line",
    year: null,
    place: "unbiased for any model; checked against closed forms for linear models and against plain draws",
    basis: "own derivation",
  },
  "inverse-questions": {
    author: "this program",
    title: "Inputs at which a figure takes a value: places, sign changes and turns, halving",
    year: null,
    place:
      "every answer put back into the full model; roots closer than two turns between neighbouring places are missed",
    basis: "own derivation",
  },
  "clopper-pearson-1934": {
    author: "C. J. Clopper, E. S. Pearson",
    title: "The use of confidence or fiducial limits illustrated in the case of the binomial",
    year: 1934,
    place: "Biometrika 26, page 404",
    basis: memory,
  },
  "levenberg-1944": {
    author: "K. Levenberg",
    title: "A method for the solution of certain non-linear problems in least squares",
    year: 1944,
    place: "Quarterly of Applied Mathematics 2, page 164",
    basis: memory,
  },
  "marquardt-1963": {
    author: "D. W. Marquardt",
    title: "An algorithm for least-squares estimation of nonlinear parameters",
    year: 1963,
    place: "Journal of the Society for Industrial and Applied Mathematics 11, page 431",
    basis: memory,
  },
  "gum-supplement-2-2011": {
    author: "Joint Committee for Guides in Metrology",
    title: "JCGM 102:2011, Supplement 2 to the Guide: extension to any number of output quantities",
    year: 2011,
    place: "JCGM",
    basis: memory,
  },
} as const satisfies Record<string, Source>;
