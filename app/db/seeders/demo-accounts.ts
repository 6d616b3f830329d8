import { randomBytes, randomUUID } from "node:crypto";
import type { MikroORM } from "@mikro-orm/postgresql";
import { hash } from "@node-rs/argon2";
import { z } from "zod";
import type { ProgramRole, SiteRole } from "#app/policies/roles.ts";
import { noteScope } from "#app/server/audit.server.ts";
import { Credential } from "../entities/credential.ts";
import { Person } from "../entities/person.ts";

/** People of the invented pilot line, one per role and a second process owner. */
export interface DemoPerson {
  role: string;
  email: string;
  name: string;
  siteRole: SiteRole | null;
  programRole: ProgramRole;
  /** slugs of the programs that they belong to */
  programs: string[];
}

const ALL = ["tern", "petrel", "fulmar"];
const at = (account: string) => `${account}@kestrel-ridge.example`;

export const DEMO_PEOPLE: DemoPerson[] = [
  {
    role: "engineer",
    email: at("engineer"),
    name: "Ines Varga",
    siteRole: null,
    programRole: "engineer",
    programs: ALL,
  },
  {
    role: "technician",
    email: at("technician"),
    name: "Jude Okafor",
    siteRole: null,
    programRole: "technician",
    programs: ALL,
  },
  {
    role: "shift lead",
    email: at("shift-lead"),
    name: "Sanna Brandt",
    siteRole: "shift lead",
    programRole: "technician",
    programs: ALL,
  },
  {
    role: "process owner",
    email: at("process-owner"),
    name: "Mikael Lindqvist",
    siteRole: null,
    programRole: "process owner",
    programs: ALL,
  },
  {
    role: "process owner",
    email: at("second-process-owner"),
    name: "Ana Prado",
    siteRole: null,
    programRole: "process owner",
    programs: ALL,
  },
  {
    role: "administrator",
    email: at("administrator"),
    name: "Tomas Reyl",
    siteRole: "administrator",
    programRole: "guest",
    programs: ALL,
  },
  { role: "guest", email: at("guest"), name: "Lea Winter", siteRole: null, programRole: "guest", programs: ["tern"] },
];

export const demoAccountsSchema = z.array(z.object({ role: z.string(), email: z.string(), password: z.string() }));
export type DemoAccounts = z.infer<typeof demoAccountsSchema>;

/** A fresh random password for everybody. */
export function createDemoAccounts(): DemoAccounts {
  return DEMO_PEOPLE.map(({ role, email }) => ({ role, email, password: randomBytes(9).toString("base64url") }));
}

/** Sets every demo person's password to the one in the list. */
export async function setDemoPasswords(orm: MikroORM, accounts: DemoAccounts): Promise<void> {
  const em = orm.em.fork();
  noteScope(em, { personId: null, requestId: "demo accounts" });
  for (const { email, password } of accounts) {
    const person = await em.findOne(Person, { email });
    if (!person) continue;
    const passwordHash = await hash(password);
    const known = await em.findOne(Credential, { person });
    if (known) Object.assign(known, { passwordHash, changedAt: new Date() });
    else em.create(Credential, { id: randomUUID(), person, passwordHash, changedAt: new Date() });
  }
  await em.flush();
}
