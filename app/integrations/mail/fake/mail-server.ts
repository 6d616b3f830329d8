import { once } from "node:events";
import type { AddressInfo } from "node:net";
import { buffer } from "node:stream/consumers";
import PostalMime from "postal-mime";
import { SMTPServer } from "smtp-server";
import { keepMail, keptId } from "./kept-mail.ts";

interface Options {
  port: number;
  folder: string;
  /** waits before a mail that has come whole is kept, and before its sender is told that it is */
  pause?: { beforeKept?: () => Promise<void>; afterKept?: () => Promise<void> };
}

/** The demo's own mail server: it takes every mail, on the loopback address alone, and delivers it nowhere but into a folder. */
export async function startMailServer({ port, folder, pause = {} }: Options) {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ["AUTH", "STARTTLS"],
    disableReverseLookup: true,
    size: 5_000_000,
    closeTimeout: 500,
    logger: false,
    onData(stream, session, callback) {
      const to = session.envelope.rcptTo.map(({ address }) => address);
      take(stream, to).then(
        () => callback(null),
        (error: unknown) => callback(error instanceof Error ? error : new Error(String(error))),
      );
    },
  });
  // A sender that is killed in the middle of a mail is no fault of the server.
  server.on("error", () => undefined);

  async function take(stream: NodeJS.ReadableStream, to: string[]): Promise<void> {
    const raw = await buffer(stream);
    await pause.beforeKept?.();
    const mail = await PostalMime.parse(raw, { attachmentEncoding: "base64" });
    const messageId = mail.messageId ?? "";
    const pictures = new Map(
      mail.attachments.map(({ contentId, mimeType, content }) => [
        (contentId ?? "").replace(/^<|>$/g, ""),
        `data:${mimeType};base64,${String(content)}`,
      ]),
    );
    await keepMail(folder, raw, {
      id: keptId(messageId),
      messageId,
      to,
      subject: mail.subject ?? "",
      from: mail.from?.address ?? "",
      text: mail.text ?? "",
      html: (mail.html ?? "").replace(/cid:([^"')\s>]+)/g, (cid, name: string) => pictures.get(name) ?? cid),
      headers: Object.fromEntries(mail.headers.map(({ key, value }) => [key, value])),
      arrivedAt: new Date().toISOString(),
    });
    await pause.afterKept?.();
  }

  const listener = server.listen(port, "127.0.0.1");
  await once(listener, "listening");
  return {
    port: (listener.address() as AddressInfo).port,
    stop: () => new Promise<void>((resolve) => server.close(() => resolve())),
  };
}
