import { z } from "zod";
import { Stack } from "#app/db/entities/stack.ts";
import { turnFront } from "#app/lib/stack-order.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { StackValues } from "#app/schemas/stack.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInSomeProgram } from "../../permission.server.ts";
import { programFilter } from "../../program-filter.server.ts";
import { findStacks, getStack, saveStack, type StackDetail } from "../../stacks.server.ts";
import { operation } from "../operation.server.ts";
import { keysetPage, pageOf, pageQuery } from "../paging.server.ts";
import { ApiRefused, refusedAt } from "../refused.server.ts";
import {
  id,
  idParam,
  moment,
  named,
  programQuery,
  programSlug,
  siliconJson,
  siliconUsed,
  stated,
  statedIn,
  statedOrNull,
} from "../shapes.ts";

const lines = z.object({ width_m: z.number(), direction_rad: z.number() });
const film = z.object({
  side: z.enum(["front", "back"]),
  film: named,
  thickness_m: statedIn("m"),
  own_stress_Pa: statedIn("Pa").nullable().describe("Of this stack alone; null takes the film’s."),
  stress_Pa: statedIn("Pa").describe("The one that counts, tension positive."),
  coverage: z.number().describe("Share of the area, 0 to 1."),
  lines: lines.nullable().describe("Of a film cut in lines; direction counter-clockwise from the notch axis."),
});
const stack = z.object({
  id,
  name: z.string(),
  note: z.string(),
  program: programSlug,
  silicon: siliconUsed,
  silicon_thickness_m: statedIn("m"),
  films: z.array(film).describe("Front first; of each side from the silicon outwards."),
  version: z.int(),
  updated_at: moment,
  updated_by: z.string(),
});

function stackJson(detail: StackDetail): z.input<typeof stack> {
  return {
    id: detail.id,
    name: detail.name,
    note: detail.note,
    program: detail.program.slug,
    silicon: siliconJson(detail.silicon),
    silicon_thickness_m: stated(detail.siliconThickness),
    films: detail.layers.map((layer) => ({
      side: layer.side,
      film: { id: layer.filmId, name: layer.filmName },
      thickness_m: stated(layer.thickness),
      own_stress_Pa: statedOrNull(layer.ownStress),
      stress_Pa: stated(layer.stress),
      coverage: layer.coverage,
      lines: layer.lines && { width_m: layer.lines.width, direction_rad: layer.lines.direction },
    })),
    version: detail.stamp.version,
    updated_at: detail.stamp.updatedAt,
    updated_by: detail.stamp.updatedBy,
  };
}

const within = ({ range }: { range: { least: number; most: number } }) => z.number().min(range.least).max(range.most);
const stressRange = within(RULES.stress);

const filmBody = z
  .strictObject({
    side: z.enum(["front", "back"]),
    film_id: id,
    thickness_m: within(RULES.filmThickness),
    thickness_tolerance_m: z.number().min(0).optional(),
    stress_Pa: stressRange.optional().describe("Of this stack alone, tension positive; left out takes the film’s."),
    stress_tolerance_Pa: z.number().min(0).optional(),
    coverage: within(RULES.coverage).optional(),
    lines: z.strictObject({ width_m: within(RULES.lineWidth), direction_rad: within(RULES.lineDirection) }).optional(),
  })
  .superRefine((sent, context) => {
    const fail = (key: string, message: string) => context.addIssue({ code: "custom", path: [key], message });
    if ((sent.thickness_tolerance_m ?? 0) >= sent.thickness_m)
      fail("thickness_tolerance_m", "is as large as the film itself");
    if (sent.stress_tolerance_Pa !== undefined && sent.stress_Pa === undefined)
      fail("stress_tolerance_Pa", "is of a stress_Pa that is not given");
  });
const stackBody = z
  .strictObject({
    name: z.string().trim().min(1).max(120),
    note: z.string().trim().max(1000).optional(),
    program: programSlug.max(80),
    silicon_id: id,
    silicon_thickness_m: within(RULES.siliconThickness),
    silicon_thickness_tolerance_m: z.number().min(0).optional(),
    films: z.array(filmBody).max(60).describe("Of each side from the silicon outwards."),
  })
  .superRefine((sent, context) => {
    if ((sent.silicon_thickness_tolerance_m ?? 0) >= sent.silicon_thickness_m)
      context.addIssue({
        code: "custom",
        path: ["silicon_thickness_tolerance_m"],
        message: "is as large as the silicon itself",
      });
  });
