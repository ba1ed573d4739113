/** The invented way of the demo trip, as a file of a device would have it: it runs through the four camps and home again. */
import { BLANK_SETTINGS, type RouteSettings } from "@/lib/domain/route/schema";

interface Turn {
  readonly latitude: number;
  readonly longitude: number;
  readonly heightM: number;
}

const turn = (latitude: number, longitude: number, heightM: number): Turn => ({ latitude, longitude, heightM });

/** Where the way bends; camps are among them. */
const TURNS: readonly Turn[] = [
  turn(61.9054, 8.6802, 288),
  turn(61.9171, 8.6931, 305),
  turn(61.9312, 8.7215, 312),
  turn(61.9388, 8.7384, 418),
  turn(61.9523, 8.7402, 505),
  turn(61.9661, 8.7655, 446),
  turn(61.9742, 8.7966, 388),
  turn(61.9874, 8.8041, 364),
  turn(61.9953, 8.8277, 402),
  turn(62.0069, 8.8391, 540),
  turn(62.0173, 8.8702, 655),
  turn(62.0291, 8.8838, 610),
  turn(62.0362, 8.9051, 718),
  turn(62.0431, 8.9127, 742),
  turn(62.0377, 8.9283, 801),
  turn(62.0262, 8.9241, 690),
  turn(62.0128, 8.9098, 566),
  turn(62.0011, 8.9014, 478),
  turn(61.9926, 8.8893, 455),
  turn(61.9802, 8.8817, 512),
  turn(61.9667, 8.8602, 588),
  turn(61.9541, 8.8271, 497),
  turn(61.9433, 8.7869, 402),
  turn(61.9287, 8.7488, 331),
  turn(61.9171, 8.6931, 305),
  turn(61.9054, 8.6802, 288),
];

const PLACES: readonly (Turn & { readonly name: string })[] = [
  { ...turn(61.9054, 8.6802, 288), name: "Alder Bottom bridge" },
  { ...turn(61.9523, 8.7402, 505), name: "Third cairn" },
  { ...turn(62.0377, 8.9283, 801), name: "Skarn top" },
  { ...turn(61.9667, 8.8602, 588), name: "Low saddle" },
];

const STEPS = 40;

/** Between two bends: a way that winds a little, on ground that is a little uneven, alike at every start. */
function walk(from: Turn, to: Turn, leg: number): Turn[] {
  return Array.from({ length: STEPS }, (_, step) => {
    const share = step / STEPS;
    const bell = Math.sin(Math.PI * share);
    const swing = bell * Math.sin(share * 14 + leg * 1.7) * 0.0011;
    return {
      latitude: from.latitude + (to.latitude - from.latitude) * share + swing,
      longitude: from.longitude + (to.longitude - from.longitude) * share - swing * 1.3,
      heightM: from.heightM + (to.heightM - from.heightM) * share + bell * Math.sin(share * 9 + leg) * 9,
    };
  });
}

export const ROUTE_FILE_NAME = "skarn-edge-round.gpx";

export function writeDemoRoute(): string {
  const last = TURNS[TURNS.length - 1];
  const points = TURNS.slice(0, -1).flatMap((from, leg) => walk(from, TURNS[leg + 1] ?? from, leg));
  const at = ({ latitude, longitude }: Turn) => `lat="${latitude.toFixed(6)}" lon="${longitude.toFixed(6)}"`;
  const track = [...points, ...(last ? [last] : [])].map(
    (point) => `<trkpt ${at(point)}><ele>${point.heightM.toFixed(1)}</ele></trkpt>`,
  );
  const places = PLACES.map((place) => `<wpt ${at(place)}><ele>${place.heightM}</ele><name>${place.name}</name></wpt>`);
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    '<gpx version="1.1" creator="Leestead demo" xmlns="http://www.topografix.com/GPX/1/1">',
    "<metadata><name>Skarn Edge round</name></metadata>",
    ...places,
    `<trk><name>Skarn Edge round</name><trkseg>\n${track.join("\n")}\n</trkseg></trk>`,
    "</gpx>",
  ].join("\n");
}

export const WALKING: RouteSettings = {
  ...BLANK_SETTINGS,
  rule: "langmuir",
  paceRatio: 0.85,
  breakMinPerHour: 12,
  setOffMinute: 9 * 60 + 30,
  pitchingMin: 45,
  bodyKg: 72,
  packKg: 16,
  terrain: "rough",
  heat: "cool",
};
