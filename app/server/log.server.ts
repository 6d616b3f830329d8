import pino from "pino";
import { environment } from "./environment.server.ts";

/**
 * The process's own log, one JSON object a line, on standard error: standard output carries the web server's access lines, which
 * hold whole addresses and are not kept.
 */
export const log = pino({ level: environment.LOG_LEVEL, base: null }, pino.destination(2));
