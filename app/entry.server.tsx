import { PassThrough } from "node:stream";
import { createReadableStreamFromReadable } from "@react-router/node";
import { renderToPipeableStream } from "react-dom/server";
import { ServerRouter, type EntryContext, type RouterContextProvider } from "react-router";
import { watchConnections } from "./server/connection.server.ts";
import { nonceContext } from "./server/contexts.server.ts";
import { stopGracefully } from "./server/graceful-stop.server.ts";
import { log } from "./server/log.server.ts";
import { loggedPath } from "./server/logged-path.server.ts";

watchConnections();
stopGracefully();

/** A page that has not been written after this long is given up. */
export const streamTimeout = 10_000;

/** Writes a page once it is complete, so that it works before any script has run. */
export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  routerContext: EntryContext,
  context: RouterContextProvider,
): Promise<Response> {
  const nonce = context.get(nonceContext);
  return new Promise((resolve, reject) => {
    let answered = status;
    const { pipe, abort } = renderToPipeableStream(
      <ServerRouter context={routerContext} url={request.url} nonce={nonce} />,
      {
        nonce,
        onAllReady() {
          headers.set("Content-Type", "text/html; charset=utf-8");
          const body = new PassThrough();
          resolve(new Response(createReadableStreamFromReadable(body), { headers, status: answered }));
          pipe(body);
        },
        onShellError: reject,
        onError(error: unknown) {
          answered = 500;
          log.error({ error: String(error) }, "a page could not be written");
        },
      },
    );
    setTimeout(abort, streamTimeout + 1_000).unref();
  });
}

/** Faults of our own; a refusal that was meant is an answer and is not logged here. */
export function handleError(error: unknown, { request }: { request: Request }): void {
  if (request.signal.aborted) return;
  log.error(
    {
      path: loggedPath(request),
      error: error instanceof Error ? (error.stack ?? error.message) : String(error),
    },
    "a request failed",
  );
}
