import { mix, vec } from "../vectors";
import { defineFamily, dimension, placesSideBySide, rectangle } from "./family";

export const FLYING_TARP = defineFamily({
  definition: {
    kind: "flying-tarp",
    name: "Square flying tarp",
    description: "A flat roof on four corner poles or trees, one side lower to shed rain. Open all round.",
    dimensions: [
      dimension("lengthM", "Length, front to rear", 3, 2, 5),
      dimension("widthM", "Width", 3, 2, 5),
      dimension("frontHeightM", "Height of the front edge", 1.8, 0.8, 2.4, true),
      dimension("rearHeightM", "Height of the rear edge", 1.3, 0.5, 2.2, true),
    ],
    typicalSleeps: 4,
    typicalMassKg: 0.7,
    form: "open",
    support: "trees-or-poles",
  },
  fabric: "nylon-light",
  lineDiameterMm: 3,
  heightM: (d) => Math.max(d.frontHeightM, d.rearHeightM),
  check: (d) =>
    Math.abs(d.frontHeightM - d.rearHeightM) > 0.5 * d.lengthM
      ? [
          {
            field: "dimensions.rearHeightM",
            message: "A flying tarp is no steeper than 30°: bring front and rear closer in height.",
          },
        ]
      : [],
  build: (d, mesh) => {
    const x = d.widthM / 2;
    const riseM = d.frontHeightM - d.rearHeightM;
    const y = Math.sqrt(d.lengthM * d.lengthM - riseM * riseM) / 2;
    const front = [vec(-x, y, d.frontHeightM), vec(x, y, d.frontHeightM)] as const;
    const rear = [vec(-x, -y, d.rearHeightM), vec(x, -y, d.rearHeightM)] as const;
    mesh.surface("roof", 6, 6, (u, v) => mix(mix(front[0], front[1], u), mix(rear[0], rear[1], u), v));
    for (const [end, sign, heightM] of [
      ["front", 1, d.frontHeightM],
      ["rear", -1, d.rearHeightM],
    ] as const) {
      for (const [side, direction] of [
        ["right", 1],
        ["left", -1],
      ] as const) {
        const head = mesh.node(vec(direction * x, sign * y, heightM));
        mesh.pole(`pole-${end}-${side}`, `Pole, ${end} ${side}`, head, vec(direction * x, sign * y, 0));
        mesh.tieOut({
          id: `corner-${end}-${side}`,
          name: `Corner, ${end} ${side}`,
          kind: "corner",
          node: head,
          towards: { x: direction, y: sign },
          typical: { angleDeg: 42 },
        });
      }
    }
    for (const [side, direction] of [
      ["right", 1],
      ["left", -1],
    ] as const) {
      const node = mesh.node(vec(direction * x, 0, (d.frontHeightM + d.rearHeightM) / 2));
      mesh.tieOut({
        id: `hem-${side}`,
        name: `Hem, ${side} middle`,
        kind: "hem",
        node,
        towards: { x: direction, y: 0 },
        typical: { angleDeg: 45 },
      });
    }
    return {
      outline: rectangle(x, y, 0).map((corner) =>
        vec(corner.x, corner.y, corner.y > 0 ? d.frontHeightM : d.rearHeightM),
      ),
      sleepingPlaces: placesSideBySide({ x: 0, y: 0 }, 2 * x - 0.3, 0, 4),
    };
  },
});
