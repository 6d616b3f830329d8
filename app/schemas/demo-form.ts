import { z } from "zod";

const line = (most: number) => z.string().trim().max(most).default("");

export const demoFormSchema = z.object({
  intent: z.enum(["load", "remove"]),
  confirm: line(40),
  seen: line(100),
  name: line(80),
  diameter: z.enum(["150", "200", "300"]).default("300"),
});
export type DemoForm = z.infer<typeof demoFormSchema>;
