import { once } from "node:events";
import { createServer } from "node:net";
import { Sentence } from "./sentence.mjs";

/** The only address anything of ours listens on. */
export const loopback = "127.0.0.1";

/**
 * Takes a port and lets it go again.
 *
 * @param {number} port 0 for any free one
 * @returns {Promise<number>} the port
 * @throws the system's error when it can't be had
 */
async function tryPort(port) {
  const server = createServer();
  server.listen({ port, host: loopback, exclusive: true });
  await once(server, "listening");
  const address = server.address();
  server.close();
  await once(server, "close");
  return typeof address === "object" && address ? address.port : port;
}

/** @returns {Promise<number>} a port that is free right now */
export function freePort() {
  return tryPort(0);
}

/**
 * The port to serve on, as the environment names it.
 *
 * @param {string | undefined} text PORT, 3000 when not set
 * @returns {number}
 */
export function wantedPort(text) {
  if (!text) return 3000;
  const port = Number(text);
  if (!/^\d+$/.test(text) || port < 1 || port > 65_535)
    throw new Sentence(`PORT is "${text}", and must be a whole number from 1 to 65535.`);
  return port;
}

/**
 * Refuses a port that somebody else has.
 *
 * @param {number} port
 */
export async function requireFreePort(port) {
  try {
    await tryPort(port);
  } catch (error) {
    const code = error instanceof Error && "code" in error ? error.code : undefined;
    const another = `choose another one with PORT, for example: PORT=${port === 3100 ? 3200 : 3100} npm start`;
    if (code === "EADDRINUSE") throw new Sentence(`Port ${port} is taken by another program; ${another}`);
    if (code === "EACCES") throw new Sentence(`Port ${port} is not open to this account; ${another}`);
    throw error;
  }
}
