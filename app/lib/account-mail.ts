/** What a link in a mail to one person is for. */
export const TOKEN_PURPOSES = ["invitation", "password reset", "address change"] as const;
export type TokenPurpose = (typeof TOKEN_PURPOSES)[number];

/** Mail about somebody's own account: it always comes, at once, and belongs to no program. */
export const ACCOUNT_MAIL_WORDS = {
  invitation: "An invitation",
  "password reset": "A link to set a password",
  "address change": "A new address is to be confirmed",
  "address changed": "The address was changed",
  "password changed": "The password was changed",
  "codes on": "One-time codes were turned on",
  "codes off": "One-time codes were turned off",
  "codes reset": "One-time codes were reset",
  "recovery codes made": "New recovery codes were made",
  "recovery code used": "A recovery code was used",
} as const;
export type AccountMail = keyof typeof ACCOUNT_MAIL_WORDS;

/** Whether a kind of mail is about an account. */
export const isAccountMail = (kind: string): kind is AccountMail => Object.hasOwn(ACCOUNT_MAIL_WORDS, kind);

const HOUR = 3600e3;
/** How long each link works, ms. */
export const TOKEN_LIFETIME: Record<TokenPurpose, number> = {
  invitation: 7 * 24 * HOUR,
  "password reset": HOUR,
  "address change": 24 * HOUR,
};

/** The same in words. */
export const TOKEN_LIFETIME_WORDS: Record<TokenPurpose, string> = {
  invitation: "seven days",
  "password reset": "one hour",
  "address change": "one day",
};
