import { mix, vec } from "../vectors";
import { defineFamily, dimension, HEM_HEIGHT_M, HEM_LOOP_M, placesSideBySide } from "./family";

export const PONCHO_LEAN_TO = defineFamily({
  definition: {
    kind: "poncho-lean-to",
    name: "Lean-to from a poncho",
    description: "A poncho or small tarp: front edge on two poles or trees, rear edge pegged to the ground.",
    dimensions: [
      dimension("lengthM", "Length of the front edge", 2.3, 1.6, 3.5),
      dimension("depthM", "Depth of the fabric, front to rear", 1.6, 1.2, 3),
      dimension("frontHeightM", "Height of the front edge", 0.9, 0.4, 1.8, true),
    ],
    typicalSleeps: 1,
    typicalMassKg: 0.35,
    form: "open",
    support: "trees-or-poles",
  },
  fabric: "nylon-light",
  lineDiameterMm: 2.5,
  heightM: (d) => d.frontHeightM,
  check: (d) =>
    d.frontHeightM - HEM_HEIGHT_M > 0.9 * d.depthM
      ? [
          {
            field: "dimensions.frontHeightM",
            message: "The fabric is too short for this height: lower the front edge.",
          },
        ]
      : [],
  build: (d, mesh) => {
    const x = d.lengthM / 2;
    const dropM = d.frontHeightM - HEM_HEIGHT_M;
    const y = Math.sqrt(d.depthM * d.depthM - dropM * dropM) / 2;
    const front = [vec(-x, y, d.frontHeightM), vec(x, y, d.frontHeightM)] as const;
    const rear = [vec(-x, -y, HEM_HEIGHT_M), vec(x, -y, HEM_HEIGHT_M)] as const;
    mesh.surface("slope", 6, 5, (u, v) => mix(mix(front[0], front[1], u), mix(rear[0], rear[1], u), v));
    for (const [side, direction] of [
      ["right", 1],
      ["left", -1],
    ] as const) {
      const head = mesh.node(vec(direction * x, y, d.frontHeightM));
      mesh.pole(`pole-${side}`, `Pole, ${side}`, head, vec(direction * x, y, 0));
      mesh.tieOut({
        id: `guy-front-${side}`,
        name: `Guy, front ${side}`,
        kind: "guy",
        node: head,
        towards: { x: direction * 0.6, y: 1 },
        typical: { angleDeg: 42 },
      });
      mesh.tieOut({
        id: `hem-rear-${side}`,
        name: `Corner, rear ${side}`,
        kind: "corner",
        node: mesh.node(vec(direction * x, -y, HEM_HEIGHT_M)),
        towards: { x: direction * 0.6, y: -1 },
        typical: { lengthM: HEM_LOOP_M },
      });
    }
    mesh.tieOut({
      id: "hem-rear-middle",
      name: "Hem, rear middle",
      kind: "hem",
      node: mesh.node(vec(0, -y, HEM_HEIGHT_M)),
      towards: { x: 0, y: -1 },
      typical: { lengthM: HEM_LOOP_M },
    });
    return {
      outline: [front[1], rear[1], rear[0], front[0]],
      sleepingPlaces: placesSideBySide({ x: 0, y: y * 0.15 }, 2 * y - 0.3, 90, 1),
    };
  },
});
