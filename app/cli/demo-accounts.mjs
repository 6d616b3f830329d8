import { existsSync, readFileSync } from "node:fs";

/**
 * The demo accounts for printing, one a line: role, e-mail address and password in columns two blanks apart.
 *
 * @param {string} file what the demo data wrote when they were made
 * @returns {string[]} nothing when there are none
 */
export function demoAccountLines(file) {
  if (!existsSync(file)) return [];
  /** @type {{ role: string, email: string, password: string }[]} */
  const accounts = JSON.parse(readFileSync(file, "utf8"));
  const width = (/** @type {"role" | "email"} */ column) =>
    Math.max(...accounts.map((account) => account[column].length));
  return accounts.map(
    ({ role, email, password }) => `${role.padEnd(width("role"))}  ${email.padEnd(width("email"))}  ${password}`,
  );
}
