import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Seeder } from "@mikro-orm/seeder";
import { noteScope } from "#app/server/audit.server.ts";
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

/** The invented pilot line: people, library, three programs with their flows whole and a stack each, an assessment, scans with their
 * instrument and a lot. */
export class DemoSeeder extends Seeder {
  override async run(em: EntityManager): Promise<void> {
    noteScope(em, { personId: null, requestId: "demo data" });
    const createdAt = new Date();
    const programs = PROGRAMS.map((program) => em.create(Program, { id: randomUUID(), createdAt, ...program }));
    for (const { email, name, siteRole, programRole, programs: slugs } of DEMO_PEOPLE) {
      const person = em.create(Person, { id: randomUUID(), email, name, siteRole, active: true, createdAt });
      for (const program of programs.filter(({ slug }) => slugs.includes(slug)))
        em.create(Membership, { id: randomUUID(), person, program, role: programRole, createdAt });
    }
    addDemoLibrary(em);
    await em.flush();

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
    await em.flush();

    // Read back as the server would read it, so that what is stored is what a person's own run would store.
    em.clear();
    const who = (account: string) => em.findOneOrFail(Person, { email: account });
    await addDemoAssessment(em, await who("engineer@kestrel-ridge.example"));
    await addDemoScan(em, await who("technician@kestrel-ridge.example"));
    addDemoInstrument(em, await who("technician@kestrel-ridge.example"));
    await em.flush();
    await addDemoWafer(em, await who("technician@kestrel-ridge.example"));
    await addDemoLot(em, await who("technician@kestrel-ridge.example"));
    await em.flush();
  }
}
