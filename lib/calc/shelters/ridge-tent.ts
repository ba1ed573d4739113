import { mix, vec } from "../vectors";
import { defineFamily, dimension, HEM_HEIGHT_M, HEM_LOOP_M, placesSideBySide, rectangle } from "./family";

export const RIDGE_TENT = defineFamily({
  definition: {
    kind: "ridge-tent",
    name: "Ridge tent",
    description: "A closed tent over two upright poles, guyed at both ridge ends and at the middle of each side.",
    dimensions: [
      dimension("lengthM", "Length along the ridge", 2.2, 1.9, 3.5),
      dimension("widthM", "Width at the ground", 1.5, 1.1, 2.6),
      dimension("heightM", "Height of the ridge", 1.15, 0.8, 2, true),
    ],
    typicalSleeps: 2,
    typicalMassKg: 2.4,
    form: "closed",
    support: "poles",
  },
  fabric: "polyester-light",
  lineDiameterMm: 3,
  heightM: (d) => d.heightM,
  check: (d) =>
    d.heightM > 1.3 * d.widthM
      ? [{ field: "dimensions.heightM", message: "The ridge is too high for this width." }]
      : [],
  build: (d, mesh) => {
    const x = d.widthM / 2;
    const y = d.lengthM / 2;
    const ridge = (v: number) => vec(0, y * (1 - 2 * v), d.heightM);
    for (const [side, direction] of [
      ["right", 1],
      ["left", -1],
    ] as const) {
      const hem = (v: number) => vec(direction * x, y * (1 - 2 * v), HEM_HEIGHT_M);
      mesh.surface(side, 4, 6, (u, v) => mix(ridge(v), hem(v), u));
      mesh.tieOut({
        id: `pull-out-${side}`,
        name: `Pull-out, ${side}`,
        kind: "side-pull-out",
        node: mesh.node(mix(ridge(0.5), hem(0.5), 0.5)),
        towards: { x: direction, y: 0 },
        typical: { angleDeg: 38 },
      });
      for (const [place, share] of [
        ["front", 1 / 3],
        ["rear", 2 / 3],
      ] as const) {
        mesh.tieOut({
          id: `hem-${side}-${place}`,
          name: `Hem, ${side} ${place}`,
          kind: "hem",
          node: mesh.node(hem(share)),
          towards: { x: direction, y: 0 },
          typical: { lengthM: HEM_LOOP_M },
        });
      }
    }
    for (const [end, sign] of [
      ["front", 1],
      ["rear", -1],
    ] as const) {
      const top = vec(0, sign * y, d.heightM);
      const base = (u: number) => vec(x * (2 * u - 1), sign * y, HEM_HEIGHT_M);
      mesh.surface(end, 2, 4, (u, v) => mix(top, base(u), v));
      const head = mesh.node(top);
      mesh.pole(`pole-${end}`, `Pole, ${end}`, head, vec(0, sign * y, 0));
      mesh.tieOut({
        id: `ridge-${end}`,
        name: `Ridge end, ${end}`,
        kind: "ridge-end",
        node: head,
        towards: { x: 0, y: sign },
        typical: { angleDeg: 40 },
      });
      mesh.tieOut({
        id: `hem-${end}`,
        name: `Hem, ${end} middle`,
        kind: "hem",
        node: mesh.node(base(0.5)),
        towards: { x: 0, y: sign },
        typical: { lengthM: HEM_LOOP_M },
      });
      for (const [side, direction] of [
        ["right", 1],
        ["left", -1],
      ] as const) {
        mesh.tieOut({
          id: `corner-${end}-${side}`,
          name: `Corner, ${end} ${side}`,
          kind: "corner",
          node: mesh.node(vec(direction * x, sign * y, HEM_HEIGHT_M)),
          towards: { x: direction, y: sign },
          typical: { lengthM: HEM_LOOP_M },
        });
      }
    }
    return {
      outline: rectangle(x, y, HEM_HEIGHT_M),
      sleepingPlaces: placesSideBySide({ x: 0, y: 0 }, 2 * x - 0.1, 0, 2),
    };
  },
});
