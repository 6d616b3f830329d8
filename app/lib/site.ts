/** The site as its documents name it: the legal owner in every title block. */
export const SITE_NAME = "Kestrel Ridge Packaging, pilot line";
