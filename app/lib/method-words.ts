/** A term and what it means here. */
export interface Term {
  term: string;
  meaning: string;
}

/** How signs and standard words are meant, everywhere in the program. */
export const CONVENTIONS: readonly Term[] = [
  {
    term: "Curvature",
    meaning:
      "Positive for a bowl: the device side is concave, as a tensile film on the device side makes it. The vertical axis points out of the device side.",
  },
  {
    term: "Stress of a film",
    meaning:
      "Positive in tension. It is what the film would have held flat on a rigid, thick wafer at 25 °C and in a stated state, as a full-thickness monitor gives it. Inside, it is kept as a strain, so for elastic films the order of layers does not matter.",
  },
  {
    term: "Bow, SEMI MF534",
    meaning:
      "Centre of the wafer’s median surface against a plane through three points near the edge, free and without gravity. Positive when the centre lies above that plane with the device side up, so a tensile film on the device side gives a negative bow. Many lines use the other sign: it is said with every figure.",
  },
  {
    term: "Warp, SEMI MF1390",
    meaning:
      "Largest less smallest distance of the median surface from its least-squares plane, gravity compensated. Never negative. Steps are judged by warp: a saddle has no bow at all.",
  },
  {
    term: "Sori, SEMI MF1451",
    meaning:
      "The same for the front surface from its own least-squares plane; close to warp where thickness varies little.",
  },
  {
    term: "Scope of these standards",
    meaning:
      "They cover wafers of about 100 µm and more. For thinner silicon the figures here are of the same geometry, but no standard method measures them: say how the wafer was held.",
  },
  {
    term: "Shape as loaded",
    meaning:
      "Words such as edges up and edges down are as the wafer lies on that tool. From bond to debond the pair lies carrier down: back side up when it is bonded by its device side, device side up when by its back side; between two carriers it lies on the one that was bonded last. Where the warp is smaller than the ± beside it, it is called flat within its uncertainty: which edges lie up is then not known. The standard bow stands beside them, second.",
  },
  {
    term: "Tolerance and ±",
    meaning:
      "A tolerance is the half-width of the interval believed to hold a value; its standard uncertainty is the tolerance divided by the square root of 3. The ± of a computed or measured figure is its expanded uncertainty, k = 2.",
  },
  {
    term: "At a limit",
    meaning:
      "At the limit passes with a caution, beyond it fails. A margin turns clear into caution from limit minus margin on. Thickness is judged at nominal minus tolerance; no tolerance given is a caution of its own.",
  },
  {
    term: "Missing",
    meaning: "A blank is missing, never zero. What cannot be judged for want of an input says so and never passes.",
  },
];

