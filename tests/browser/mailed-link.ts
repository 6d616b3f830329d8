import { readKept } from "#app/integrations/mail/fake/kept-mail.ts";
import { expect } from "./support.ts";

/** Links that a test has followed already. */
const known = new Set<string>();

/** The path of a link in the newest mail to an address that no test has followed yet. */
export async function mailedLink(address: string, page: "set-password" | "confirm-address"): Promise<string> {
  const path = new RegExp(`/${page}/[\\w-]+`);
  let found = "";
  await expect
    .poll(
      async () => {
        const mails = await readKept(process.env["DEMO_MAIL_FOLDER"] ?? "");
        const links = mails.filter(({ to }) => to.includes(address)).flatMap(({ text }) => path.exec(text)?.[0] ?? []);
        found = links.find((link) => !known.has(link)) ?? "";
        return found;
      },
      { timeout: 60_000 },
    )
    .not.toBe("");
  known.add(found);
  return found;
}
