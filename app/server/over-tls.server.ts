import { environment } from "./environment.server.ts";

/** Whether people reach the site over TLS, by the address that the operator says: a proxy in front speaks plain HTTP to this process. */
export const siteIsOverTls = environment.PUBLIC_ADDRESS?.startsWith("https:") ?? false;

/** Whether this request came over TLS, to here or to the proxy in front. */
export const isOverTls = (request: Request): boolean => siteIsOverTls || new URL(request.url).protocol === "https:";
