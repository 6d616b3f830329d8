/** A mail as a mail server gets it. */
export interface OutgoingMail {
  /** the same at every attempt */
  messageId: string;
  to: { name: string; address: string };
  subject: string;
  text: string;
  html: string;
  /** pictures that the HTML names by `cid:` */
  pictures: { cid: string; fileName: string; content: Buffer }[];
  /** where mail of this kind is stopped by a single post; null where it can't be */
  unsubscribe: string | null;
  /** a digest or a single mail: readers of mail sort by it */
  sentAt: Date;
}

/** How an attempt ended. 'unsure' is one that ended after the text was begun and before the server said that it has it. */
export type Delivery = { outcome: "accepted" } | { outcome: "refused" | "not now" | "unsure"; reason: string };

/** Where mail goes. */
export interface MailTransport {
  /** Never throws: what went wrong is its answer. It ends within `LONGEST_ATTEMPT`. */
  send(mail: OutgoingMail): Promise<Delivery>;
  /** Whether a mail of this Message-ID has arrived; null where nobody can tell, which is so of every mail server at large. */
  has(messageId: string): Promise<boolean | null>;
}

/** After this long an attempt is given up, milliseconds. */
export const LONGEST_ATTEMPT = 20_000;
