import { environment } from "#app/server/environment.server.ts";

/** The Message-ID of a mail, the same for every attempt at it, in the domain that mail comes from. */
export function messageIdFor(id: string): string {
  const domain = environment.MAIL_FROM?.address.split("@").at(-1) ?? "planeward.invalid";
  return `<${id}@${domain}>`;
}
