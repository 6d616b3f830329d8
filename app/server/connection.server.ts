import { subscribe } from "node:diagnostics_channel";
import type { IncomingMessage, ServerResponse } from "node:http";
import { clientAddress } from "./client-address.server.ts";
import { environment } from "./environment.server.ts";
import { siteIsOverTls } from "./over-tls.server.ts";

/** Header that carries the address of whoever asks to loaders; whatever a client sent under this name is overwritten. */
export const PEER_HEADER = "x-planeward-peer";

/** A year, and whatever is below this host. */
const STRICT_TRANSPORT = "max-age=31536000; includeSubDomains";

/** Addresses of files of `public/` and of the build, none of which a route has: routes bring a whole policy of their own. */
const FILES = /^\/(?:assets\/|[\w-]+\.(?:html|js|png|svg|webmanifest)$)/;

const kept = globalThis as { planewardWatchesConnections?: boolean };

/**
 * The production server answers static files before any middleware runs and hands no peer address on. Node announces every
 * request before it is handled, which is early enough for both: the address goes into a header of ours (of the proxies that are
 * trusted, that of whom they were asked by), and every answer, files
 * included, is marked as not to be sniffed and, where the site is reached over TLS, as never to be asked for without. Files are not to be framed.
 */
export function watchConnections(): void {
  if (kept.planewardWatchesConnections) return;
  kept.planewardWatchesConnections = true;
  subscribe("http.server.request.start", (message) => {
    const { request, response } = message as { request: IncomingMessage; response: ServerResponse };
    const forwarded = request.headers["x-forwarded-for"];
    request.headers[PEER_HEADER] = clientAddress(
      request.socket.remoteAddress ?? "",
      Array.isArray(forwarded) ? forwarded.join(",") : forwarded,
      environment.TRUSTED_PROXIES,
    );
    if (response.headersSent) return;
    response.setHeader("X-Content-Type-Options", "nosniff");
    if (FILES.test(request.url ?? "")) response.setHeader("Content-Security-Policy", "frame-ancestors 'none'");
    if (siteIsOverTls) response.setHeader("Strict-Transport-Security", STRICT_TRANSPORT);
  });
}
