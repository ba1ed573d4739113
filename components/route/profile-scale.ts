import { stationAtM } from "@/lib/calc/route/profile";
import type { Profile } from "@/lib/calc/route/types";

export const PROFILE_HEIGHT = 260;
const TOP = 56;
const BOTTOM = 28;
const LEFT = 46;
const RIGHT = 14;

/** Round steps of an axis: 1, 2 or 5 times a power of ten, about so many of them. */
export function niceStep(span: number, count: number): number {
  const rough = Math.max(span, 1e-9) / count;
  const power = 10 ** Math.floor(Math.log10(rough));
  const factor = [1, 2, 5, 10].find((one) => one * power >= rough) ?? 10;
  return factor * power;
}

export interface ProfileScale {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly floor: number;
  readonly xOf: (atM: number) => number;
  readonly atOf: (x: number) => number;
  readonly yOf: (heightM: number) => number;
  /** In the unit of length that is shown. */
  readonly heightTicks: readonly { readonly label: string; readonly y: number }[];
  readonly distanceTicks: readonly { readonly label: string; readonly x: number }[];
}

/** Where places and heights are drawn. @param shortM, longM metres in the units shown (m or ft, km or mi) */
export function scaleProfile(profile: Profile, width: number, shortM: number, longM: number): ProfileScale {
  const known = profile.heightsM.filter((height) => height !== null);
  const low = known.length > 0 ? Math.min(...known) / shortM : 0;
  const high = known.length > 0 ? Math.max(...known) / shortM : 1;
  const step = niceStep(Math.max(high - low, 20), 3);
  const from = Math.floor(low / step) * step;
  const to = Math.max(from + step, Math.ceil(high / step) * step);
  const floor = PROFILE_HEIGHT - BOTTOM;
  const span = Math.max(width - LEFT - RIGHT, 10);
  const xOf = (atM: number) => LEFT + (atM / profile.lengthM) * span;
  const yIn = (value: number) => floor - ((value - from) / (to - from)) * (floor - TOP);
  const longStep = niceStep(profile.lengthM / longM, Math.max(2, width / 110));
  const count = Math.floor(profile.lengthM / longM / longStep + 1e-9);
  return {
    left: LEFT,
    right: width - RIGHT,
    top: TOP,
    floor,
    xOf,
    atOf: (x) => Math.min(profile.lengthM, Math.max(0, ((x - LEFT) / span) * profile.lengthM)),
    yOf: (heightM) => yIn(heightM / shortM),
    heightTicks:
      known.length === 0
        ? []
        : Array.from({ length: Math.round((to - from) / step) + 1 }, (_, index) => {
            const value = from + index * step;
            return { label: String(Math.round(value)), y: yIn(value) };
          }),
    distanceTicks: Array.from({ length: count + 1 }, (_, index) => ({
      label: String(Number((index * longStep).toFixed(2))),
      x: xOf(index * longStep * longM),
    })),
  };
}

/** The way's outline as pieces with heights: about a point for each pixel. */
export function outlineProfile(profile: Profile, scale: ProfileScale): readonly string[] {
  const every = Math.max(1, Math.floor(profile.heightsM.length / (scale.right - scale.left)));
  const last = profile.heightsM.length - 1;
  const paths: string[] = [];
  let points: string[] = [];
  const close = () => {
    if (points.length > 1) paths.push(`M${points.join("L")}`);
    points = [];
  };
  profile.heightsM.forEach((height, index) => {
    if (height === null) close();
    else if (index % every === 0 || index === last) {
      points.push(`${scale.xOf(stationAtM(profile, index)).toFixed(1)} ${scale.yOf(height).toFixed(1)}`);
    }
  });
  close();
  return paths;
}
