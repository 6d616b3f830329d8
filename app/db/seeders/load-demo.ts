import { randomUUID } from "node:crypto";
import { wrap } from "@mikro-orm/core";
import type { EntityManager } from "@mikro-orm/postgresql";
import { DEMO_TABLES, type DemoTable } from "#app/lib/demo-tables.ts";
import { DemoRecord } from "../entities/demo-record.ts";
import { Film } from "../entities/film.ts";
import { Membership } from "../entities/membership.ts";
import { Person } from "../entities/person.ts";
import { Program } from "../entities/program.ts";
import { DEMO_PEOPLE } from "./demo-accounts.ts";
import { addDemoAssessment } from "./demo-assessment.ts";
import { addDemoFlow } from "./demo-flow.ts";
import { DEMO_FLOWS } from "./demo-flows.ts";
import { addDemoInstrument } from "./demo-instrument.ts";
import { addDemoLibrary } from "./demo-library.ts";
import { addDemoLot } from "./demo-lot.ts";
import { addDemoScan } from "./demo-scan.ts";
import { addDemoStack, DEMO_STACKS } from "./demo-stacks.ts";
import { addDemoWafer } from "./demo-wafer.ts";
import { seedLibrary } from "./seed-library.ts";

const PROGRAMS = [
  { name: "Tern", slug: "tern", diameter: 0.2, purpose: "Fan-in device with one redistribution layer, to 100 µm" },
  { name: "Petrel", slug: "petrel", diameter: 0.3, purpose: "Thin sensor with back-side metal, to 50 µm on glass" },
  { name: "Fulmar", slug: "fulmar", diameter: 0.3, purpose: "Stacked device with through-silicon vias, to 20 µm" },
];

/**
 * The invented pilot line: people, library, three programs with their flows whole and a stack each, an assessment, scans with their
 * instrument and a lot. Everything is written down as the demo's. What has its names already is used as it is, and stays its maker's.
 * @param signIn whether its people are to sign in; else they are names, for what the demo says that they have done
 * @param also made before the rest, which row-level security lets only members write
 */
export async function loadDemo(
  em: EntityManager,
  { signIn, also }: { signIn: boolean; also?: (programs: Program[]) => Promise<void> },
): Promise<void> {
  const createdAt = new Date();
  const programs = PROGRAMS.map((program) => em.create(Program, { id: randomUUID(), createdAt, ...program }));
  const people = new Map((await em.findAll(Person)).map((person) => [person.email, person]));
  for (const { email, name, siteRole, programRole, programs: slugs } of DEMO_PEOPLE) {
    const added = { id: randomUUID(), email, name, siteRole: signIn ? siteRole : null, active: signIn, createdAt };
    const person = people.get(email) ?? em.create(Person, added);
    for (const program of programs.filter(({ slug }) => slugs.includes(slug)))
      em.create(Membership, { id: randomUUID(), person, program, role: programRole, createdAt });
  }
  await flushAsDemo(em);
  await also?.(programs);
  await addDemoLibrary(em);
  await flushAsDemo(em);

  const films = new Map((await em.findAll(Film)).map((film) => [film.name, film]));
  for (const stack of DEMO_STACKS) {
    const program = programs.find(({ slug }) => slug === stack.program);
    if (program) await addDemoStack(em, program, stack, films);
  }
  const library = await seedLibrary(em);
  for (const flow of DEMO_FLOWS) {
    const program = programs.find(({ slug }) => slug === flow.program);
    if (program) addDemoFlow(em, program, flow, library);
  }
  await flushAsDemo(em);

  // Read back as the server would read it, so that what is stored is what a person's own run would store.
  em.clear();
  const who = (account: string) => em.findOneOrFail(Person, { email: account });
  await addDemoAssessment(em, await who("engineer@kestrel-ridge.example"));
  await addDemoScan(em, await who("technician@kestrel-ridge.example"));
  await addDemoInstrument(em, await who("technician@kestrel-ridge.example"));
  await flushAsDemo(em);
  await addDemoWafer(em, await who("technician@kestrel-ridge.example"));
  await addDemoLot(em, await who("technician@kestrel-ridge.example"));
  await flushAsDemo(em);
}

const isDemoTable = (table: string): table is DemoTable => DEMO_TABLES.some((known) => known === table);

/** Flushes, and writes down what is new as the demo's. */
async function flushAsDemo(em: EntityManager): Promise<void> {
  const at = new Date();
  for (const made of [...em.getUnitOfWork().getPersistStack()] as { id: string }[]) {
    const kind = wrap(made, true).__meta.tableName;
    if (isDemoTable(kind)) em.create(DemoRecord, { id: made.id, kind, at });
  }
  await em.flush();
}
