import type { Vec3 } from "../types";
import { add, scale, vec } from "../vectors";
import { defineFamily, dimension, HEM_HEIGHT_M, HEM_LOOP_M } from "./family";

const CELLS = 6;

/** Sine of the angle by which each half is folded down from the ridge so that its corner meets the ground. */
function foldSine(sideM: number, frontHeightM: number): number {
  const diagonal = sideM * Math.SQRT2;
  const rise = frontHeightM - HEM_HEIGHT_M;
  return rise / Math.sqrt(diagonal * diagonal - rise * rise);
}

/** Folds the flat square along its diagonal: p along the ridge from its middle towards the front, q across, m. */
function foldMap(sideM: number, frontHeightM: number): (p: number, q: number) => Vec3 {
  const sinFold = foldSine(sideM, frontHeightM);
  const cosFold = Math.sqrt(1 - sinFold * sinFold);
  const sinRise = (frontHeightM - HEM_HEIGHT_M) / (sideM * Math.SQRT2);
  const cosRise = Math.sqrt(1 - sinRise * sinRise);
  const middle = vec(0, 0, (frontHeightM + HEM_HEIGHT_M) / 2);
  const ridge = vec(0, cosRise, sinRise);
  const down = vec(0, sinRise, -cosRise);
  return (p, q) => add(add(middle, scale(ridge, p)), add(vec(q * cosFold, 0, 0), scale(down, Math.abs(q) * sinFold)));
}

export const DIAMOND = defineFamily({
  definition: {
    kind: "diamond",
    name: "Diamond tarp",
    description: "A square tarp pitched cornerwise: one corner high on a pole or tree, the other three to the ground.",
    dimensions: [
      dimension("sideM", "Side of the square tarp", 3, 2, 4.5),
      dimension("frontHeightM", "Height of the raised corner", 1.5, 0.7, 2.2, true),
    ],
    typicalSleeps: 2,
    typicalMassKg: 0.7,
    form: "open",
    support: "trees-or-poles",
  },
  fabric: "nylon-light",
  lineDiameterMm: 3,
  heightM: (d) => d.frontHeightM,
  check: (d) =>
    d.frontHeightM > 0.75 * d.sideM
      ? [
          {
            field: "dimensions.frontHeightM",
            message: "The tarp is too small for this height: lower the raised corner.",
          },
        ]
      : [],
  build: (d, mesh) => {
    const fold = foldMap(d.sideM, d.frontHeightM);
    const half = (d.sideM * Math.SQRT2) / 2;
    const at = (u: number, v: number) => fold((u + v - 1) * half, (u - v) * half);
    const cells = CELLS * mesh.refinement;
    for (let i = 0; i < cells; i += 1) {
      for (let j = 0; j < cells; j += 1) {
        const corner = (di: number, dj: number) => mesh.node(at((i + di) / cells, (j + dj) / cells));
        if (i === j) {
          mesh.panel("right", [corner(0, 0), corner(1, 0), corner(1, 1)]);
          mesh.panel("left", [corner(0, 0), corner(1, 1), corner(0, 1)]);
        } else {
          mesh.panel(i > j ? "right" : "left", [corner(0, 0), corner(1, 0), corner(1, 1), corner(0, 1)]);
        }
      }
    }
    const front = at(1, 1);
    const rear = at(0, 0);
    const head = mesh.node(front);
    mesh.pole("pole-front", "Pole, front", head, vec(0, front.y, 0));
    mesh.tieOut({
      id: "ridge-front",
      name: "Ridge end, front",
      kind: "ridge-end",
      node: head,
      towards: { x: 0, y: 1 },
      typical: { angleDeg: 40 },
    });
    mesh.tieOut({
      id: "ridge-rear",
      name: "Ridge end, rear",
      kind: "ridge-end",
      node: mesh.node(rear),
      towards: { x: 0, y: -1 },
      typical: { lengthM: HEM_LOOP_M },
    });
    const outline: Vec3[] = [front];
    for (const [side, direction, corner, edge] of [
      ["right", 1, at(1, 0), at(0.5, 0)],
      ["left", -1, at(0, 1), at(0, 0.5)],
    ] as const) {
      mesh.tieOut({
        id: `corner-${side}`,
        name: `Corner, ${side}`,
        kind: "corner",
        node: mesh.node(corner),
        towards: { x: direction, y: 0.15 },
        typical: { lengthM: HEM_LOOP_M },
      });
      mesh.tieOut({
        id: `hem-rear-${side}`,
        name: `Hem, rear ${side}`,
        kind: "hem",
        node: mesh.node(edge),
        towards: { x: direction, y: -1 },
        typical: { lengthM: HEM_LOOP_M },
      });
    }
    outline.push(at(1, 0), rear, at(0, 1));
    const middleY = front.y - 1.35 - 0.12 * d.sideM;
    return {
      outline,
      hasSlopingRidge: true,
      sleepingPlaces: [-1, 1].map((side) => ({ centre: vec(side * 0.34, middleY, 0), bearingDeg: 0 })),
    };
  },
});
