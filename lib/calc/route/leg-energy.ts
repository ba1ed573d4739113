import { stationAtM } from "./profile";
import type { Profile } from "./types";
import { toblerSpeedMs, walkedSlope } from "./walking-time";
import { walkingPowerW, type WalkerLoad } from "./energy";

export interface LegEnergy {
  readonly energyJ: number;
  /** Mean over the hours of walking. */
  readonly powerW: number;
}

/**
 * Energy of walking a piece of a profile in a given time, by Pandolf's and Santee's relations step by step. How the
 * time is shared between steps follows Tobler's function; its sum is the time given.
 * @param hours > 0 of walking, without breaks
 * @returns null where the piece has no heights, or no length
 */
export function legEnergy(
  profile: Profile,
  piece: { readonly fromM: number; readonly toM: number; readonly hours: number },
  load: WalkerLoad,
): LegEnergy | null {
  const steps = listSteps(profile, piece.fromM, piece.toM);
  if (!steps || steps.length === 0 || !(piece.hours > 0)) return null;
  const freeH = steps.reduce((sum, step) => sum + step.lengthM / toblerSpeedMs(step.slope) / 3600, 0);
  const slower = piece.hours / freeH;
  let energyJ = 0;
  for (const step of steps) {
    const speedMs = Math.min(3, toblerSpeedMs(step.slope) / slower);
    energyJ += walkingPowerW(load, speedMs, step.slope) * (step.lengthM / speedMs);
  }
  return { energyJ, powerW: energyJ / (piece.hours * 3600) };
}

function listSteps(profile: Profile, fromM: number, toM: number) {
  const steps: { lengthM: number; slope: number }[] = [];
  const first = Math.floor(fromM / profile.stepM);
  for (let index = first; index + 1 < profile.heightsM.length; index += 1) {
    const startM = stationAtM(profile, index);
    if (startM >= toM) break;
    const endM = stationAtM(profile, index + 1);
    const low = profile.heightsM[index] ?? null;
    const high = profile.heightsM[index + 1] ?? null;
    if (low === null || high === null) return null;
    const lengthM = Math.min(endM, toM) - Math.max(startM, fromM);
    if (lengthM > 0) steps.push({ lengthM, slope: walkedSlope((high - low) / (endM - startM)) });
  }
  return steps;
}
