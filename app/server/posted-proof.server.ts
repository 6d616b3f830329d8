import { z } from "zod";
import { proofFields, type Proof } from "#app/schemas/proof.ts";

const schema = z.object(proofFields);

/** What a form brings to prove who sends it; what is too long to be true is none. */
export function postedProof(formData: FormData): Proof {
  const parsed = schema.safeParse(Object.fromEntries(formData));
  return parsed.success ? parsed.data : { proof: "", proofCode: "" };
}
