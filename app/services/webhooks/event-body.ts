import type { DeliveredEvent, WebhookEventName } from "#app/schemas/webhook.ts";

interface Sheet {
  revision_id: string;
  assessment_id: string;
  sheet: string;
  revision: string;
  flow: string;
}

/** What each event says of what it is about: ids and names. What people wrote about it, and every figure, is asked for by the API. */
export interface EventData {
  "sheet.released": Sheet;
  "sheet.superseded": Sheet & { superseded_by: string };
  "assessment.out_of_date": { assessment_id: string; assessment: string; flow: string };
  "incident.reported": {
    incident_id: string;
    incident: string;
    kind: string;
    severity: string;
    lot_id: string;
    lot: string;
    step: number;
    step_title: string;
  };
  "step.stopped": { stop_id: string; lot_id: string; lot: string; flow: string; step: number; step_title: string };
}

/** The program that an event is of, as bodies name it. */
export interface EventProgram {
  id: string;
  slug: string;
  name: string;
}

export interface EventBody {
  /** of what happened: the same to every webhook, and however often it is sent */
  id: string;
  event: DeliveredEvent;
  /** when it happened, ISO */
  at: string;
  program: EventProgram;
  data: EventData[WebhookEventName] | { webhook_id: string; webhook: string };
}

/** The body as it is signed and sent. */
export const eventBody = ({ id, event, at, program, data }: EventBody): string =>
  JSON.stringify({ id, event, at, program: { slug: program.slug, name: program.name }, data });
