import { mix, vec } from "../vectors";
import { defineFamily, dimension, placesSideBySide } from "./family";

/** Slope length from the ridge, drop to the hem, and the plan distance that remains, m. */
const halfPlanM = (widthM: number, dropM: number) => Math.sqrt(Math.max(0, (widthM * widthM) / 4 - dropM * dropM));

export const RIDGE_TARP = defineFamily({
  definition: {
    kind: "ridge-tarp",
    name: "Ridge tarp",
    description: "A flat tarp over a ridge between two poles or trees, both hems lined out. Open at both ends.",
    dimensions: [
      dimension("lengthM", "Length along the ridge", 3, 2, 5),
      dimension("widthM", "Width of the tarp across the ridge", 3, 2, 5),
      dimension("ridgeHeightM", "Height of the ridge", 1.2, 0.6, 2.2, true),
      dimension("hemHeightM", "Height of the hems", 0.2, 0.03, 1.2, true),
    ],
    typicalSleeps: 3,
    typicalMassKg: 0.75,
    form: "open",
    support: "trees-or-poles",
  },
  fabric: "nylon-light",
  lineDiameterMm: 3,
  heightM: (d) => d.ridgeHeightM,
  check: (d) => {
    const dropM = d.ridgeHeightM - d.hemHeightM;
    if (dropM < 0.15)
      return [{ field: "dimensions.hemHeightM", message: "Keep the hems at least 0.15 m below the ridge." }];
    if (dropM > 0.46 * d.widthM)
      return [
        {
          field: "dimensions.ridgeHeightM",
          message: "The tarp is too narrow for this ridge: lower it or raise the hems.",
        },
      ];
    return [];
  },
  build: (d, mesh) => {
    const y = d.lengthM / 2;
    const x = halfPlanM(d.widthM, d.ridgeHeightM - d.hemHeightM);
    const ridge = [vec(0, y, d.ridgeHeightM), vec(0, -y, d.ridgeHeightM)] as const;
    for (const [zone, side] of [
      ["right", 1],
      ["left", -1],
    ] as const) {
      const hem = [vec(side * x, y, d.hemHeightM), vec(side * x, -y, d.hemHeightM)] as const;
      mesh.surface(zone, 3, 6, (u, v) => mix(mix(ridge[0], ridge[1], v), mix(hem[0], hem[1], v), u));
    }
    for (const [end, sign] of [
      ["front", 1],
      ["rear", -1],
    ] as const) {
      const head = mesh.node(vec(0, sign * y, d.ridgeHeightM));
      mesh.pole(`pole-${end}`, `Pole, ${end}`, head, vec(0, sign * y, 0));
      mesh.tieOut({
        id: `ridge-${end}`,
        name: `Ridge end, ${end}`,
        kind: "ridge-end",
        node: head,
        towards: { x: 0, y: sign },
        typical: { angleDeg: 40 },
      });
      for (const [side, direction] of [
        ["right", 1],
        ["left", -1],
      ] as const) {
        mesh.tieOut({
          id: `corner-${end}-${side}`,
          name: `Corner, ${end} ${side}`,
          kind: "corner",
          node: mesh.node(vec(direction * x, sign * y, d.hemHeightM)),
          towards: { x: direction, y: sign * 0.7 },
          typical: { angleDeg: 32 },
        });
      }
    }
    for (const [side, direction] of [
      ["right", 1],
      ["left", -1],
    ] as const) {
      mesh.tieOut({
        id: `hem-${side}`,
        name: `Hem, ${side} middle`,
        kind: "hem",
        node: mesh.node(vec(direction * x, 0, d.hemHeightM)),
        towards: { x: direction, y: 0 },
        typical: { angleDeg: 32 },
      });
    }
    return {
      outline: [
        vec(0, y, d.ridgeHeightM),
        vec(x, y, d.hemHeightM),
        vec(x, -y, d.hemHeightM),
        vec(0, -y, d.ridgeHeightM),
        vec(-x, -y, d.hemHeightM),
        vec(-x, y, d.hemHeightM),
      ],
      sleepingPlaces: placesSideBySide({ x: 0, y: 0 }, 2 * x - 0.3, 0, 3),
    };
  },
});
