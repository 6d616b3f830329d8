import { InitialSchema } from "./2026-12-01-initial-schema.ts";
import { RowLevelSecurity } from "./2026-12-01-row-level-security.ts";
import { AssessmentDocumentNumber } from "./2026-12-02-assessment-document-number.ts";
import { FlowHandling } from "./2026-12-03-flow-handling.ts";
import { FlowRevisionsAndTemplates } from "./2026-12-03-flow-revisions-and-templates.ts";
import { LibraryForRules } from "./2026-12-04-library-for-rules.ts";
import { AssessmentLot } from "./2026-12-05-assessment-lot.ts";
import { PhysicsInputs } from "./2026-12-05-physics-inputs.ts";
import { ImportProfiles } from "./2026-12-06-import-profiles.ts";
import { CarrierPieceVariation } from "./2026-12-06-carrier-piece-variation.ts";
import { DebondFace } from "./2026-12-06-debond-face.ts";
import { CarrierExpansionCurve } from "./2026-12-06-carrier-expansion-curve.ts";
import { FilmStress } from "./2026-12-07-film-stress.ts";
import { FilmLines } from "./2026-12-06-film-lines.ts";
import { Jobs } from "./2026-12-06-jobs.ts";
import { Tapes } from "./2026-12-06-tapes.ts";
import { StepMeasurements } from "./2026-12-07-step-measurements.ts";
import { Wafers } from "./2026-12-07-wafers.ts";
import { Instruments } from "./2026-12-07-instruments.ts";
import { FoundQuickly } from "./2026-12-08-found-quickly.ts";
import { DemoComesAndGoes } from "./2026-12-09-demo-comes-and-goes.ts";
import { Mail } from "./2026-12-10-mail.ts";
import { ReviewAndRelease } from "./2026-12-10-review-and-release.ts";
import { SiteSetting } from "./2026-12-11-site-setting.ts";
import { Delegations } from "./2026-12-12-delegations.ts";
import { LotsAndFloor } from "./2026-12-13-lots-and-floor.ts";
import { Incidents } from "./2026-12-14-incidents.ts";
import { ApiTokens } from "./2026-12-17-api-tokens.ts";
import { ApiAnswers } from "./2026-12-17-api-answers.ts";
import { HandOvers } from "./2026-12-15-hand-over.ts";
import { PrintRetention } from "./2026-12-18-print-retention.ts";
import { AuditSeal } from "./2026-12-19-audit-seal.ts";

/** Every migration in the order in which it runs. */
export const migrations = [
  { name: "2026-12-01-initial-schema", class: InitialSchema },
  { name: "2026-12-01-row-level-security", class: RowLevelSecurity },
  { name: "2026-12-02-assessment-document-number", class: AssessmentDocumentNumber },
  { name: "2026-12-03-flow-revisions-and-templates", class: FlowRevisionsAndTemplates },
  { name: "2026-12-03-flow-handling", class: FlowHandling },
  { name: "2026-12-04-library-for-rules", class: LibraryForRules },
  { name: "2026-12-05-assessment-lot", class: AssessmentLot },
  { name: "2026-12-05-physics-inputs", class: PhysicsInputs },
  { name: "2026-12-06-import-profiles", class: ImportProfiles },
  { name: "2026-12-06-carrier-piece-variation", class: CarrierPieceVariation },
  { name: "2026-12-06-debond-face", class: DebondFace },
  { name: "2026-12-06-film-lines", class: FilmLines },
  { name: "2026-12-06-carrier-expansion-curve", class: CarrierExpansionCurve },
  { name: "2026-12-06-tapes", class: Tapes },
  { name: "2026-12-06-jobs", class: Jobs },
  { name: "2026-12-07-film-stress", class: FilmStress },
  { name: "2026-12-07-wafers", class: Wafers },
  { name: "2026-12-07-instruments", class: Instruments },
  { name: "2026-12-07-step-measurements", class: StepMeasurements },
  { name: "2026-12-08-found-quickly", class: FoundQuickly },
  { name: "2026-12-09-demo-comes-and-goes", class: DemoComesAndGoes },
  { name: "2026-12-10-mail", class: Mail },
  { name: "2026-12-10-review-and-release", class: ReviewAndRelease },
  { name: "2026-12-11-site-setting", class: SiteSetting },
  { name: "2026-12-12-delegations", class: Delegations },
  { name: "2026-12-13-lots-and-floor", class: LotsAndFloor },
  { name: "2026-12-14-incidents", class: Incidents },
  { name: "2026-12-15-hand-over", class: HandOvers },
<<<<<<< HEAD
  { name: "2026-12-17-api-tokens", class: ApiTokens },
  { name: "2026-12-17-api-answers", class: ApiAnswers },
=======
  { name: "2026-12-18-print-retention", class: PrintRetention },
  { name: "2026-12-19-audit-seal", class: AuditSeal },
>>>>>>> main
];
