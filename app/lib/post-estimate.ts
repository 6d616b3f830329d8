import type { EstimateAnswer, EstimateFault, EstimateRequest } from "#app/schemas/estimate.ts";

const NOT_LOST = "nothing that you typed is lost";

/** Asks the server for an estimate. @throws Error with a sentence for the person who typed the request */
export async function postEstimate(request: EstimateRequest, signal: AbortSignal): Promise<EstimateAnswer> {
  const response = await fetch("/api/v1/estimates", {
    method: "POST",
    headers: { "Content-Type": "application/json" },
    body: JSON.stringify(request),
    signal,
  }).catch((error: unknown) => {
    if (signal.aborted) throw error;
    throw new Error(`The estimate did not come. Check the connection; ${NOT_LOST}.`);
  });
  if (response.ok) return response.json() as Promise<EstimateAnswer>;
  throw new Error(await sentenceOf(response));
}

async function sentenceOf(response: Response): Promise<string> {
  if (response.status === 401) return `You are signed out. Sign in again in another tab; ${NOT_LOST}.`;
  if (response.status === 403) return "Your role may not ask for estimates.";
  if (response.status !== 422) return `The server could not work it out just now; ${NOT_LOST}.`;
  const { errors = [] } = (await response.json()) as { errors?: EstimateFault[] };
  return `This stack cannot be estimated: ${errors[0]?.detail ?? "the engine refused it"}.`;
}
