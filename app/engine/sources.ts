import { memory, type Source } from "./sources/source.ts";
import { METROLOGY_SOURCES } from "./sources/metrology.ts";
import { STATISTICS } from "./sources/statistics.ts";

export type { Source, SourceBasis } from "./sources/source.ts";

/**
 * Bibliography. Every constant and equation of the engine names an entry by its key.
 *
 * `basis` says how far the entry was consulted: the text itself, only its abstract, or knowledge of it from memory. Facts of
 * the trade without a publication are `common practice, no source`; results worked out for this program are `own derivation`
 * (on paper, checked numerically) or `own computation` (numerical solution, described in `place`).
 */
export const SOURCES = {
  "stoney-1909": {
    author: "G. G. Stoney",
    title: "The tension of metallic films deposited by electrolysis",
    year: 1909,
    place: "Proceedings of the Royal Society of London A 82, page 172",
    basis: memory,
  },
  "feng-huang-rosakis-2007": {
    author: "X. Feng, Y. Huang, A. J. Rosakis",
    title: "On the Stoney formula for a thin film/substrate system with nonuniform substrate thickness",
    year: 2007,
    place: "Journal of Applied Mechanics 74, page 1276, equation (1)",
    basis: "read",
  },
  "cheung-ee143-2010": {
    author: "N. Cheung",
    title: "EE143 Microfabrication Technology, homework 12 with solutions",
    year: 2010,
    place: "University of California, Berkeley",
    basis: "read",
  },
  "freund-suresh-2003": {
    author: "L. B. Freund, S. Suresh",
    title: "Thin Film Materials: Stress, Defect Formation and Surface Evolution",
    year: 2003,
    place: "Cambridge University Press, chapter 2",
    basis: memory,
  },
  "freund-floro-chason-1999": {
    author: "L. B. Freund, J. A. Floro, E. Chason",
    title:
      "Extensions of the Stoney formula for substrate curvature to configurations with thin substrates or large deformations",
    year: 1999,
    place: "Applied Physics Letters 74, page 1987",
    basis: memory,
  },
  "freund-2000": {
    author: "L. B. Freund",
    title: "Substrate curvature due to thin film mismatch strain in the nonlinear deformation range",
    year: 2000,
    place: "Journal of the Mechanics and Physics of Solids 48, page 1159",
    basis: memory,
  },
  "timoshenko-1925": {
    author: "S. Timoshenko",
    title: "Analysis of bi-metal thermostats",
    year: 1925,
    place: "Journal of the Optical Society of America 11, page 233",
    basis: memory,
  },
  "townsend-barnett-brunner-1987": {
    author: "P. H. Townsend, D. M. Barnett, T. A. Brunner",
    title:
      "Elastic relationships in layered composite media with approximation for the case of thin films on a thick substrate",
    year: 1987,
    place: "Journal of Applied Physics 62, page 4438",
    basis: memory,
  },
  "hsueh-2002": {
    author: "C.-H. Hsueh",
    title: "Modeling of elastic deformation of multilayers due to residual stresses and external bending",
    year: 2002,
    place: "Journal of Applied Physics 91, page 9652",
    basis: memory,
  },
  "hsueh-lee-chuang-2003": {
    author: "C.-H. Hsueh, S. Lee, T.-J. Chuang",
    title: "An alternative method of solving multilayer bending problems",
    year: 2003,
    place: "Journal of Applied Mechanics 70, page 151",
    basis: "abstract read",
  },
  "okada-tokumaru-1984": {
    author: "Y. Okada, Y. Tokumaru",
    title:
      "Precise determination of lattice parameter and thermal expansion coefficient of silicon between 300 and 1500 K",
    year: 1984,
    place: "Journal of Applied Physics 56, page 314",
    basis: "abstract read",
  },
  "silicon-properties-note": {
    author: "technical note of a wafer maker",
    title: "Basic Mechanical and Thermal Properties of Silicon",
    year: null,
    place: "elastic constants and their temperature coefficients, reference 6 there; recommended expansion at 25 °C",
    basis: "read",
  },
  "hopcroft-nix-kenny-2010": {
    author: "M. A. Hopcroft, W. D. Nix, T. W. Kenny",
    title: "What is the Young's modulus of silicon?",
    year: 2010,
    place: "Journal of Microelectromechanical Systems 19, page 229",
    basis: memory,
  },
  "brantley-1973": {
    author: "W. A. Brantley",
    title: "Calculated elastic constants for stress problems associated with semiconductor devices",
    year: 1973,
    place: "Journal of Applied Physics 44, page 534",
    basis: memory,
  },
  "mems-talk-elastic-constants": {
    author: "K. Williams, G. C. Johnson",
    title: "Elastic constants of silicon, letters quoting Brantley 1973",
    year: 1995,
    place: "MEMS-Talk mailing list, 1995 to 2001",
    basis: "read",
  },
  "cubic-layer-exercise": {
    author: "textbook exercise, author not given",
    title: "Biaxial modulus of a zinc-blende epitaxial layer of orientation (hkl)",
    year: null,
    place: "exercise statement",
    basis: "read",
  },
  "silicon-density": {
    author: "CODATA and handbooks",
    title: "Density of silicon at 25 °C",
    year: null,
    place: "2329 kg/m3",
    basis: memory,
  },
  "semi-mf534": {
    author: "SEMI",
    title: "MF534, Test Method for Bow of Silicon Wafers",
    year: null,
    place: "SEMI, after ASTM F534",
    basis: memory,
  },
  "semi-mf1390": {
    author: "SEMI",
    title: "MF1390, Test Method for Measuring Bow and Warp on Silicon Wafers by Automated Noncontact Scanning",
    year: null,
    place: "SEMI, after ASTM F1390",
    basis: "abstract read",
  },
  "marks-hassan-cheong-2014": {
    author: "M. R. Marks, Z. Hassan, K. Y. Cheong",
    title: "Characterization methods for ultrathin wafer and die quality: a review",
    year: 2014,
    place: "IEEE Transactions on Components, Packaging and Manufacturing Technology 4, page 2042",
    basis: "read",
  },
  "masters-salamon-1993": {
    author: "C. B. Masters, N. J. Salamon",
    title: "Geometrically nonlinear stress-deflection relations for thin film/substrate systems",
    year: 1993,
    place: "International Journal of Engineering Science 31, page 915",
    basis: memory,
  },
  "finot-1997": {
    author: "M. Finot, I. A. Blech, S. Suresh, H. Fujimoto",
    title: "Large deformation and geometric instability of substrates with thin-film deposits",
    year: 1997,
    place: "Journal of Applied Physics 81, page 3457",
    basis: memory,
  },
  "plate-perturbation": {
    author: "this program",
    title: "Free circular plate under uniform moments: first correction of von Karman's theory in closed form",
    year: null,
    place: "third order in the curvature; compared with the numerical solution below",
    basis: "own derivation",
  },
  "plate-von-karman": {
    author: "this program",
    title: "Free circular plate under uniform moments: von Karman's energy minimised in polynomials",
    year: null,
    place:
      "Zernike polynomials of degree 18 to 34 with the membrane forces solved in the same degree, isotropic for ν from 0 to 0.5 and silicon (001) in all directions; converged to 1 part in 10 000, tabulated within 0.2 % and compared with several hundred solutions of higher degree",
    basis: "own computation",
  },
  "plate-endless-roll": {
    author: "this program",
    title: "Free circular plate rolled without limit: a cylinder with a narrow bent rim",
    year: null,
    place: "rim as a beam on an elastic foundation; the numerical solution above tends to it",
    basis: "own derivation",
  },
  "eigenstrain-convention": {
    author: "this program",
    title: "Film stress kept as a free strain quoted on a flat, rigid, thick substrate",
    year: null,
    place:
      "product convention; other reference states differ by terms of the order of the film's share of the stiffness",
    basis: "own derivation",
  },
  "jones-1999": {
    author: "R. M. Jones",
    title: "Mechanics of Composite Materials, second edition",
    year: 1999,
    place: "Taylor and Francis, chapter 4: stretching, coupling and bending stiffness of a laminate",
    basis: memory,
  },
  "shen-suresh-blech-1996": {
    author: "Y.-L. Shen, S. Suresh, I. A. Blech",
    title: "Stresses, curvatures, and shape changes arising from patterned lines on silicon wafers",
    year: 1996,
    place: "Journal of Applied Physics 80, page 1388",
    basis: memory,
  },
  "wikstrom-1999": {
    author: "A. Wikström, P. Gudmundson, S. Suresh",
    title: "Thermoelastic analysis of periodic thin lines deposited on a substrate",
    year: 1999,
    place: "Journal of the Mechanics and Physics of Solids 47, page 1113",
    basis: memory,
  },
  "edge-relief-elements": {
    author: "this program",
    title: "Stress left in lines and round islands on thick silicon, by plane and axisymmetric finite elements",
    year: null,
    place:
      "quadratic elements, straight walls, films of 1 to 270 GPa, width 0.1 to 100 film thicknesses, coverage 0.2 to 0.8; fine to 1 part in 100",
    basis: "own computation",
  },
  "timoshenko-woinowsky-krieger-1959": {
    author: "S. Timoshenko, S. Woinowsky-Krieger",
    title: "Theory of Plates and Shells, second edition",
    year: 1959,
    place: "McGraw-Hill, chapter 3: symmetrical bending of circular plates",
    basis: memory,
  },
  "chen-2003": {
    author: "W.-F. Chen, J. Y. R. Liew (editors)",
    title: "The Civil Engineering Handbook, second edition",
    year: 2003,
    place: "CRC Press, page 47-50, equations 47.73 and 47.75",
    basis: "read",
  },
  "plate-circular-central-sheet": {
    author: "author not given",
    title: "Plate, circular, central: spreadsheet of the deflection of a centrally loaded circular plate",
    year: null,
    place: "after Roark's Formulas for Stress and Strain, with a finite-element value beside each result",
    basis: "read",
  },
  "nelson-lubliner-mast-1982": {
    author: "J. Nelson, J. Lubliner, T. Mast",
    title: "Telescope mirror supports: plate deflections on point supports",
    year: 1982,
    place:
      "Proceedings of SPIE 332; read as quoted by C. Grant in a letter to a mailing list of telescope makers, 26 July 1995",
    basis: "read",
  },
  "plate-gravity": {
    author: "this program",
    title: "Circular plate under its own weight on points and rails: series in closed form, one-sided contact on rails",
    year: null,
    place: "free edge exact for every harmonic; rails cut into 40 points with four-fold symmetry",
    basis: "own computation",
  },
  "plate-gravity-cubic": {
    author: "this program",
    title: "Circular plate of silicon (100) with cubic stiffness under its own weight, by Ritz in polynomials",
    year: null,
    place: "degree 14, against the same with isotropic constants, which leaves the stiffness of the basis out",
    basis: "own computation",
  },
  "plate-gravity-large": {
    author: "this program",
    title: "Circular plate under its own weight, von Karman's energy minimised in polynomials",
    year: null,
    place:
      "edge ring of full symmetry, degree 48; three points of threefold symmetry, degree 18 with the singular linear solution in the basis",
    basis: "own computation",
  },
  "chuck-contact": {
    author: "this program",
    title: "Bowed plate sucked onto a flat: one-sided contact with a free boundary",
    year: null,
    place: "equilibrium integrated by hand, radius of contact by bisection; the narrow limit is a strip",
    basis: "own derivation",
  },
  "weibull-1951": {
    author: "W. Weibull",
    title: "A statistical distribution function of wide applicability",
    year: 1951,
    place: "Journal of Applied Mechanics 18, page 293",
    basis: memory,
  },
  "jiun-2006": {
    author: "H. H. Jiun, I. Ahmad, A. Jalar, G. Omar",
    title: "Effect of wafer thinning methods towards fracture strength and topography of silicon die",
    year: 2006,
    place: "Microelectronics Reliability 46, page 836",
    basis: "abstract read",
  },
  "mcguire-1997": {
    author: "K. McGuire, S. Danyluk, T. L. Baker, J. W. Rupnow, D. McLaughlin",
    title: "The influence of backgrinding on the fracture strength of 100 mm diameter (111) p-type silicon wafers",
    year: 1997,
    place: "Journal of Materials Science 32, page 1017",
    basis: "abstract read",
  },
  "chen-ayon-spearing-1998": {
    author: "K.-S. Chen, A. Ayon, S. M. Spearing",
    title: "Silicon strength testing for mesoscale structural applications",
    year: 1998,
    place: "Materials Research Society Symposium Proceedings",
    basis: "abstract read",
  },
  "die-critical-size": {
    author: "this program",
    title: "Critical size of a die from the disc of equal area",
    year: null,
    place: "estimate; a rectangle rolls at another size than a disc",
    basis: "own derivation",
  },
  "sliding-pair": {
    author: "this program",
    title: "Pair of plates on an adhesive that flows: shared curvature, no shear, and the state in which it locks",
    year: null,
    place: "balance of forces of each plate and of the moments of both",
    basis: "own derivation",
  },
  ...STATISTICS,
  ...METROLOGY_SOURCES,
  "common-practice": {
    author: "the trade",
    title: "Common practice in wafer handling",
    year: null,
    place: "no publication; a site sets its own numbers",
    basis: "common practice, no source",
  },
} as const satisfies Record<string, Source>;

/** Key of a bibliography entry. */
export type SourceId = keyof typeof SOURCES;

/** One entry as a reader should see it: author, title, place, year, and how far it was consulted. */
export function citation(id: SourceId): string {
  const source: Source = SOURCES[id];
  const year = source.year === null ? "" : ` (${source.year})`;
  return `${source.author}: ${source.title}. ${source.place}${year}. Basis: ${source.basis}.`;
}
