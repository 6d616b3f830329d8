import type { FilmKind } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import { celsius, measured, range } from "./measured.ts";

const PRACTICE = "common practice, no source";
const MPa = 1e6;
const GPa = 1e9;
const ppm = 1e-6;

interface ReferenceFilm {
  name: string;
  kind: FilmKind;
  stressState: string;
  stress: Measured;
  youngsModulus: Measured;
  poissonsRatio: Measured;
  expansion: Measured;
  yieldStress: Measured | null;
  temperatureLimit: Measured | null;
  note: string;
}

const practice = (low: number, high: number, unit: number) => range(low * unit, high * unit, "assumed", PRACTICE);
const memory = (low: number, high: number, unit: number, of: string) =>
  range(low * unit, high * unit, "handbook", `${of}, from memory of the named publication`);

/** Starting values for a new site: ranges of the trade, to be replaced by what is measured here. */
export const REFERENCE_FILMS: ReferenceFilm[] = [
  {
    name: "Silicon dioxide, thermal",
    kind: "inorganic",
    stressState: "grown near 1000 °C, back at 25 °C",
    stress: memory(-400, -250, MPa, "EerNisse, Appl. Phys. Lett. 35 (1979) 8"),
    youngsModulus: memory(66, 73, GPa, "Jaccodine & Schlegel, J. Appl. Phys. 37 (1966) 2429"),
    poissonsRatio: measured(0.17, 0.02, "handbook", "Jaccodine & Schlegel 1966, from memory of the named publication"),
    expansion: memory(0.5, 0.56, ppm, "Jaccodine & Schlegel 1966"),
    yieldStress: null,
    temperatureLimit: measured(celsius(900), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Silicon dioxide, plasma",
    kind: "inorganic",
    stressState: "as deposited; drifts towards tension in vacuum and anneal",
    stress: practice(-300, -50, MPa),
    youngsModulus: practice(60, 85, GPa),
    poissonsRatio: practice(0.17, 0.2, 1),
    expansion: practice(0.5, 1.5, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Silicon nitride, plasma, tensile",
    kind: "inorganic",
    stressState: "as deposited",
    stress: practice(50, 600, MPa),
    youngsModulus: practice(130, 210, GPa),
    poissonsRatio: measured(0.25, 0.02, "assumed", PRACTICE),
    expansion: practice(1.5, 3, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Silicon nitride, plasma, compressive",
    kind: "inorganic",
    stressState: "as deposited",
    stress: practice(-1500, -100, MPa),
    youngsModulus: practice(150, 230, GPa),
    poissonsRatio: measured(0.25, 0.02, "assumed", PRACTICE),
    expansion: practice(1.5, 3, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Silicon nitride, low-pressure",
    kind: "inorganic",
    stressState: "as deposited, stoichiometric",
    stress: memory(900, 1300, MPa, "Madou, Fundamentals of Microfabrication"),
    youngsModulus: practice(250, 300, GPa),
    poissonsRatio: practice(0.24, 0.27, 1),
    expansion: practice(1.6, 3.3, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(900), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Copper, plated",
    kind: "metal",
    stressState: "as plated; hot steps leave it in tension",
    stress: practice(-20, 100, MPa),
    youngsModulus: practice(100, 130, GPa),
    poissonsRatio: measured(0.34, 0.01, "assumed", PRACTICE),
    expansion: practice(16.5, 17, ppm),
    yieldStress: practice(150, 250, MPa),
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "Yield stress for 5 to 10 µm; thinner films are stronger.",
  },
  {
    name: "Copper seed, sputtered",
    kind: "metal",
    stressState: "as deposited",
    stress: practice(-200, 200, MPa),
    youngsModulus: practice(110, 130, GPa),
    poissonsRatio: measured(0.34, 0.01, "assumed", PRACTICE),
    expansion: measured(16.7 * ppm, 0.3 * ppm, "assumed", PRACTICE),
    yieldStress: practice(300, 500, MPa),
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Titanium, sputtered",
    kind: "metal",
    stressState: "as deposited",
    stress: practice(-500, 300, MPa),
    youngsModulus: practice(100, 116, GPa),
    poissonsRatio: measured(0.32, 0.01, "assumed", PRACTICE),
    expansion: measured(8.6 * ppm, 0.3 * ppm, "assumed", PRACTICE),
    yieldStress: null,
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Titanium-tungsten, sputtered",
    kind: "metal",
    stressState: "as deposited; follows pressure and bias",
    stress: practice(-1000, 500, MPa),
    youngsModulus: practice(200, 350, GPa),
    poissonsRatio: practice(0.28, 0.3, 1),
    expansion: practice(4.5, 6, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Tantalum barrier",
    kind: "metal",
    stressState: "as deposited",
    stress: practice(-2500, -500, MPa),
    youngsModulus: practice(180, 250, GPa),
    poissonsRatio: measured(0.34, 0.02, "assumed", PRACTICE),
    expansion: practice(6.3, 6.5, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Aluminium, sputtered",
    kind: "metal",
    stressState: "after anneal, back at 25 °C",
    stress: practice(20, 300, MPa),
    youngsModulus: practice(60, 72, GPa),
    poissonsRatio: practice(0.33, 0.35, 1),
    expansion: practice(23, 24, ppm),
    yieldStress: practice(100, 250, MPa),
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Nickel, back side",
    kind: "metal",
    stressState: "as deposited",
    stress: practice(-300, 600, MPa),
    youngsModulus: practice(160, 210, GPa),
    poissonsRatio: measured(0.31, 0.01, "assumed", PRACTICE),
    expansion: measured(13 * ppm, 0.3 * ppm, "assumed", PRACTICE),
    yieldStress: null,
    temperatureLimit: measured(celsius(400), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Silver, back side",
    kind: "metal",
    stressState: "as deposited",
    stress: practice(10, 120, MPa),
    youngsModulus: practice(70, 83, GPa),
    poissonsRatio: measured(0.37, 0.01, "assumed", PRACTICE),
    expansion: measured(19 * ppm, 0.5 * ppm, "assumed", PRACTICE),
    yieldStress: null,
    temperatureLimit: measured(celsius(300), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Polyimide",
    kind: "polymer",
    stressState: "after cure, back at 25 °C",
    stress: range(20 * MPa, 40 * MPa, "handbook", "Polym. Eng. Sci. 28 (1988), abstract: 20 to 40 MPa below 10 µm"),
    youngsModulus: practice(2.5, 4, GPa),
    poissonsRatio: practice(0.34, 0.4, 1),
    expansion: practice(30, 50, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(350), null, "assumed", PRACTICE),
    note: "Rigid-rod types are stiffer, 6 to 9 GPa, and expand far less.",
  },
  {
    name: "Polybenzoxazole",
    kind: "polymer",
    stressState: "after cure, back at 25 °C",
    stress: practice(25, 40, MPa),
    youngsModulus: practice(2, 3.5, GPa),
    poissonsRatio: practice(0.35, 0.4, 1),
    expansion: practice(45, 65, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(300), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Benzocyclobutene",
    kind: "polymer",
    stressState: "after cure, back at 25 °C",
    stress: practice(28, 40, MPa),
    youngsModulus: measured(2.9 * GPa, 0.2 * GPa, "assumed", PRACTICE),
    poissonsRatio: measured(0.34, 0.02, "assumed", PRACTICE),
    expansion: practice(42, 52, ppm),
    yieldStress: null,
    temperatureLimit: measured(celsius(300), null, "assumed", PRACTICE),
    note: "",
  },
  {
    name: "Solder, tin-silver",
    kind: "solder",
    stressState: "creeps at room temperature",
    stress: memory(0, 20, MPa, "handbook of solders"),
    youngsModulus: memory(40, 52, GPa, "handbook of solders"),
    poissonsRatio: memory(0.36, 0.4, 1, "handbook of solders"),
    expansion: memory(21, 23, ppm, "handbook of solders"),
    yieldStress: null,
    temperatureLimit: measured(celsius(221), null, "handbook", "melting point of the tin-silver eutectic, from memory"),
    note: "",
  },
];
