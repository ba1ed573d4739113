import { itemAt } from "./indexed";
import { panelCoefficients } from "./pressure-coefficients";
import { compileNet, relaxNet, type Net, type NetState } from "./relaxation";
import { LINE_PRETENSION_N } from "./shelters/mesh";
import type { LoadCase, ShelterModel } from "./types";

export interface ShelterCase {
  /** Velocity pressure at the shelter, Pa, ≥ 0. */
  readonly pressurePa: number;
  /** Where the wind comes from, degrees clockwise from the shelter's front. */
  readonly relativeWindDeg: number;
  readonly loadCase: LoadCase;
}

export interface TieOutPull {
  readonly tieOutId: string;
  readonly pullN: number;
  /** Line angle above the ground under load, degrees, 0…90. */
  readonly lineAngleDeg: number;
}

export interface ShelterEquilibrium {
  /** x, y, z of every node, m. */
  readonly positions: Float64Array;
  readonly linkTensionN: Float64Array;
  /** One per tie-out in the model's order; 0 where it has been taken away. */
  readonly tieOuts: readonly TieOutPull[];
  /** Straight poles by their compression, bent poles by the largest thrust in them. */
  readonly poles: readonly { readonly poleId: string; readonly compressionN: number }[];
  readonly largestMovementM: number;
  /** Mean height of the watched tops, or a pole head if that is lower, as a share of what is drawn. */
  readonly headRoomShare: number;
  /** Largest and summed out-of-balance force, N. */
  readonly residualN: number;
  readonly residualSumN: number;
  readonly settled: boolean;
  /** Settled, head-room down by no more than a third, no pole fallen out. */
  readonly standing: boolean;
  readonly iterations: number;
  /** Sum of the wind loads and of what anchors, pole feet and ground push back with, N: x, y, z. */
  readonly windLoadN: readonly [number, number, number];
  readonly reactionN: readonly [number, number, number];
  /** Sum of the sizes of the wind loads on the panels, N. */
  readonly windLoadSizeN: number;
}

/** Head-room that must be left, as a share of what is drawn (product decision: down by more than a third is no shape). */
export const HEAD_ROOM_LIMIT = 2 / 3;
/** A pole has fallen out when its head is this much farther from its foot than it is long (judgement). */
const POLE_DROP_SHARE = 1.12;

/** A shelter ready for many cases: its net, and which nodes and links tell how it stands. */
export interface ShelterNet {
  readonly model: ShelterModel;
  readonly net: Net;
  /** Link that carries each tie-out, in the model's order. */
  readonly tieOutLinks: readonly number[];
  /** Nodes whose height is watched: pole heads and what is drawn within a tenth of the top. */
  readonly tops: readonly number[];
}

export function compileShelter(model: ShelterModel): ShelterNet {
  const tieOutLinks = model.tieOuts.map((tieOut) => model.links.findIndex((link) => link.tieOutId === tieOut.id));
  if (tieOutLinks.includes(-1)) throw new RangeError("A tie-out has no line.");
  const inCloth = new Set(model.panels.flatMap((panel) => panel.nodes));
  const highest = Math.max(...[...inCloth].map((node) => itemAt(model.nodes, node).position.z));
  const heads = new Set(model.poles.map((pole) => pole.head));
  const tops = [...inCloth].filter((node) => heads.has(node) || itemAt(model.nodes, node).position.z > 0.9 * highest);
  return { model, net: compileNet(model), tieOutLinks, tops };
}

/** Pressure on every panel in a case, Pa. */
export function panelPressures(model: ShelterModel, shelterCase: ShelterCase): Float64Array {
  const { pressurePa, relativeWindDeg, loadCase } = shelterCase;
  return Float64Array.from(
    panelCoefficients(model, relativeWindDeg, loadCase).map((coefficient) => coefficient.net * pressurePa),
  );
}

/**
 * Equilibrium of a shelter in one wind case (see relaxation.ts for the method and its sources).
 *
 * @param model from `buildShelter`
 * @param shelterCase pressure (Pa), direction relative to the front (degrees), pressing or lifting
 * @throws RangeError when the pressure is not a finite number ≥ 0
 */
