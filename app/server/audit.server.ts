import {
  ChangeSetType,
  type EntityManager,
  type EntityMetadata,
  type EventSubscriber,
  type FlushEventArgs,
} from "@mikro-orm/core";
import { randomUUID } from "node:crypto";
import { AuditEvent } from "#app/db/entities/audit-event.ts";

interface AuditScope {
  personId: string | null;
  requestId: string;
}

const scopes = new WeakMap<object, AuditScope>();

/** Tells the audit trail who is behind the changes that this manager will flush. */
export function noteScope(em: EntityManager, scope: AuditScope): void {
  scopes.set(em, scope);
}

/** Records whose every change is noted, with the words for them. What is not listed leaves no trail of its own. */
const SUBJECTS: Record<string, string> = {
  Person: "person",
  Program: "program",
  Membership: "membership",
  Credential: "password",
  OneTimeCodes: "one-time codes",
  Film: "film",
  Silicon: "silicon",
  Carrier: "carrier",
  CarrierUnit: "carrier piece",
  BondingMaterial: "bonding material",
  Tape: "tape",
  Equipment: "equipment",
  SiteLimit: "limit",
  SiteSetting: "site setting",
  Stack: "stack",
  StackLayer: "stack layer",
  Flow: "flow",
  FlowStep: "flow step",
  FlowStepFilm: "flow step film",
  StepTemplate: "step template",
  FlowTemplate: "flow template",
  Assessment: "assessment",
  ImportProfile: "import profile",
  RepeatabilityStudy: "repeatability study",
  ReferenceWafer: "reference wafer",
  ReferenceReading: "reference reading",
  ScanFile: "scan file",
  Scan: "scan",
  ScanReading: "scan reading",
  FilmStressValue: "stress of a film",
  StepMeasurement: "bow after a step",
  Lot: "lot",
  Wafer: "wafer",
  WaferScan: "placed scan",
  WaferMeasurement: "wafer measurement",
  Sheet: "sheet",
  SheetRevision: "revision of a sheet",
  SheetComment: "comment in a review",
  Deviation: "deviation",
  SheetPrint: "print of a sheet",
  LotSheet: "sheet of a lot",
  FloorEntry: "entry of the floor",
  LotHold: "hold of a lot",
  StepStop: "stop of a step",
  HandOver: "hand-over",
  Delegation: "delegation",
  Incident: "incident",
  ApiToken: "API token",
  Webhook: "webhook",
  WebhookDelivery: "delivery of a webhook",
  IncidentNote: "note of an incident",
  IncidentPhoto: "photo of an incident",
};

/** Columns that say nothing to a reader, or that must not be copied. */
const LEFT_OUT = new Set([
  "id",
  "version",
  "createdAt",
  "updatedAt",
  "createdBy",
  "updatedBy",
  "passwordHash",
  "secretSealed",
  "recoveryHashes",
  "lastStep",
  "lastSignInAt",
  "token",
  "tokenHash",
  "lastUsedAt",
  "bytes",
  "content",
  "input",
  "result",
  "lots",
  "sealedSecret",
  "body",
  "failures",
  "failingSince",
  "lastSentAt",
]);

type Plain = Record<string, unknown>;

const idOf = (value: unknown): unknown =>
  typeof value === "object" && value !== null && "id" in value ? (value as { id: unknown }).id : value;

/** The program that a record belongs to; of what the site keeps of a program's scan, that of the scan. */
const programOf = (entity: Plain): unknown =>
  idOf(entity["program"]) ?? idOf((entity["scan"] as Plain | null | undefined)?.["program"]);

/**
 * Writes one audit event per changed field, in the same flush and so in the same transaction as the change: a change without
 * its event cannot be committed.
 */
export class AuditSubscriber implements EventSubscriber {
  async onFlush({ em, uow }: FlushEventArgs): Promise<void> {
    const scope = scopes.get(em);
    for (const change of [...uow.getChangeSets()]) {
      const subject = SUBJECTS[change.meta.className];
      if (!subject) continue;
      if (!scope) throw new Error(`A ${subject} was changed outside inScope.`);
      const entity = change.entity as Plain;
      const program = change.meta.className === "Program" ? entity["id"] : programOf(entity);
      const base = {
        at: new Date(),
        actorId: scope.personId,
        programId: (program as string | undefined) ?? null,
        subject,
        subjectId: entity["id"] as string,
        requestId: scope.requestId,
      };
      const write = (event: Plain) =>
        uow.computeChangeSet(
          em.create(AuditEvent, { id: randomUUID(), field: null, from: null, to: null, ...base, ...event } as never),
        );
      if (change.type === ChangeSetType.DELETE || change.type === ChangeSetType.DELETE_EARLY) {
        write({ action: "removed", from: summary(change.meta, change.originalEntity as Plain | undefined) });
        continue;
      }
      if (change.type === ChangeSetType.CREATE) {
        write({ action: "created", to: summary(change.meta, change.payload as Plain) });
        continue;
      }
      const before = (change.originalEntity ?? {}) as Plain;
      for (const [field, to] of Object.entries(change.payload as Plain))
        if (!LEFT_OUT.has(field))
          write({
            action: "changed",
            field,
            from: readable(change.meta, field, before[field]),
            to: readable(change.meta, field, to),
          });
        else if (field === "passwordHash") write({ action: "changed", field });
    }
  }
}

function summary(meta: EntityMetadata, record: Plain | undefined): Plain | null {
  if (!record) return null;
  const shown = Object.entries(record).filter(([field]) => !LEFT_OUT.has(field));
  return Object.fromEntries(shown.map(([field, value]) => [field, readable(meta, field, value)]));
}

/** A value as it stands in a change set: what goes into a JSON column is text there already. */
function readable(meta: EntityMetadata, field: string, value: unknown): unknown {
  const json = (meta.properties as Record<string, { type: string }>)[field]?.type === "JsonType";
  return json && typeof value === "string" ? JSON.parse(value) : (value ?? null);
}
