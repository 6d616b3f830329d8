import type { z } from "zod";
import type { ApiScope } from "#app/schemas/api-token.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

/** What an operation is handed: everything has passed its schemas. */
export interface Asked<Params, Query, Body> {
  scope: ActorScope;
  params: Params;
  query: Query;
  body: Body;
  /** the request itself, for what comes as a file */
  request: Request;
}

/** What an operation gives back beside a plain body with 200, or 201 for one that makes something. */
export interface Given<Answer> {
  answer: Answer;
  status?: 200 | 201 | 202;
  headers?: Record<string, string>;
}

/**
 * One operation of the API. The document is made from it and the request is held against it, so the two cannot differ.
 */
export interface Operation<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Answer extends z.ZodType = z.ZodType,
> {
  id: string;
  method: "GET" | "POST" | "PUT";
  /** below /api/v1, parameters in braces */
  path: string;
  scope: ApiScope;
  group: string;
  summary: string;
  params?: Params;
  query?: Query;
  /** of JSON */
  body?: Body;
  /** fields of multipart/form-data, for the document; the operation reads the request itself */
  form?: z.ZodType;
  answer: Answer;
  /** other statuses with the same or another body */
  otherAnswers?: Partial<Record<201 | 202, z.ZodType>>;
  /** what it answers with when all is well */
  status?: 200 | 201;
  /** what exists already, as it is now: where given, a change asks for `If-Match` */
  present?: (asked: Pick<Asked<z.output<Params>, unknown, unknown>, "scope" | "params">) => Promise<unknown>;
  handle: (
    asked: Asked<z.output<Params>, z.output<Query>, z.output<Body>>,
  ) => Promise<Given<z.input<Answer>> | Response>;
}

/** An operation with its types joined: what its handler is handed and gives back follows from its schemas. */
export function operation<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Answer extends z.ZodType,
>(described: Operation<Params, Query, Body, Answer>): Operation {
  return described as unknown as Operation;
}
