import { itemAt } from "./indexed";
import type { ShelterModel } from "./types";
import { distance } from "./vectors";

export type NetModel = Pick<ShelterModel, "nodes" | "links" | "poles" | "hoops" | "panels">;

/** A net in flat arrays, ready to be relaxed any number of times. */
export interface Net {
  readonly nodeCount: number;
  readonly drawn: Float64Array;
  readonly isFree: Uint8Array;
  readonly linkEnds: Int32Array;
  readonly linkRestM: Float64Array;
  readonly linkStiffnessN: Float64Array;
  readonly poleEnds: Int32Array;
  readonly poleLengthM: Float64Array;
  readonly poleStiffnessN: Float64Array;
  /** Struts of bent poles: ends, rest length, EA. */
  readonly strutEnds: Int32Array;
  readonly strutRestM: Float64Array;
  readonly strutStiffnessN: Float64Array;
  /** Bends of bent poles: three nodes each, angle at rest (rad), EI over tributary length (N·m). */
  readonly bendNodes: Int32Array;
  readonly bendRestRad: Float64Array;
  readonly bendStiffnessNm: Float64Array;
  readonly panelNodes: Int32Array;
  /** Share of a panel's load that each of its four corners takes. */
  readonly panelShares: Float64Array;
}

export interface NetLoad {
  /** Pressure on each panel against its outward normal, Pa; positive presses inward, negative sucks outward. */
  readonly panelPressurePa: Float64Array;
  /** Dead loads on nodes, N, three per node; null = none. */
  readonly nodeForceN: Float64Array | null;
}

/** Flattens a model. Throws RangeError when a link, pole or panel names a node that is not there. */
export function compileNet(model: NetModel): Net {
  const nodeCount = model.nodes.length;
  const known = (index: number): number => {
    if (!(Number.isInteger(index) && index >= 0 && index < nodeCount)) throw new RangeError(`No node ${index}.`);
    return index;
  };
  const drawn = Float64Array.from(model.nodes.flatMap(({ position: { x, y, z } }) => [x, y, z]));
  const gap = (a: number, b: number) => distance(itemAt(model.nodes, a).position, itemAt(model.nodes, b).position);
  const struts = model.hoops.flatMap((hoop) =>
    hoop.nodes.slice(1).map((node, index) => ({ a: known(itemAt(hoop.nodes, index)), b: known(node), hoop })),
  );
  const bends = model.hoops.flatMap((hoop) =>
    hoop.nodes.slice(2).map((c, index) => {
      const [a, b] = [itemAt(hoop.nodes, index), itemAt(hoop.nodes, index + 1)];
      const [la, lb, lc] = [gap(a, b), gap(b, c), gap(a, c)];
      const cosine = (la * la + lb * lb - lc * lc) / (2 * la * lb);
      const turn = Math.PI - Math.acos(Math.min(1, Math.max(-1, cosine)));
      return { nodes: [a, b, c], turn, stiffness: hoop.bendingStiffnessNm2 / ((la + lb) / 2) };
    }),
  );
  return {
    nodeCount,
    drawn,
    isFree: Uint8Array.from(model.nodes.map((node) => (node.fixed ? 0 : 1))),
    linkEnds: Int32Array.from(model.links.flatMap((link) => [known(link.a), known(link.b)])),
    linkRestM: Float64Array.from(model.links.map((link) => link.restLengthM)),
    linkStiffnessN: Float64Array.from(model.links.map((link) => link.stiffnessN)),
    poleEnds: Int32Array.from(model.poles.flatMap((pole) => [known(pole.foot), known(pole.head)])),
    poleLengthM: Float64Array.from(model.poles.map((pole) => pole.lengthM)),
    poleStiffnessN: Float64Array.from(model.poles.map((pole) => pole.stiffnessN)),
    strutEnds: Int32Array.from(struts.flatMap(({ a, b }) => [a, b])),
    strutRestM: Float64Array.from(struts.map(({ a, b }) => gap(a, b))),
    strutStiffnessN: Float64Array.from(struts.map(({ hoop }) => hoop.stiffnessN)),
    bendNodes: Int32Array.from(bends.flatMap((bend) => bend.nodes)),
    bendRestRad: Float64Array.from(bends.map((bend) => bend.turn)),
    bendStiffnessNm: Float64Array.from(bends.map((bend) => bend.stiffness)),
    panelNodes: Int32Array.from(model.panels.flatMap((panel) => panel.nodes.map(known))),
    panelShares: Float64Array.from(
      model.panels.flatMap(({ nodes: [, , c, d] }) =>
        c === d ? [1 / 3, 1 / 3, 1 / 6, 1 / 6] : [0.25, 0.25, 0.25, 0.25],
      ),
    ),
  };
}
