/**
 * Half-width that a measured bow is taken to be known within where nobody stated any: capacitive tools ± 2 µm, as read in Marks,
 * Hassan and Cheong 2014 ('marks-hassan-cheong-2014').
 */
const USUAL_BOW_HALF_WIDTH = 2e-6;

/** Its standard uncertainty, rectangular, JCGM 100:2008 4.3.7, m. */
export const USUAL_BOW_UNCERTAINTY = USUAL_BOW_HALF_WIDTH / Math.sqrt(3);
