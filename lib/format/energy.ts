import { JOULES_PER_KILOCALORIE } from "@/lib/calc/route/energy";
import { formatFixed, withUnit } from "./numbers";

const toHundred = (value: number) => formatFixed(Math.round(value / 100) * 100);

/** "1400 to 1700 kcal": what the body spends, a range from the kinder to the harder ground. */
export function describeEnergy(energyJ: { readonly low: number; readonly high: number }): string {
  const low = toHundred(energyJ.low / JOULES_PER_KILOCALORIE);
  const high = toHundred(energyJ.high / JOULES_PER_KILOCALORIE);
  return withUnit(low === high ? `about ${high}` : `${low} to ${high}`, "kcal");
}

/** "2.4 to 4.7 l", "up to 3.5 l" where the air is cooler than the table begins with. */
export function describeWater(waterL: { readonly low: number | null; readonly high: number }): string {
  const high = formatFixed(waterL.high, 1);
  return withUnit(waterL.low === null ? `up to ${high}` : `${formatFixed(waterL.low, 1)} to ${high}`, "l");
}
