import type { EntityManager } from "@mikro-orm/postgresql";
import { WaferMeasurement } from "#app/db/entities/wafer-measurement.ts";
import type { StepMeasurementValues } from "#app/schemas/step-measurement-form.ts";
import type { SummaryChoice } from "#app/schemas/step-measurement.ts";
import type { WaferMeasurementContent } from "#app/schemas/wafer.ts";
import { isUuid } from "../uuid.server.ts";

/** A standard bow as it was measured, m. */
export interface MeasuredBow {
  lot: string;
  wafer: string;
  slot: number | null;
  bow: number;
  measuredAt: Date;
  /** row of a summary that it comes from */
  measurement: string | null;
}

interface Refused {
  outcome: "refused";
  field: "summary" | "gravity" | "sideUp" | "wafers";
  reasons: string[];
}

type Summary = Extract<WaferMeasurementContent, { kind: "summary" }>;

const bowOf = ({ figures }: Summary): number | null =>
  figures.find(({ quantity, value }) => quantity === "bow" && value !== null)?.value ?? null;

/** Rows of summaries of a program, or of one reading and lot, that have a bow. */
async function summaryRows(em: EntityManager, program: string, of?: { reading: string; lot: string | null }) {
  const rows = await em.find(
    WaferMeasurement,
    { program, kind: "summary", ...(of ? { reading: of.reading, wafer: { lot: of.lot } } : {}) },
    { populate: ["wafer.lot"], orderBy: { createdAt: "desc", id: "asc" } },
  );
  return rows.flatMap((row) => {
    const { content, wafer } = row;
    if (content.kind !== "summary") return [];
    const bow = bowOf(content);
    if (bow === null) return [];
    const measuredAt = row.measuredAt ?? row.createdAt;
    const lot = wafer.lot ?? null;
    return [{ id: row.id, reading: row.reading.id, lot, wafer, bow, measured: content.measured, measuredAt }];
  });
}

/** The summaries of a program that have bows, each lot of a file once, the newest first. */
export async function summaryChoices(em: EntityManager, program: string): Promise<SummaryChoice[]> {
  const choices = new Map<string, SummaryChoice>();
  for (const { reading, lot, measured, measuredAt } of await summaryRows(em, program)) {
    const value = `${reading}/${lot?.id ?? ""}`;
    const known = choices.get(value);
    if (known) known.wafers += 1;
    else
      choices.set(value, {
        value,
        lot: lot?.name ?? "no lot",
        wafers: 1,
        measuredOn: measuredAt.toISOString().slice(0, 10),
        known: measured !== null,
      });
  }
  return [...choices.values()];
}

/** The standard bows of a form: of the summary that it chooses, or those that it lists. */
export async function measuredBows(
  em: EntityManager,
  program: string,
  values: StepMeasurementValues,
): Promise<{ bows: MeasuredBow[] } | Refused> {
  if (!values.summary) {
    const how = howMeasured(values, null);
    if ("outcome" in how) return how;
    const measuredAt = values.measuredAt ?? new Date();
    const bows = values.wafers.map(({ slot, bow }) => ({
      lot: values.lot,
      wafer: `slot ${slot}`,
      slot,
      bow: how.sign * bow,
      measuredAt,
      measurement: null,
    }));
    return { bows };
  }
  const { reading, lot } = values.summary;
  const rows = isUuid(reading) && (!lot || isUuid(lot)) ? await summaryRows(em, program, { reading, lot }) : [];
  const [first] = rows;
  if (!first)
    return { outcome: "refused", field: "summary", reasons: ["That summary is not there any more. Choose another."] };
  const how = howMeasured(values, first.measured);
  if ("outcome" in how) return how;
  return {
    bows: rows.map((row) => ({
      lot: row.lot?.name ?? values.lot,
      wafer: row.wafer.name || `slot ${row.wafer.slot ?? "not known"}`,
      slot: row.wafer.slot ?? null,
      bow: how.sign * row.bow,
      measuredAt: values.measuredAt ?? row.measuredAt,
      measurement: row.id,
    })),
  };
}

/**
 * What makes a bow of an instrument the standard one: the sign that turns it device side up. What the file's own profile says goes
 * before the form. The assessment's bow has no weight in it, so one that does is refused.
 */
function howMeasured(
  { sideUp, gravity }: StepMeasurementValues,
  measured: Summary["measured"],
): { sign: 1 | -1 } | Refused {
  const up = measured?.sideUp ?? sideUp;
  const weight = measured?.gravity ?? gravity;
  if (up === null) return { outcome: "refused", field: "sideUp", reasons: ["Say which side was up."] };
  if (weight === null)
    return { outcome: "refused", field: "gravity", reasons: ["Say whether the weight is taken out."] };
  if (weight === "included")
    return {
      outcome: "refused",
      field: "gravity",
      reasons: ["The assessment’s bow has no weight in it. Only bows from which the weight is taken out are compared."],
    };
  return { sign: up === "back" ? -1 : 1 };
}
