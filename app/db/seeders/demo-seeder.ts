import type { EntityManager } from "@mikro-orm/postgresql";
import { Seeder } from "@mikro-orm/seeder";
import { noteScope } from "#app/server/audit.server.ts";
import { loadDemo } from "./load-demo.ts";

/** The demo on a database of its own, before anybody is there: its people sign in. */
export class DemoSeeder extends Seeder {
  override async run(em: EntityManager): Promise<void> {
    noteScope(em, { personId: null, requestId: "demo data" });
    await loadDemo(em, { signIn: true });
  }
}
