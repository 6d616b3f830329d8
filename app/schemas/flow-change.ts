import { z } from "zod";
import { HOLDINGS } from "#app/engine/vocabulary.ts";
import { FILM_QUANTITIES, type FlowChange } from "#app/engine/trial/change.ts";
import { RULES } from "./ranges.ts";

const within = ({ range }: (typeof RULES)[keyof typeof RULES]) => z.number().min(range.least).max(range.most);
const step = z.number().int().min(1).max(300);
const film = z.number().int().min(0).max(19);

const [thickness, stress, onTheBack] = FILM_QUANTITIES;

const change = z.discriminatedUnion("quantity", [
  z.object({ quantity: z.literal("silicon after"), step, value: within(RULES.siliconThickness) }),
  z.object({ quantity: z.literal("peak temperature"), step, value: within(RULES.temperature) }),
  z.object({ quantity: z.literal("bond thickness"), step, value: within(RULES.bondThickness) }),
  z.object({ quantity: z.literal("trim depth"), step, value: within(RULES.trimDepth) }),
  z.object({ quantity: z.literal(thickness), step, film, value: within(RULES.filmThickness) }),
  z.object({ quantity: z.literal(stress), step, film, value: within(RULES.stress) }),
  z.object({ quantity: z.literal(onTheBack), step, film, value: within(RULES.filmThickness) }),
  z.object({
    quantity: z.literal("bond"),
    step,
    carrier: z.uuid(),
    material: z.uuid(),
    thickness: within(RULES.bondThickness),
  }),
  z.object({ quantity: z.literal("tool"), step, tool: z.uuid() }),
  z.object({ quantity: z.literal("support"), step, holding: z.enum(HOLDINGS) }),
  z.object({ quantity: z.literal("frame"), step, tool: z.uuid() }),
  z.object({ quantity: z.literal("place"), step, to: step }),
]);

const changes = z.array(change).min(1).max(2);

/** The changes that 'Try on a copy' posts; null for anything that no page of ours sends. */
export function readFlowChanges(posted: FormDataEntryValue | null): FlowChange[] | null {
  if (typeof posted !== "string") return null;
  try {
    const read = changes.safeParse(JSON.parse(posted));
    return read.success ? read.data : null;
  } catch {
    return null;
  }
}
