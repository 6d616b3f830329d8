import { environment } from "./environment.server.ts";

/** Beginning of an address that leaves the site, on paper: what the operator says, or where this request came to. */
export const publicOrigin = (url: URL): string => environment.PUBLIC_ADDRESS ?? url.origin;
