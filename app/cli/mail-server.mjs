import { join } from "node:path";
import { freePort, loopback } from "./ports.mjs";
import { root } from "./project.mjs";

/**
 * What the server and the worker are told of mail: what the environment says, or else the copy's own mail server, which delivers
 * nothing but into a folder. Beside a database of somebody else's nothing is made up: without SMTP_URL their mail waits.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {{ env: NodeJS.ProcessEnv, address: string, folder: string, own: boolean }} options address: where this copy is
 *   opened; folder: where its own mail server keeps what comes; own: whether it may start one
 * @returns {Promise<NodeJS.ProcessEnv>}
 */
export async function mailSettings(keeper, { env, address, folder, own }) {
  if (env.SMTP_URL || !own) return { ...env, DEMO_MAIL_FOLDER: undefined };
  const port = await freePort();
  keeper.start(process.execPath, ["--import", "tsx", join(root, "app/integrations/mail/fake/run.ts")], {
    cwd: root,
    env: { ...env, SMTP_PORT: String(port), DEMO_MAIL_FOLDER: folder },
    stdio: ["ignore", "ignore", "inherit"],
    stop: [
      ["SIGTERM", 2_000],
      ["SIGKILL", 2_000],
    ],
  });
  return {
    ...env,
    SMTP_URL: `smtp://${loopback}:${port}`,
    MAIL_FROM: env.MAIL_FROM ?? "Planeward <planeward@kestrel-ridge.example>",
    PUBLIC_ADDRESS: env.PUBLIC_ADDRESS ?? address,
    DEMO_MAIL_FOLDER: folder,
  };
}
