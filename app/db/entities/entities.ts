import { ApiAnswer } from "./api-answer.ts";
import { ApiRate } from "./api-rate.ts";
import { ApiToken } from "./api-token.ts";
import { Assessment } from "./assessment.ts";
import { AuditEvent } from "./audit-event.ts";
import { AuditSeal } from "./audit-seal.ts";
import { BondingMaterial } from "./bonding-material.ts";
import { Carrier } from "./carrier.ts";
import { CarrierUnit } from "./carrier-unit.ts";
import { Credential } from "./credential.ts";
import { Delegation } from "./delegation.ts";
import { DemoRecord } from "./demo-record.ts";
import { Equipment } from "./equipment.ts";
import { Favourite } from "./favourite.ts";
import { Film } from "./film.ts";
import { FilmStressInUse } from "./film-stress-in-use.ts";
import { FilmStressValue } from "./film-stress-value.ts";
import { Flow } from "./flow.ts";
import { FlowRevision } from "./flow-revision.ts";
import { FlowStep } from "./flow-step.ts";
import { FlowStepFilm } from "./flow-step-film.ts";
import { FlowTemplate } from "./flow-template.ts";
import { ImportProfile } from "./import-profile.ts";
import { Job } from "./job.ts";
import { Lot } from "./lot.ts";
import { MailChoice } from "./mail-choice.ts";
import { MailOutbox } from "./mail-outbox.ts";
import { Membership } from "./membership.ts";
import { Person } from "./person.ts";
import { OneTimeCodes } from "./one-time-codes.ts";
import { PersonToken } from "./person-token.ts";
import { Preference } from "./preference.ts";
import { Program } from "./program.ts";
import { RateLimit } from "./rate-limit.ts";
import { RecentVisit } from "./recent-visit.ts";
import { ReferenceReading } from "./reference-reading.ts";
import { ReferenceWafer } from "./reference-wafer.ts";
import { RepeatabilityStudy } from "./repeatability-study.ts";
import { SavedFilter } from "./saved-filter.ts";
import { Scan } from "./scan.ts";
import { ScanFile } from "./scan-file.ts";
import { ScanReading } from "./scan-reading.ts";
import { Session } from "./session.ts";
import { Silicon } from "./silicon.ts";
import { SiteLimit } from "./site-limit.ts";
import { SiteSetting } from "./site-setting.ts";
import { Stack } from "./stack.ts";
import { StackLayer } from "./stack-layer.ts";
import { StepMeasurement } from "./step-measurement.ts";
import { StepTemplate } from "./step-template.ts";
import { Tape } from "./tape.ts";
import { Wafer } from "./wafer.ts";
import { WaferMeasurement } from "./wafer-measurement.ts";
import { WaferScan } from "./wafer-scan.ts";
import { Sheet } from "./sheet.ts";
import { SheetRevision } from "./sheet-revision.ts";
import { SheetDocument } from "./sheet-document.ts";
import { SheetFile } from "./sheet-file.ts";
import { SheetComment } from "./sheet-comment.ts";
import { Deviation } from "./deviation.ts";
import { SheetPrint } from "./sheet-print.ts";
import { FloorEntry } from "./floor-entry.ts";
import { LotHold } from "./lot-hold.ts";
import { LotSheet } from "./lot-sheet.ts";
import { StepStop } from "./step-stop.ts";
import { Incident } from "./incident.ts";
import { IncidentNote } from "./incident-note.ts";
import { IncidentPhoto } from "./incident-photo.ts";
import { HandOver } from "./hand-over.ts";
import { Webhook } from "./webhook.ts";
import { WebhookDelivery } from "./webhook-delivery.ts";

/** Every entity, listed by hand: the ORM finds nothing by itself. */
export const entities = [
  Person,
  Credential,
  Session,
  Program,
  Membership,
  Film,
  Silicon,
  Carrier,
  CarrierUnit,
  BondingMaterial,
  Tape,
  Equipment,
  SiteLimit,
  SiteSetting,
  Stack,
  StackLayer,
  Flow,
  FlowStep,
  FlowStepFilm,
  FlowRevision,
  StepTemplate,
  FlowTemplate,
  ApiAnswer,
  ApiRate,
  ApiToken,
  Assessment,
  Sheet,
  SheetRevision,
  SheetDocument,
  SheetFile,
  SheetComment,
  Deviation,
  SheetPrint,
  Delegation,
  Incident,
  IncidentNote,
  IncidentPhoto,
  HandOver,
  ImportProfile,
  RepeatabilityStudy,
  ReferenceWafer,
  ReferenceReading,
  ScanFile,
  ScanReading,
  FilmStressValue,
  FilmStressInUse,
  StepMeasurement,
  Lot,
  Wafer,
  WaferScan,
  WaferMeasurement,
  LotSheet,
  FloorEntry,
  LotHold,
  StepStop,
  Scan,
  Job,
  RateLimit,
  RecentVisit,
  Favourite,
  SavedFilter,
  PersonToken,
  OneTimeCodes,
  Preference,
  MailOutbox,
  MailChoice,
  Webhook,
  WebhookDelivery,
  DemoRecord,
  AuditEvent,
  AuditSeal,
];
