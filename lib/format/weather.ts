import type { Preferences } from "@/lib/domain/preferences";
import { formatFixed, withUnit } from "./numbers";

type LengthUnit = Preferences["lengthUnit"];

const MM_PER_INCH = 25.4;

/** Who measures in feet reads degrees Fahrenheit: "−3 °C", "27 °F". */
export function formatTemperature(celsius: number, unit: LengthUnit = "m"): string {
  return unit === "ft" ? withUnit(formatFixed(celsius * 1.8 + 32), "°F") : withUnit(formatFixed(celsius), "°C");
}

/** "none", "< 1 mm", "4 mm"; in inches for who measures in feet: "0.16 in". */
export function formatRain(millimetres: number, unit: LengthUnit = "m"): string {
  if (millimetres <= 0) return "none";
  if (unit === "ft") {
    const inches = millimetres / MM_PER_INCH;
    return inches < 0.01 ? withUnit("< 0.01", "in") : withUnit(formatFixed(inches, 2), "in");
  }
  return millimetres < 1 ? withUnit("< 1", "mm") : withUnit(formatFixed(millimetres), "mm");
}
