import { MikroORM } from "@mikro-orm/postgresql";
import { z } from "zod";
import { databaseOptions } from "./options.ts";

/** Reads the audit trail again and compares it with its seals. Ends with 1 where the two do not agree. */
const { DATABASE_OWNER_URL } = z.object({ DATABASE_OWNER_URL: z.url() }).parse(process.env);

const write = (line: string) => void process.stdout.write(`${line}\n`);

interface Fault {
  chain: string;
  number: number | null;
  event_id: string;
  fault: string;
}

const orm = await MikroORM.init(databaseOptions(DATABASE_OWNER_URL));
try {
  const connection = orm.em.fork().getConnection();
  const chains = await connection.execute<{ chain: string; events: number; hash: string }[]>(
    `select coalesce(p.name, 'site') as chain, s.number as events, s.hash
       from (select distinct on (chain) chain, number, hash from audit_seal order by chain, number desc) s
       left join program p on p.id = s.chain order by 1`,
  );
  for (const { chain, events, hash } of chains) write(`${chain}: ${events} events sealed, newest hash ${hash}`);
  const faults = await connection.execute<Fault[]>(
    `select coalesce(p.name, 'site') as chain, f.number, f.event_id, f.fault from audit_faults() f left join program p on p.id = f.chain`,
  );
  for (const { chain, number, event_id, fault } of faults)
    write(`${chain}, ${number === null ? "no number" : `number ${number}`}, event ${event_id}: ${fault}`);
  write(
    faults.length === 0
      ? "Every event is as it was sealed, and none is missing."
      : `The trail does not agree with its seals in ${faults.length === 1 ? "one place" : `${faults.length} places`}.`,
  );
  process.exitCode = faults.length === 0 ? 0 : 1;
} finally {
  await orm.close();
}
