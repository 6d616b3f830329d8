import { once } from "node:events";
import { Readable } from "node:stream";
import MailComposer from "nodemailer/lib/mail-composer";
import SMTPConnection from "nodemailer/lib/smtp-connection";
import { LONGEST_ATTEMPT, type Delivery, type MailTransport, type OutgoingMail } from "./transport.ts";

interface SmtpSettings {
  /** smtp://… or smtps://… */
  url: string;
  from: { name: string; address: string };
}

const LOOPBACK = new Set(["127.0.0.1", "localhost", "[::1]"]);

/**
 * A mail server that is spoken to by SMTP, one connection for each mail. Credentials cross a network only within TLS.
 * @param has whether a mail has arrived, where somebody can tell
 */
export function smtpTransport(settings: SmtpSettings, has: MailTransport["has"] = async () => null): MailTransport {
  return { send: (mail) => attempt(settings, mail), has };
}

async function attempt({ url, from }: SmtpSettings, mail: OutgoingMail): Promise<Delivery> {
  const message = await compose(from, mail);
  const { protocol, hostname, port, username, password } = new URL(url);
  const secure = protocol === "smtps:";
  const connection = new SMTPConnection({
    host: hostname.replace(/^\[|\]$/g, ""),
    port: port ? Number(port) : secure ? 465 : 587,
    secure,
    requireTLS: !secure && username !== "" && !LOOPBACK.has(hostname),
    connectionTimeout: LONGEST_ATTEMPT / 2,
    greetingTimeout: LONGEST_ATTEMPT / 2,
    socketTimeout: LONGEST_ATTEMPT,
    socketCloseTimeout: 1_000,
  });
  // Nothing of the text is asked for before the server has said that it wants it.
  let begun = false;
  const text = new Readable({
    read() {
      begun = true;
      this.push(message);
      this.push(null);
    },
  });
  const failed = new Promise<never>((_, reject) => {
    connection.once("error", reject);
    connection.once("end", () => reject(new Error("the connection ended")));
    setTimeout(() => reject(new Error("the mail server took too long")), LONGEST_ATTEMPT).unref();
  });
  // It may be nobody's any more when the connection ends in peace.
  failed.catch(() => undefined);
  const step = (run: (done: (error?: Error | null) => void) => void) =>
    Promise.race([failed, new Promise<void>((resolve, reject) => run((error) => (error ? reject(error) : resolve())))]);
  try {
    await step((done) => connection.connect((error) => done(error)));
    if (username !== "")
      await step((done) =>
        connection.login({ user: decodeURIComponent(username), pass: decodeURIComponent(password) }, done),
      );
    await step((done) => connection.send({ from: from.address, to: [mail.to.address] }, text, done));
    connection.quit();
    return { outcome: "accepted" };
  } catch (error) {
    connection.close();
    return failure(error, begun);
  }
}

function failure(error: unknown, begun: boolean): Delivery {
  const said = error instanceof Error ? error : new Error(String(error));
  const code = "responseCode" in said && typeof said.responseCode === "number" ? said.responseCode : null;
  const reason = said.message.replace(/\s+/g, " ").slice(0, 300);
  if (code !== null) {
    // A wrong password or a server that is not ready to be spoken to says nothing against this mail.
    const login = "code" in said && said.code === "EAUTH";
    return { outcome: code >= 500 && !login ? "refused" : "not now", reason };
  }
  return { outcome: begun ? "unsure" : "not now", reason };
}

/** The mail as it goes over the wire. Names and subject are encoded by the library, which also folds them. */
async function compose(from: SmtpSettings["from"], mail: OutgoingMail): Promise<Buffer> {
  const { messageId, to, subject, text, html, pictures, unsubscribe, sentAt } = mail;
  const composed = new MailComposer({
    from,
    to,
    subject,
    messageId,
    date: sentAt,
    text,
    html,
    attachments: pictures.map(({ cid, fileName, content }) => ({
      cid,
      content,
      filename: fileName,
      contentType: "image/png",
      contentDisposition: "inline" as const,
    })),
    headers: {
      "Auto-Submitted": "auto-generated",
      ...(unsubscribe === null
        ? {}
        : { "List-Unsubscribe": `<${unsubscribe}>`, "List-Unsubscribe-Post": "List-Unsubscribe=One-Click" }),
    },
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  const stream = composed.compile().createReadStream();
  const chunks: Buffer[] = [];
  stream.on("data", (chunk: Buffer) => chunks.push(chunk));
  await once(stream, "end");
  return Buffer.concat(chunks);
}
