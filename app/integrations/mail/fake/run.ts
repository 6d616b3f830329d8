import { z } from "zod";
import { startMailServer } from "./mail-server.ts";

/** The process of the demo's own mail server. */
const { SMTP_PORT, DEMO_MAIL_FOLDER } = z
  .object({ SMTP_PORT: z.coerce.number().int().min(1), DEMO_MAIL_FOLDER: z.string().min(1) })
  .parse(process.env);

const server = await startMailServer({ port: SMTP_PORT, folder: DEMO_MAIL_FOLDER });
for (const signal of ["SIGTERM", "SIGINT"] as const)
  process.once(signal, () => void server.stop().finally(() => process.exit()));
