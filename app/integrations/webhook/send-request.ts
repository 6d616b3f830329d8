import { lookup, type LookupAddress, type LookupOptions } from "node:dns";
import { request as overHttp, type IncomingMessage } from "node:http";
import { request as overHttps } from "node:https";
import { connect, isIP, type LookupFunction, type Socket } from "node:net";
import { connect as connectOverTls } from "node:tls";

/** How long the whole of a request may take, milliseconds. */
export const LONGEST_REQUEST = 10_000;
/** Characters of an answer that are kept. */
export const MOST_KEPT = 500;

/** What a receiver answered, or why there is no answer, as the end of a sentence. */
export type Answer = { status: number; body: string; failure: null } | { status: null; body: ""; failure: string };

interface Posted {
  address: string;
  headers: Record<string, string>;
  body: string;
  /** whether a connection to this address of a network may be made */
  mayReach: (address: string) => boolean;
  /** as the resolver of the system does it, where nothing else is given */
  resolve?: typeof lookup;
  timeout?: number;
}

const NOT_PUBLIC = "its host has an address of a network that webhooks do not go to";
const NO_ADDRESS = "its host has no address";

/**
 * Posts a body to an address that somebody has named. Where its name leads is looked at when the connection is made, and once more on
 * the connection itself, so that a name which changes in between leads nowhere. Redirects are answers, not followed.
 */
export async function postTo(posted: Posted): Promise<Answer> {
  const url = new URL(posted.address);
  const isTls = url.protocol === "https:";
  const host = url.hostname.replace(/^\[|\]$/g, "");
  if (isIP(host) !== 0 && !posted.mayReach(host)) return failed(NOT_PUBLIC);
  const { timeout = LONGEST_REQUEST } = posted;
  const target = {
    host,
    port: Number(url.port || (isTls ? 443 : 80)),
    lookup: guardedLookup(posted),
  };
  const createConnection = () => {
    const socket: Socket = isTls
      ? connectOverTls({ ...target, ...(isIP(host) === 0 && { servername: host }), ALPNProtocols: ["http/1.1"] })
      : connect(target);
    // Before anything is written, since what is to be written waits for the same event.
    socket.once("connect", () => {
      if (!posted.mayReach(socket.remoteAddress ?? "")) socket.destroy(new Error(NOT_PUBLIC));
    });
    return socket;
  };
  return new Promise((resolve) => {
    const request = (isTls ? overHttps : overHttp)(url, {
      method: "POST",
      headers: { ...posted.headers, "Content-Length": String(Buffer.byteLength(posted.body)) },
      createConnection,
      signal: AbortSignal.timeout(timeout),
    });
    request.once("error", (error) => resolve(failed(inWords(error, timeout))));
    request.once("response", (response) => {
      beginningOf(response)
        .then((body) => resolve({ status: response.statusCode ?? 0, body, failure: null }))
        .catch((error: unknown) => resolve(failed(inWords(error, timeout))))
        .finally(() => request.destroy());
    });
    request.end(posted.body);
  });
}

const failed = (failure: string): Answer => ({ status: null, body: "", failure });

/** The resolver of the system, that gives no address which may not be reached: one among several is one too many. */
function guardedLookup({ mayReach, resolve = lookup }: Posted): LookupFunction {
  return (hostname, options, callback) => {
    resolve(hostname, { ...(options as LookupOptions), all: true }, (error, addresses: LookupAddress[]) => {
      const [first] = addresses ?? [];
      if (error || first === undefined) return callback(error ?? new Error(NO_ADDRESS), "", 0);
      if (!addresses.every(({ address }) => mayReach(address))) return callback(new Error(NOT_PUBLIC), "", 0);
      return options.all ? callback(null, addresses) : callback(null, first.address, first.family);
    });
  };
}

/** The first characters of an answer; whatever comes after them is not waited for. */
async function beginningOf(response: IncomingMessage): Promise<string> {
  let text = "";
  response.setEncoding("utf8");
  for await (const piece of response) {
    text += String(piece);
    if (text.length >= MOST_KEPT) break;
  }
  // NUL is no character to the database.
  return text.replaceAll("\0", "").slice(0, MOST_KEPT);
}

const CODES: Record<string, string> = {
  ECONNREFUSED: "the connection was refused",
  ECONNRESET: "the connection was broken off",
  EHOSTUNREACH: "its host cannot be reached",
  ENETUNREACH: "its network cannot be reached",
  ENOTFOUND: NO_ADDRESS,
  EAI_AGAIN: "the address of its host could not be looked up",
  ETIMEDOUT: "the connection could not be made in time",
};

function inWords(error: unknown, timeout: number): string {
  if (!(error instanceof Error)) return "the connection failed";
  if (error.name === "AbortError" || error.name === "TimeoutError")
    return `there was no whole answer within ${timeout / 1000}\u00A0s`;
  const { code } = error as NodeJS.ErrnoException;
  if (code !== undefined) return CODES[code] ?? `the connection failed (${code})`;
  return error.message === NOT_PUBLIC || error.message === NO_ADDRESS ? error.message : "the connection failed";
}
