import { z } from "zod";
import { mailSettings, requireWholeMail } from "./mail-settings.server.ts";

const schema = z
  .object({
    ...mailSettings,
    NODE_ENV: z.enum(["production", "development", "test"]).default("production"),
    DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
    /** what the keys that the server encrypts and signs with are derived from; made by `npm start` where it is not set */
    SECRET_KEY: z.string().regex(/^[\w-]{43,200}$/, "write 43 or more letters, digits, - and _, made at random"),
    /** comma-separated origins that may post forms besides the server's own, for a proxy in front */
    ALLOWED_ORIGINS: z
      .string()
      .default("")
      .transform((text) =>
        text
          .split(",")
          .map((origin) => origin.trim())
          .filter(Boolean),
      ),
    /** of one token, or of one person without a token */
    API_REQUESTS_PER_MINUTE: z.coerce.number().int().min(1).max(100_000).default(120),
    LOG_LEVEL: z.enum(["debug", "info", "warn", "error", "silent"]).default("info"),
  })
  .superRefine(requireWholeMail);

export type Environment = z.infer<typeof schema>;

function parseEnvironment(): Environment {
  const parsed = schema.safeParse(process.env);
  if (parsed.success) return parsed.data;
  const faults = parsed.error.issues.map(({ path, message }) => `${path.join(".")}: ${message}`).join("; ");
  throw new Error(`The environment is wrong, so Planeward does not start. ${faults}`);
}

/** The process environment, parsed once; a wrong one stops the start. */
export const environment = parseEnvironment();
