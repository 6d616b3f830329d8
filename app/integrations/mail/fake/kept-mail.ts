import { createHash } from "node:crypto";
import { appendFile, mkdir, readdir, readFile, rename, stat, writeFile } from "node:fs/promises";
import { join } from "node:path";
import { z } from "zod";

/** A mail as the demo's own mail server keeps it beside the file that came. */
const keptMailSchema = z.object({
  id: z.string(),
  messageId: z.string(),
  to: z.array(z.string()),
  subject: z.string(),
  from: z.string(),
  text: z.string(),
  /** pictures that came with it stand in it */
  html: z.string(),
  headers: z.record(z.string(), z.string()),
  arrivedAt: z.string(),
});
export type KeptMail = z.infer<typeof keptMailSchema>;

const DELIVERIES = "deliveries.jsonl";

/** The name of a mail's files, from its Message-ID: what comes again has it already. */
export const keptId = (messageId: string) => createHash("sha256").update(messageId).digest("hex").slice(0, 32);

/** Whether a mail of this Message-ID has been kept. */
export async function isKept(folder: string, messageId: string): Promise<boolean> {
  return stat(join(folder, `${keptId(messageId)}.json`)).then(
    () => true,
    () => false,
  );
}

/**
 * Keeps a mail as it came (.eml) and as it reads (.json); one that is there already stays as it is, as readers of mail hide it.
 * Every delivery is noted, repeated or not.
 */
export async function keepMail(folder: string, raw: Buffer, mail: KeptMail): Promise<void> {
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const repeated = await isKept(folder, mail.messageId);
  if (!repeated) {
    await whole(join(folder, `${mail.id}.eml`), raw);
    await whole(join(folder, `${mail.id}.json`), JSON.stringify(mail, null, 2));
  }
  const { messageId, to, arrivedAt } = mail;
  await appendFile(join(folder, DELIVERIES), `${JSON.stringify({ messageId, to, arrivedAt, repeated })}\n`);
}

/** A file that is there whole or not at all. */
async function whole(file: string, content: string | Buffer): Promise<void> {
  await writeFile(`${file}.part`, content, { mode: 0o600 });
  await rename(`${file}.part`, file);
}

/** Every mail that was kept, the newest first. */
export async function readKept(folder: string): Promise<KeptMail[]> {
  const files = await readdir(folder).catch(() => []);
  const mails = await Promise.all(
    files
      .filter((file) => /^[0-9a-f]{32}\.json$/.test(file))
      .map(async (file) => keptMailSchema.parse(JSON.parse(await readFile(join(folder, file), "utf8")))),
  );
  return mails.toSorted((a, b) => b.arrivedAt.localeCompare(a.arrivedAt));
}