export function solveShelter(model: ShelterModel, shelterCase: ShelterCase): ShelterEquilibrium {
  return solveShelterNet(compileShelter(model), panelPressures(model, shelterCase), {});
}

/** The same on a compiled shelter: may start from another shape and leave one tie-out (by index) away. */
export function solveShelterNet(
  shelter: ShelterNet,
  panelPressurePa: Float64Array,
  options: { readonly start?: Float64Array; readonly withoutTieOut?: number; readonly iterationLimit?: number },
): ShelterEquilibrium {
  if (panelPressurePa.some((pressure) => !Number.isFinite(pressure))) throw new RangeError("Pressure must be finite.");
  const { model, net, tieOutLinks, tops } = shelter;
  const removedLink = options.withoutTieOut === undefined ? -1 : itemAt(tieOutLinks, options.withoutTieOut);
  const state = relaxNet(
    net,
    { panelPressurePa, nodeForceN: null },
    {
      start: options.start,
      removedLink,
      iterationLimit: options.iterationLimit,
      loadFloorN: LINE_PRETENSION_N * model.tieOuts.length,
      collapse: { nodes: model.poles.length > 0 ? model.poles.map((pole) => pole.head) : tops, share: 0.35 },
    },
  );
  return readEquilibrium(shelter, state);
}

function readEquilibrium({ model, net, tieOutLinks, tops }: ShelterNet, state: NetState): ShelterEquilibrium {
  const x = state.positions;
  const at = (node: number, axis: number) => itemAt(x, 3 * node + axis);
  const drawn = (node: number, axis: number) => itemAt(net.drawn, 3 * node + axis);
  const apart = (a: number, b: number) => Math.hypot(at(a, 0) - at(b, 0), at(a, 1) - at(b, 1), at(a, 2) - at(b, 2));
  const tieOuts = model.tieOuts.map((tieOut, index) => {
    const link = itemAt(tieOutLinks, index);
    const ends = itemAt(model.links, link);
    const rise = Math.abs(at(ends.a, 2) - at(ends.b, 2));
    const sine = Math.min(1, rise / Math.max(1e-9, apart(ends.a, ends.b)));
    return {
      tieOutId: tieOut.id,
      pullN: itemAt(state.linkTensionN, link),
      lineAngleDeg: (Math.asin(sine) * 180) / Math.PI,
    };
  });
  let movement = 0;
  for (let node = 0; node < net.nodeCount; node += 1) {
    const step = [0, 1, 2].map((axis) => at(node, axis) - drawn(node, axis));
    movement = Math.max(movement, Math.hypot(...step));
  }
  const shares = tops.map((node) => at(node, 2) / drawn(node, 2));
  const headShares = model.poles.map((pole) => at(pole.head, 2) / drawn(pole.head, 2));
  const headRoomShare = Math.min(shares.reduce((sum, share) => sum + share, 0) / shares.length, ...headShares);
  const hasPolesIn = model.poles.every((pole) => apart(pole.foot, pole.head) <= POLE_DROP_SHARE * pole.lengthM);
  const settled = state.isSettled && !state.hasCollapsed;
  return {
    positions: x,
    linkTensionN: state.linkTensionN,
    tieOuts,
    poles: readPoles(model, state),
    largestMovementM: movement,
    headRoomShare,
    residualN: state.residualN,
    residualSumN: state.residualSumN,
    settled,
    standing: settled && hasPolesIn && headRoomShare >= HEAD_ROOM_LIMIT,
    iterations: state.iterations,
    windLoadN: state.loadN,
    reactionN: state.reactionN,
    windLoadSizeN: state.loadSizeN,
  };
}

function readPoles(model: ShelterModel, state: NetState): { poleId: string; compressionN: number }[] {
  const straight = model.poles.map((pole, index) => ({
    poleId: pole.id,
    compressionN: itemAt(state.poleCompressionN, index),
  }));
  let offset = 0;
  const bent = model.hoops.map((hoop) => {
    const count = hoop.nodes.length - 1;
    const thrusts = state.strutCompressionN.subarray(offset, offset + count);
    offset += count;
    return { poleId: hoop.id, compressionN: Math.max(0, ...thrusts) };
  });
  return [...straight, ...bent];
}
