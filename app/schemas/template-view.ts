import type { StepKind } from "#app/engine/flow/model.ts";
import type { Holding } from "#app/engine/vocabulary.ts";
import type { StepRow } from "#app/lib/flow-rows.ts";
import type { StepDetail } from "./flow-view.ts";
import type { RecordStamp } from "./record-stamp.ts";

/** A step of the library in a list. */
export interface StepTemplateRow {
  id: string;
  name: string;
  kind: StepKind;
  /** K */
  peakTemperature: number;
  planned: Holding;
  updatedAt: string;
}

/** A flow template in a list. */
export interface FlowTemplateRow {
  id: string;
  name: string;
  note: string;
  /** m */
  diameter: number;
  steps: number;
  updatedAt: string;
}

/** A step of the library, whole. */
export interface StepTemplateDetail {
  id: string;
  step: StepDetail;
  stamp: RecordStamp;
  mayEdit: boolean;
}

/** A flow template, as the table of its steps. */
export interface FlowTemplateDetail {
  id: string;
  name: string;
  note: string;
  diameter: number;
  rows: StepRow[];
  stamp: RecordStamp;
  mayEdit: boolean;
}

/** What the page shows that keeps a flow as a template. */
export interface KeepFlowPage {
  flow: { id: string; name: string; steps: number };
  /** name that a new template would get */
  newName: string;
  /** whose place the flow may take */
  templates: { id: string; name: string }[];
}
