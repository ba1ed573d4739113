import { mix, vec } from "../vectors";
import { defineFamily, dimension, HEM_HEIGHT_M, HEM_LOOP_M, placesSideBySide } from "./family";

const SEGMENTS = 8;
const ROWS = 4;
/** Bending stiffness EI of an aluminium tube of 11 mm by 0.9 mm: E 70 GPa × 370 mm⁴ = 26 N·m² (from its geometry). */
const HOOP_BENDING_NM2 = 26;

export const TUNNEL = defineFamily({
  definition: {
    kind: "tunnel",
    name: "Two-hoop tunnel",
    description: "Two bent poles across, a vault between them, ends drawn down to the ground; guyed from each hoop.",
    dimensions: [
      dimension("hoopSpacingM", "Distance between the hoops", 1.3, 0.8, 2.4),
      dimension("endTaperM", "Length of each tapering end", 0.8, 0.4, 1.4),
      dimension("widthM", "Width at the ground", 1.5, 1, 2.6),
      dimension("heightM", "Height of the hoops", 1.1, 0.8, 1.8),
    ],
    typicalSleeps: 2,
    typicalMassKg: 2.2,
    form: "closed",
    support: "hoops",
  },
  fabric: "polyester-light",
  lineDiameterMm: 3,
  heightM: (d) => d.heightM,
  check: (d) =>
    d.heightM > 1.2 * d.widthM
      ? [{ field: "dimensions.heightM", message: "The hoops are too high for this width." }]
      : [],
  build: (d, mesh) => {
    const x = d.widthM / 2;
    const y = d.hoopSpacingM / 2;
    // Half an ellipse, its feet a hem's height above the ground; u runs from the right foot to the left one.
    const arch = (u: number, atY: number) =>
      vec(x * Math.cos(Math.PI * u), atY, HEM_HEIGHT_M + (d.heightM - HEM_HEIGHT_M) * Math.sin(Math.PI * u));
    const endHem = (u: number, sign: number) =>
      vec(x * Math.cos(Math.PI * u), sign * (y + d.endTaperM * Math.sin(Math.PI * u)), HEM_HEIGHT_M);
    mesh.surface("vault", SEGMENTS, ROWS, (u, v) => arch(u, y * (1 - 2 * v)));
    const [rows, columns] = [ROWS * mesh.refinement, SEGMENTS * mesh.refinement];
    for (let row = 1; row < rows; row += 1) {
      const atY = y * (1 - (2 * row) / rows);
      mesh.floorStrip(mesh.node(arch(0, atY)), mesh.node(arch(1, atY)), d.hoopSpacingM / rows);
    }
    for (let column = 1; column < columns; column += 1) {
      const u = column / columns;
      mesh.floorStrip(mesh.node(endHem(u, 1)), mesh.node(endHem(u, -1)), d.widthM / columns);
    }
    for (const [end, sign] of [
      ["front", 1],
      ["rear", -1],
    ] as const) {
      mesh.surface(end, SEGMENTS, 2, (u, v) => mix(arch(u, sign * y), endHem(u, sign), v));
      const count = SEGMENTS * mesh.refinement;
      const nodes = Array.from({ length: count + 1 }, (_, index) => mesh.node(arch(index / count, sign * y)));
      mesh.hoop(`hoop-${end}`, `Hoop, ${end}`, nodes, HOOP_BENDING_NM2);
      mesh.tieOut({
        id: `hem-${end}`,
        name: `Hem, ${end} middle`,
        kind: "hem",
        node: mesh.node(endHem(0.5, sign)),
        towards: { x: 0, y: sign },
        typical: { lengthM: HEM_LOOP_M },
      });
      for (const [side, u] of [
        ["right", 0.25],
        ["left", 0.75],
      ] as const) {
        const point = endHem(u, sign);
        mesh.tieOut({
          id: `hem-${end}-${side}`,
          name: `Hem, ${end} ${side}`,
          kind: "hem",
          node: mesh.node(point),
          towards: { x: point.x, y: point.y - sign * y },
          typical: { lengthM: HEM_LOOP_M },
        });
      }
      for (const [side, direction, foot, guy] of [
        ["right", 1, arch(0, sign * y), arch(0.25, sign * y)],
        ["left", -1, arch(1, sign * y), arch(0.75, sign * y)],
      ] as const) {
        mesh.tieOut({
          id: `foot-${end}-${side}`,
          name: `Hoop foot, ${end} ${side}`,
          kind: "corner",
          node: mesh.node(foot),
          towards: { x: direction, y: 0 },
          typical: { lengthM: HEM_LOOP_M },
        });
        mesh.tieOut({
          id: `guy-${end}-${side}`,
          name: `Guy, ${end} ${side}`,
          kind: "guy",
          node: mesh.node(guy),
          towards: { x: direction, y: sign * 0.5 },
          typical: { angleDeg: 38 },
        });
      }
    }
    for (const [side, u] of [
      ["right", 0],
      ["left", 1],
    ] as const) {
      mesh.tieOut({
        id: `hem-${side}`,
        name: `Hem, ${side} middle`,
        kind: "hem",
        node: mesh.node(arch(u, 0)),
        towards: { x: side === "right" ? 1 : -1, y: 0 },
        typical: { lengthM: HEM_LOOP_M },
      });
    }
    const rim = Array.from({ length: 13 }, (_, index) => (Math.PI * index) / 12);
    return {
      outline: [
        ...rim.map((a) => vec(-x * Math.cos(a), y + d.endTaperM * Math.sin(a), HEM_HEIGHT_M)),
        ...rim.map((a) => vec(x * Math.cos(a), -y - d.endTaperM * Math.sin(a), HEM_HEIGHT_M)),
      ],
      sleepingPlaces: placesSideBySide({ x: 0, y: 0 }, 2 * x - 0.1, 0, 2),
    };
  },
});
