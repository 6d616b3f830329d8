import { subscribe } from "node:diagnostics_channel";
import type { IncomingMessage, ServerResponse } from "node:http";

/** Header that carries the peer's address to loaders; whatever a client sent under this name is overwritten. */
export const PEER_HEADER = "x-planeward-peer";

const kept = globalThis as { planewardWatchesConnections?: boolean };

/**
 * The production server answers static files before any middleware runs and hands no peer address on. Node announces every
 * request before it is handled, which is early enough for both: the address goes into a header of ours, and every answer, files
 * included, is marked as not to be sniffed.
 */
export function watchConnections(): void {
  if (kept.planewardWatchesConnections) return;
  kept.planewardWatchesConnections = true;
  subscribe("http.server.request.start", (message) => {
    const { request, response } = message as { request: IncomingMessage; response: ServerResponse };
    request.headers[PEER_HEADER] = request.socket.remoteAddress ?? "";
    if (!response.headersSent) response.setHeader("X-Content-Type-Options", "nosniff");
  });
}
