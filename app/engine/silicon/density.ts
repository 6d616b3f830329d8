/** Density of silicon at 25 °C, kg/m3. Source: CODATA and handbooks, from memory. */
export const SILICON_DENSITY = 2329;
