import { z } from "zod";

/** What a form asks for where the last proof of who sends it is older than ten minutes; null where it is not. */
export type ProofAsked = "password" | "password and code" | null;

/** The fields in which it is given. */
export const proofFields = {
  proof: z.string().max(1000).default(""),
  proofCode: z.string().max(100).default(""),
};
export type Proof = z.output<z.ZodObject<typeof proofFields>>;

/** What is wrong in one of them, as a sentence. */
export interface ProofFault {
  field: keyof Proof;
  sentence: string;
}
