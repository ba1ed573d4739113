import { mix, vec } from "../vectors";
import { defineFamily, dimension, HEM_HEIGHT_M, HEM_LOOP_M, placesLikeSpokes } from "./family";

const SIDES = 12;

export const BELL = defineFamily({
  definition: {
    kind: "bell",
    name: "Bell tent",
    description: "A cone on one middle pole with an upright wall; twelve guys from the eaves and twelve wall pegs.",
    dimensions: [
      dimension("diameterM", "Diameter", 4, 3, 6),
      dimension("heightM", "Height of the pole", 2.5, 1.8, 3.5),
      dimension("wallHeightM", "Height of the wall", 0.6, 0.3, 1.1),
    ],
    typicalSleeps: 6,
    typicalMassKg: 14,
    form: "closed",
    support: "poles",
  },
  fabric: "cotton-canvas",
  lineDiameterMm: 4,
  heightM: (d) => d.heightM,
  check: (d) => {
    const slope = (d.heightM - d.wallHeightM) / (d.diameterM / 2);
    if (slope < 0.45)
      return [{ field: "dimensions.heightM", message: "The roof is too flat: raise the pole or lower the wall." }];
    if (slope > 1.9) return [{ field: "dimensions.heightM", message: "The pole is too tall for this diameter." }];
    return [];
  },
  build: (d, mesh) => {
    const radius = d.diameterM / 2;
    const at = (side: number, z: number) => {
      const angle = (2 * Math.PI * side) / SIDES;
      return vec(radius * Math.sin(angle), radius * Math.cos(angle), z);
    };
    const apex = vec(0, 0, d.heightM);
    mesh.pole("pole", "Middle pole", mesh.node(apex), vec(0, 0, 0));
    for (let side = 0; side < SIDES; side += 1) {
      const hour = side === 0 ? 12 : side;
      const edge = (u: number, z: number) => mix(at(side, z), at(side + 1, z), u);
      mesh.surface(`roof-${hour}`, 1, 3, (u, v) => mix(apex, edge(u, d.wallHeightM), v));
      mesh.surface(`wall-${hour}`, 1, 1, (u, v) => edge(u, d.wallHeightM + (HEM_HEIGHT_M - d.wallHeightM) * v));
      const eave = at(side, d.wallHeightM);
      const towards = { x: eave.x, y: eave.y };
      mesh.tieOut({
        id: `guy-${hour}`,
        name: `Guy, ${hour} o’clock`,
        kind: "guy",
        node: mesh.node(eave),
        towards,
        typical: { angleDeg: 26 },
      });
      mesh.tieOut({
        id: `peg-${hour}`,
        name: `Wall peg, ${hour} o’clock`,
        kind: "hem",
        node: mesh.node(at(side, HEM_HEIGHT_M)),
        towards,
        typical: { lengthM: HEM_LOOP_M },
      });
    }
    return {
      outline: Array.from({ length: SIDES }, (_, side) => at(side, HEM_HEIGHT_M)),
      sleepingPlaces: placesLikeSpokes(radius, 6),
    };
  },
});
