import { mix, vec } from "../vectors";
import { defineFamily, dimension, HEM_HEIGHT_M, HEM_LOOP_M, placesSideBySide, rectangle } from "./family";

export const PYRAMID = defineFamily({
  definition: {
    kind: "pyramid",
    name: "Pyramid",
    description: "Four faces from one middle pole to a pegged hem, with a pull-out half-way up each face.",
    dimensions: [
      dimension("widthM", "Width of the base", 2.7, 1.8, 4.5),
      dimension("depthM", "Depth of the base", 2.7, 1.8, 4.5),
      dimension("heightM", "Height of the pole", 1.7, 1, 2.8, true),
    ],
    typicalSleeps: 4,
    typicalMassKg: 1.1,
    form: "closed",
    support: "poles",
  },
  fabric: "polyester-light",
  lineDiameterMm: 3,
  heightM: (d) => d.heightM,
  check: (d) =>
    d.heightM > 1.2 * Math.min(d.widthM, d.depthM)
      ? [{ field: "dimensions.heightM", message: "The pole is too tall for this base." }]
      : [],
  build: (d, mesh) => {
    const x = d.widthM / 2;
    const y = d.depthM / 2;
    const apex = vec(0, 0, d.heightM);
    const [frontRight, rearRight, rearLeft, frontLeft] = rectangle(x, y, HEM_HEIGHT_M);
    const head = mesh.node(apex);
    mesh.pole("pole", "Middle pole", head, vec(0, 0, 0));
    for (const [zone, from, to, towards] of [
      ["front", frontLeft, frontRight, { x: 0, y: 1 }],
      ["right", frontRight, rearRight, { x: 1, y: 0 }],
      ["rear", rearRight, rearLeft, { x: 0, y: -1 }],
      ["left", rearLeft, frontLeft, { x: -1, y: 0 }],
    ] as const) {
      mesh.surface(zone, 4, 4, (u, v) => mix(apex, mix(from, to, u), v));
      const middle = mix(from, to, 0.5);
      mesh.tieOut({
        id: `hem-${zone}`,
        name: `Hem, ${zone} middle`,
        kind: "hem",
        node: mesh.node(middle),
        towards,
        typical: { lengthM: HEM_LOOP_M },
      });
      mesh.tieOut({
        id: `pull-out-${zone}`,
        name: `Pull-out, ${zone}`,
        kind: "side-pull-out",
        node: mesh.node(mix(apex, middle, 0.5)),
        towards,
        typical: { angleDeg: 38 },
      });
    }
    for (const [place, point, towards] of [
      ["front right", frontRight, { x: 1, y: 1 }],
      ["rear right", rearRight, { x: 1, y: -1 }],
      ["rear left", rearLeft, { x: -1, y: -1 }],
      ["front left", frontLeft, { x: -1, y: 1 }],
    ] as const) {
      mesh.tieOut({
        id: `corner-${place.replace(" ", "-")}`,
        name: `Corner, ${place}`,
        kind: "corner",
        node: mesh.node(point),
        towards,
        typical: { lengthM: HEM_LOOP_M },
      });
    }
    const places = placesSideBySide({ x: 0, y: 0 }, 2 * x - 0.2, 0, 4);
    return { outline: [frontRight, rearRight, rearLeft, frontLeft], sleepingPlaces: places };
  },
});
