import type { PlanIntent } from "@/lib/domain/plan/schema";
import type { PitchDetails } from "@/lib/domain/shelter/schema";
import type { PlanSaveResult } from "@/lib/domain/views";

/** The server answered, and said no. */
export class RefusedError extends Error {
  constructor(
    message: string,
    readonly status: number,
  ) {
    super(message);
  }
}

async function send<Answer>(url: string, method: "POST" | "PATCH", body: unknown): Promise<Answer> {
  const response = await fetch(url, {
    method,
    headers: { "content-type": "application/json" },
    body: JSON.stringify(body),
  });
  if (!response.ok) throw new RefusedError(await readReason(response), response.status);
  return (await response.json()) as Answer;
}

async function readReason(response: Response): Promise<string> {
  try {
    const { error } = (await response.json()) as { error?: { message?: string } };
    return error?.message ?? "The server could not take it.";
  } catch {
    return "The server could not take it.";
  }
}

export interface CampScope {
  readonly tripId: string;
  readonly campId: string;
}

const campUrl = ({ tripId, campId }: CampScope) => `/api/trips/${tripId}/camps/${campId}`;

export function postIntents(scope: CampScope, intents: readonly PlanIntent[]): Promise<PlanSaveResult> {
  return send(`${campUrl(scope)}/plan`, "POST", { intents });
}

export function patchPitch(
  scope: CampScope,
  pitchId: string,
  body: { readonly version: number; readonly details: PitchDetails },
): Promise<{ readonly version: number }> {
  return send(`${campUrl(scope)}/pitches/${pitchId}`, "PATCH", body);
}
