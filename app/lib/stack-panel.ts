import { panelRequest, type StackDraft } from "./stack-draft.ts";
import type { EstimateRequest } from "#app/schemas/estimate.ts";
import type { Estimated } from "./stack-words.ts";

/** What a stack's panel shows: the stack at 25 °C, and at another temperature where one was asked for. */
export interface StackPanel {
  room: Estimated;
  hot: Estimated | null;
}

/** The requests that a panel is made of. */
export interface PanelRequests {
  room: EstimateRequest;
  hot: EstimateRequest | null;
}

/** What to ask for a stack as it is typed; null while something is missing. `temperature`, K, null for 25 °C alone. */
export function panelRequests({ request, silicon }: StackDraft, temperature: number | null): PanelRequests | null {
  if (!request || !silicon) return null;
  const boughtThickness = silicon.thickness;
  return {
    room: panelRequest(request, { boughtThickness, temperature: null }),
    hot: temperature === null ? null : panelRequest(request, { boughtThickness, temperature }),
  };
}

/** The same text for the same requests, to tell whether a panel is of what is typed. */
export const panelKey = ({ room, hot }: PanelRequests) => JSON.stringify({ room, hot });