/** The program's own words, one meaning each. */
export const GLOSSARY: readonly Term[] = [
  { term: "assessment", meaning: "A flow walked and judged once, stored whole with its inputs and never changed." },
  {
    term: "assumed",
    meaning: "A value that nobody measured or looked up. It stays visible as such all the way to the sheet.",
  },
  { term: "bare", meaning: "Nothing holds the wafer but the tool’s normal handling." },
  {
    term: "bow line",
    meaning: "The wafer drawn as a thin section bent by its own shape, with the exaggeration beside it.",
  },
  { term: "carrier", meaning: "A plate of glass or silicon to which the wafer is bonded for a while." },
  { term: "cannot judge", meaning: "A finding for which an input is missing. It blocks like do not run." },
  {
    term: "curled, rolls up",
    meaning:
      "A free wafer beyond its critical load: it bends about one axis. It has a roll radius and an edge lift, and no bow.",
  },
  { term: "debond", meaning: "Taking the wafer off its carrier: by heat and slide, laser, peel or solvent." },
  { term: "edge lift", meaning: "How far the edges of a curled wafer stand over its middle." },
  {
    term: "edge trim",
    meaning: "A step cut into the edge before grinding, so that the thinned wafer has no knife edge.",
  },
  { term: "film", meaning: "A deposited layer. Never the tape." },
  {
    term: "finding",
    meaning:
      "One rule’s outcome at one step: clear, caution, needs support, do not run or cannot judge; with figures, limit, the limit’s source and what would clear it.",
  },
  { term: "flow", meaning: "The ordered steps from the incoming wafer to dicing." },
  { term: "hold lot", meaning: "Stops this lot, wherever it is." },
  { term: "pair", meaning: "Wafer and carrier bonded together." },
  { term: "program", meaning: "A customer’s device program: the boundary of who may see what." },
  { term: "redistribution layer", meaning: "Metal lines in polymer that lead pads to where balls or bumps stand." },
  { term: "scan", meaning: "A profile across a wafer before a film and one after it, on the same line." },
  { term: "sheet", meaning: "The handling-risk sheet that the floor works from, with number and revision." },
  {
    term: "side up",
    meaning:
      "Which face is up on the tool: device side before bonding; from bond to debond the face away from the carrier that it lies on.",
  },
  { term: "stack", meaning: "Films on both sides of silicon of a given remaining thickness." },
  { term: "stop step", meaning: "Stops every lot at that step." },
  { term: "support planned", meaning: "What the flow says holds the wafer at a step." },
  {
    term: "support required",
    meaning: "The weakest support that the rules allow there. A finding arises only where less is planned.",
  },
  {
    term: "tape or ring",
    meaning:
      "Grinding tape, film frame with dicing tape, or edge ring. A frame takes 60 to 80 °C at most and no vacuum.",
  },
  { term: "thin-wafer gripper", meaning: "Edge grip, contactless or full-area pad: holds only while on that tool." },
  { term: "total thickness variation", meaning: "Largest less smallest thickness over a wafer, carrier or bond; TTV." },
  {
    term: "two-carrier transfer",
    meaning:
      "Bonded by the device side, thinned, bonded by the back side to a second carrier, let go by the first: the device side is free again for work.",
  },
  { term: "verdict", meaning: "An assessment’s worst finding and the first step that causes it." },
  {
    term: "working",
    meaning: "The calculation behind a figure: equation, inputs with units, source, range of validity.",
  },
];

/** Handling rules by number; those that are not judged yet are said to be left out. */
const ALL_RULES: readonly { number: number; title: string }[] = [
  { number: 3, title: "curling of a free wafer against its critical load" },
  { number: 4, title: "holding flat, and strength at chuck, gripper and peel" },
  { number: 5, title: "sag plus warp against clearance, and weight" },
  { number: 7, title: "carrier and pair: light path, sensing, reuse" },
  { number: 9, title: "cover of bumps and thickness budget" },
  { number: 10, title: "edge trim depth and stress relief" },
  { number: 11, title: "temperature limits of films and solder" },
  { number: 13, title: "age and state of stress values" },
  { number: 14, title: "validity of the thin-film relation" },
  { number: 15, title: "incoming gate" },
  { number: 16, title: "capability of tape" },
  { number: 17, title: "moisture and clocks" },
  { number: 18, title: "contact with either face" },
];

/** What this version does not know, so that nobody takes silence for a pass. */
export function leftOut(judged: readonly number[]): string[] {
  const rules = ALL_RULES.filter(({ number }) => !judged.includes(number));
  return [
    ...(rules.length > 0
      ? [`Rules not judged yet: ${rules.map(({ number, title }) => `${number}, ${title}`).join("; ")}.`]
      : []),
    "An incoming shape other than that of films: a lot’s measured bow is taken as theirs, the wafer’s own crystal shape does not enter a flow.",
    "Shapes are those of a free wafer without weight: sag is added to warp, not solved together with it.",
    "Narrow parallel lines, which pull along their length only: films count by the area that they cover.",
    "Split legs and rework loops.",
    "How far two carriers bend at the peel front while a wafer between them leaves one and stays on the other.",
    "Moulded or reconstituted wafers, panels and packages: they are out of scope, whatever figures are typed.",
  ];
}
