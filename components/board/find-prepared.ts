import type { PreparedCamp } from "@/lib/calc/prepare-camp";
import type { Spot } from "./plan-change";

export function findPrepared(prepared: PreparedCamp, spot: Spot) {
  const shelter = prepared.shelters.find((one) => one.pitch.pitchId === spot.pitchId);
  const tieOut = shelter?.tieOuts.find((one) => one.tieOut.id === spot.tieOutId);
  return shelter && tieOut ? { shelter, tieOut } : null;
}
