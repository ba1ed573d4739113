import { mix, vec } from "../vectors";
import { defineFamily, dimension, HEM_HEIGHT_M, HEM_LOOP_M, placesSideBySide, rectangle } from "./family";

export const HALF_PYRAMID = defineFamily({
  definition: {
    kind: "half-pyramid",
    name: "Half pyramid",
    description: "Three faces from one pole at the front down to a pegged hem; the front is open.",
    dimensions: [
      dimension("widthM", "Width of the open front", 2.6, 1.6, 4),
      dimension("depthM", "Depth, front to rear", 2.2, 1.4, 3.5),
      dimension("heightM", "Height of the pole", 1.5, 0.9, 2.2, true),
    ],
    typicalSleeps: 3,
    typicalMassKg: 0.8,
    form: "open",
    support: "trees-or-poles",
  },
  fabric: "nylon-light",
  lineDiameterMm: 3,
  heightM: (d) => d.heightM,
  check: (d) =>
    d.heightM > 1.2 * d.widthM
      ? [{ field: "dimensions.heightM", message: "The pole is too tall for this width." }]
      : [],
  build: (d, mesh) => {
    const x = d.widthM / 2;
    const y = d.depthM / 2;
    const apex = vec(0, y, d.heightM);
    const corners = rectangle(x, y, HEM_HEIGHT_M);
    const [frontRight, rearRight, rearLeft, frontLeft] = corners;
    for (const [zone, from, to, columns] of [
      ["right", frontRight, rearRight, 4],
      ["rear", rearRight, rearLeft, 4],
      ["left", rearLeft, frontLeft, 4],
    ] as const) {
      mesh.surface(zone, columns, 4, (u, v) => mix(apex, mix(from, to, u), v));
    }
    const head = mesh.node(apex);
    mesh.pole("pole-front", "Pole, front", head, vec(0, y, 0));
    mesh.tieOut({
      id: "guy-front",
      name: "Guy, front",
      kind: "guy",
      node: head,
      towards: { x: 0, y: 1 },
      typical: { angleDeg: 42 },
    });
    for (const [id, name, kind, point, towards] of [
      ["corner-front-right", "Corner, front right", "corner", frontRight, { x: 1, y: 0.6 }],
      ["hem-right", "Hem, right middle", "hem", mix(frontRight, rearRight, 0.5), { x: 1, y: 0 }],
      ["corner-rear-right", "Corner, rear right", "corner", rearRight, { x: 1, y: -1 }],
      ["hem-rear", "Hem, rear middle", "hem", mix(rearRight, rearLeft, 0.5), { x: 0, y: -1 }],
      ["corner-rear-left", "Corner, rear left", "corner", rearLeft, { x: -1, y: -1 }],
      ["hem-left", "Hem, left middle", "hem", mix(rearLeft, frontLeft, 0.5), { x: -1, y: 0 }],
      ["corner-front-left", "Corner, front left", "corner", frontLeft, { x: -1, y: 0.6 }],
    ] as const) {
      mesh.tieOut({ id, name, kind, node: mesh.node(point), towards, typical: { lengthM: HEM_LOOP_M } });
    }
    return { outline: corners, sleepingPlaces: placesSideBySide({ x: 0, y: -0.05 * y }, 2 * y - 0.3, 90, 3) };
  },
});