type StackBody = z.output<typeof stackBody>;

const measured = (value: number, tolerance: number | undefined) => ({
  value,
  tolerance: tolerance ?? null,
  source: "assumed" as const,
});

function valuesOf(body: StackBody, program: string): StackValues {
  const layers = body.films.map(
    ({ side, film_id, thickness_m, thickness_tolerance_m, stress_Pa, stress_tolerance_Pa, coverage, lines: cut }) => ({
      side,
      film: film_id,
      thickness: measured(thickness_m, thickness_tolerance_m),
      stress: stress_Pa === undefined ? null : measured(stress_Pa, stress_tolerance_Pa),
      coverage: coverage ?? 1,
      lines: cut ? { width: cut.width_m, direction: cut.direction_rad } : null,
    }),
  );
  return {
    name: body.name,
    note: body.note ?? "",
    program,
    silicon: body.silicon_id,
    siliconThickness: measured(body.silicon_thickness_m, body.silicon_thickness_tolerance_m),
    layers: turnFront(layers),
  };
}

/** The program that a body names. @throws ApiRefused at `/program` for one that is not there or not the person's own */
export function programNamed({ actor }: ActorScope, slug: string): string {
  const found = actor.memberships.find(({ programSlug: own }) => own === slug.toLowerCase());
  if (!found || !mayInProgram(actor, "see the work", found.programId))
    throw refusedAt("/program", `There is no program “${slug}”, or it is not yours.`);
  return found.programId;
}

async function save(scope: ActorScope, body: StackBody, at: { id: string; version: number } | null) {
  const program = programNamed(scope, body.program);
  const saved = await saveStack(scope, {
    id: at?.id ?? null,
    version: at?.version ?? null,
    values: valuesOf(body, program),
  });
  if (saved.outcome === "name taken") throw refusedAt("/name", "There is already a stack of that name in the program.");
  if (saved.outcome === "conflict")
    throw new ApiRefused(412, "The stack was changed after you had read it. Read it again.");
  return stackJson(await getStack(scope, saved.id));
}

const one = idParam("stack_id");

export const stackOperations = [
  operation({
    id: "listStacks",
    method: "GET",
    path: "/stacks",
    scope: "stacks:read",
    group: "Stacks",
    summary: "Stacks, the newest first",
    query: z.strictObject({ ...pageQuery, ...programQuery }),
    answer: pageOf(stack),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see the work");
      const { rows, next_cursor } = await inScope(scope, (em) =>
        keysetPage(
          em,
          Stack,
          { program: programFilter(scope.actor, "see the work", query.program) },
          "createdAt",
          query,
        ),
      );
      const found = await findStacks(
        scope,
        rows.map((row) => row.id),
      );
      return { answer: { data: found.map(stackJson), next_cursor } };
    },
  }),
  operation({
    id: "getStack",
    method: "GET",
    path: "/stacks/{stack_id}",
    scope: "stacks:read",
    group: "Stacks",
    summary: "One stack with its films",
    params: one,
    answer: stack,
    handle: async ({ scope, params }) => ({ answer: stackJson(await getStack(scope, params.stack_id)) }),
  }),
  operation({
    id: "createStack",
    method: "POST",
    path: "/stacks",
    scope: "stacks:write",
    group: "Stacks",
    summary: "Make a stack",
    body: stackBody,
    answer: stack,
    status: 201,
    handle: async ({ scope, body }) => {
      const answer = await save(scope, body, null);
      return { answer, status: 201, headers: { Location: `/api/v1/stacks/${answer.id}` } };
    },
  }),
  operation({
    id: "changeStack",
    method: "PUT",
    path: "/stacks/{stack_id}",
    scope: "stacks:write",
    group: "Stacks",
    summary: "Put another stack in the place of one. Its program stays",
    params: one,
    body: stackBody,
    answer: stack,
    present: async ({ scope, params }) => stackJson(await getStack(scope, params.stack_id)),
    handle: async ({ scope, params, body }) => {
      const { id: known, program, stamp } = await getStack(scope, params.stack_id);
      if (program.slug !== body.program.toLowerCase())
        throw refusedAt("/program", `The stack is of ${program.slug}, and stays there.`);
      return { answer: await save(scope, body, { id: known, version: stamp.version }) };
    },
  }),
];
