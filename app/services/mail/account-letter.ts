import { TOKEN_LIFETIME_WORDS, type AccountMail } from "#app/lib/account-mail.ts";
import { oneLine } from "#app/lib/mail/one-line.ts";
import type { Letter } from "./letter.ts";

interface Written {
  /** the beginning of every link */
  site: string;
  /** of the link; empty in a notice, which has none of its own */
  secret: string;
  name: string;
}

/** A mail about somebody's own account. */
export function accountLetter(kind: AccountMail, { site, secret, name }: Written): Letter {
  const { subject, sentence, mind, open, path } = wordsOf(kind, secret);
  return {
    subject,
    opening: null,
    parts: [
      {
        heading: subject,
        sentence,
        facts: [{ label: "For", value: oneLine(name) }],
        said: null,
        mind,
        link: { words: open, address: `${site}${path}` },
      },
    ],
    foot: { why: "You get this mail because it concerns your own account. It always comes.", links: [] },
  };
}

const NOT_YOU = "If this was not you, set a new password at once and tell your administrator.";

function wordsOf(kind: AccountMail, secret: string) {
  switch (kind) {
    case "invitation":
      return {
        subject: "Planeward: your invitation",
        sentence: `You are invited to Planeward. Set a password to begin; the link works once, for ${TOKEN_LIFETIME_WORDS[kind]}.`,
        mind: "Pass the link on to nobody. If you do not expect it, leave it alone.",
        open: "Set your password",
        path: `/set-password/${secret}`,
      };
    case "password reset":
      return {
        subject: "Planeward: set a new password",
        sentence: `A new password was asked for your account. The link works once, for ${TOKEN_LIFETIME_WORDS[kind]}.`,
        mind: "If you did not ask for it, do nothing: your password stays as it is.",
        open: "Set a new password",
        path: `/set-password/${secret}`,
      };
    case "address change":
      return {
        subject: "Planeward: confirm your new address",
        sentence: `This address is to become that of your account. Confirm it; the link works once, for ${TOKEN_LIFETIME_WORDS[kind]}.`,
        mind: "If you did not ask for it, do nothing: the account keeps its address.",
        open: "Confirm the address",
        path: `/confirm-address/${secret}`,
      };
    case "address changed":
      return {
        subject: "Planeward: your address was changed",
        sentence: "Your account has another e-mail address now, and mail goes there from now on.",
        mind: "If this was not you, tell your administrator at once.",
        open: "Open Planeward",
        path: "/",
      };
    case "password changed":
      return {
        subject: "Planeward: your password was changed",
        sentence: "The password of your account was changed, and every other session of it was ended.",
        mind: NOT_YOU,
        open: "Set a new password",
        path: "/forgotten",
      };
    case "codes on":
      return {
        subject: "Planeward: one-time codes are on",
        sentence:
          "Signing in to your account takes a one-time code from now on, and every other session of it was ended.",
        mind: NOT_YOU,
        open: "Look at your account",
        path: "/account/codes",
      };
    case "codes off":
      return {
        subject: "Planeward: one-time codes are off",
        sentence:
          "Signing in to your account takes no one-time code any more, and every other session of it was ended.",
        mind: NOT_YOU,
        open: "Look at your account",
        path: "/account/codes",
      };
    case "codes reset":
      return {
        subject: "Planeward: your one-time codes were reset",
        sentence:
          "An administrator has taken the one-time codes off your account, and every session of it was ended. Your password alone signs you in, until you set up codes anew.",
        mind: "If you did not ask for it, ask your administrator at once.",
        open: "Sign in",
        path: "/account/codes",
      };
    case "recovery codes made":
      return {
        subject: "Planeward: new recovery codes",
        sentence: "New recovery codes were made for your account. Those before work no more.",
        mind: NOT_YOU,
        open: "Look at your account",
        path: "/account/codes",
      };
    case "recovery code used":
      return {
        subject: "Planeward: a recovery code was used",
        sentence: "A recovery code of your account was used in place of a one-time code. It works no more.",
        mind: NOT_YOU,
        open: "Look at your account",
        path: "/account/codes",
      };
  }
}
