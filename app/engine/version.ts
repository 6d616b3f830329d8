/** Stored with every result. Raised with every change that can move a number. */
export const ENGINE_VERSION = "0.3.1";
