import type { Vec3 } from "../types";
import { mix, vec } from "../vectors";
import { defineFamily, dimension, HEM_HEIGHT_M, HEM_LOOP_M, placesSideBySide, rectangle } from "./family";

const COLUMNS = 4;
const ROWS = 4;
/** Bending stiffness EI of an aluminium tube of 11 mm by 0.9 mm: E 70 GPa × 370 mm⁴ = 26 N·m² (from its geometry). */
const HOOP_BENDING_NM2 = 26;

export const DOME = defineFamily({
  definition: {
    kind: "dome",
    name: "Dome",
    description: "Two bent poles crossing over a rectangular floor; four feet, guyed from each pole leg.",
    dimensions: [
      dimension("widthM", "Width of the floor", 1.9, 1.2, 3.2),
      dimension("depthM", "Depth of the floor", 2.1, 1.9, 3.2),
      dimension("heightM", "Height", 1.15, 0.9, 2),
    ],
    typicalSleeps: 2,
    typicalMassKg: 2.8,
    form: "closed",
    support: "hoops",
  },
  fabric: "polyester-light",
  lineDiameterMm: 3,
  heightM: (d) => d.heightM,
  check: (d) =>
    d.heightM > Math.min(d.widthM, d.depthM)
      ? [{ field: "dimensions.heightM", message: "The dome is too high for this floor." }]
      : [],
  build: (d, mesh) => {
    const x = d.widthM / 2;
    const y = d.depthM / 2;
    const [frontRight, rearRight, rearLeft, frontLeft] = rectangle(x, y, HEM_HEIGHT_M);
    // A quarter of an ellipse from the top (v = 0) to the hem (v = 1).
    const fall = (hem: Vec3, v: number) => {
      const angle = (Math.PI / 2) * v;
      const reach = Math.sin(angle);
      return vec(hem.x * reach, hem.y * reach, HEM_HEIGHT_M + (d.heightM - HEM_HEIGHT_M) * Math.cos(angle));
    };
    for (const [zone, from, to, towards] of [
      ["front", frontLeft, frontRight, { x: 0, y: 1 }],
      ["right", frontRight, rearRight, { x: 1, y: 0 }],
      ["rear", rearRight, rearLeft, { x: 0, y: -1 }],
      ["left", rearLeft, frontLeft, { x: -1, y: 0 }],
    ] as const) {
      mesh.surface(zone, COLUMNS, ROWS, (u, v) => fall(mix(from, to, u), v));
      mesh.tieOut({
        id: `hem-${zone}`,
        name: `Hem, ${zone} middle`,
        kind: "hem",
        node: mesh.node(mix(from, to, 0.5)),
        towards,
        typical: { lengthM: HEM_LOOP_M },
      });
    }
    const columns = COLUMNS * mesh.refinement;
    for (let column = 1; column < columns; column += 1) {
      const u = column / columns;
      const across = [mix(frontRight, rearRight, u), mix(frontLeft, rearLeft, u)] as const;
      const along = [mix(frontLeft, frontRight, u), mix(rearLeft, rearRight, u)] as const;
      mesh.floorStrip(mesh.node(across[0]), mesh.node(across[1]), d.depthM / columns);
      mesh.floorStrip(mesh.node(along[0]), mesh.node(along[1]), d.widthM / columns);
    }
    const rows = ROWS * mesh.refinement;
    const leg = (corner: Vec3) => Array.from({ length: rows + 1 }, (_, row) => mesh.node(fall(corner, row / rows)));
    for (const [id, name, from, to] of [
      ["hoop-a", "Pole, front right to rear left", frontRight, rearLeft],
      ["hoop-b", "Pole, front left to rear right", frontLeft, rearRight],
    ] as const) {
      mesh.hoop(id, name, [...leg(from).reverse(), ...leg(to).slice(1)], HOOP_BENDING_NM2);
    }
    for (const [place, corner] of [
      ["front right", frontRight],
      ["rear right", rearRight],
      ["rear left", rearLeft],
      ["front left", frontLeft],
    ] as const) {
      const id = place.replace(" ", "-");
      const towards = { x: corner.x, y: corner.y };
      mesh.tieOut({
        id: `corner-${id}`,
        name: `Corner, ${place}`,
        kind: "corner",
        node: mesh.node(corner),
        towards,
        typical: { lengthM: HEM_LOOP_M },
      });
      mesh.tieOut({
        id: `guy-${id}`,
        name: `Guy, ${place}`,
        kind: "guy",
        node: mesh.node(fall(corner, 0.5)),
        towards,
        typical: { angleDeg: 38 },
      });
    }
    return {
      outline: [frontRight, rearRight, rearLeft, frontLeft],
      sleepingPlaces: placesSideBySide({ x: 0, y: 0 }, 2 * x - 0.1, 0, 2),
    };
  },
});
