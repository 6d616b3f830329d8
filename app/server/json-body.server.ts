/** A body that was refused, with the status for it and the reason. */
export class JsonBodyRefused extends Error {
  constructor(
    readonly status: 400 | 413 | 415,
    reason: string,
  ) {
    super(reason);
  }
}

const IS_JSON = /^application\/json\s*(;.*)?$/i;

/**
 * A request's body as JSON, read no further than `most` bytes whatever its headers claim.
 * @throws JsonBodyRefused for another content type, a larger body, or text that is not JSON in UTF-8
 */
export async function readJsonBody(request: Request, most: number): Promise<unknown> {
  if (!IS_JSON.test(request.headers.get("Content-Type") ?? ""))
    throw new JsonBodyRefused(415, "Send application/json.");
  const tooLarge = () => new JsonBodyRefused(413, `A request may hold ${Math.floor(most / 1024)} kB.`);
  if (Number(request.headers.get("Content-Length") ?? 0) > most) throw tooLarge();
  const chunks: Uint8Array[] = [];
  let size = 0;
  for await (const chunk of request.body ?? []) {
    size += chunk.byteLength;
    if (size > most) throw tooLarge();
    chunks.push(chunk);
  }
  try {
    return JSON.parse(new TextDecoder("utf-8", { fatal: true }).decode(Buffer.concat(chunks)));
  } catch {
    throw new JsonBodyRefused(400, "The body is not JSON.");
  }
}
