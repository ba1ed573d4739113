import type { Net, NetLoad } from "./net";
import { NetMotion } from "./net-motion";

export { compileNet, type Net, type NetLoad } from "./net";

/**
 * Equilibrium of a cable net by dynamic relaxation with kinetic damping.
 *
 * Sources: A. S. Day, "An introduction to dynamic relaxation", The Engineer 219 (1965); M. R. Barnes, "Form finding and
 * analysis of tension structures by dynamic relaxation", Int. J. Space Structures 14 (1999); W. J. Lewis, "Tension
 * Structures: Form and Behaviour" (2003). The net moves from its drawn shape under its out-of-balance forces with
 * fictitious masses and unit time step; whenever its kinetic energy passes a peak all velocities are set to zero.
 *
 * Masses per direction follow Gershgorin's bound on the stiffness of the links at a node, so that the step is stable
 * (Barnes: m = Δt²/2 · S). Links carry tension only, poles compression only, bent poles both and bending. The ground
 * carries what presses on it. The weight of the cloth (some 0.5 Pa) is neglected.
 */

export interface NetOptions {
  /** Start from these coordinates instead of the drawn ones. */
  readonly start?: Float64Array;
  /** Links left out (by index), e.g. a line whose anchor has gone. */
  readonly removedLink?: number;
  /** Sum of out-of-balance forces at which the net counts as settled, as a share of all loads. */
  readonly tolerance?: number;
  readonly iterationLimit?: number;
  /** Smallest load to which the tolerance refers, N (pretension). */
  readonly loadFloorN?: number;
  /** Watch these nodes: stop once any is lower than this share of its drawn height. */
  readonly collapse?: { readonly nodes: readonly number[]; readonly share: number };
}

export interface NetState {
  readonly positions: Float64Array;
  readonly linkTensionN: Float64Array;
  readonly poleCompressionN: Float64Array;
  readonly strutCompressionN: Float64Array;
  /** What the supports and the ground push back with, N: x, y, z. */
  readonly reactionN: readonly [number, number, number];
  /** Sum of all loads, N: x, y, z; and the sum of their sizes. */
  readonly loadN: readonly [number, number, number];
  readonly loadSizeN: number;
  /** Sum of the sizes of the out-of-balance forces, N, and the largest one. */
  readonly residualSumN: number;
  readonly residualN: number;
  readonly isSettled: boolean;
  readonly hasCollapsed: boolean;
  readonly iterations: number;
}

/**
 * Masses never fall below this share of the all-directions value: a flat cloth stiffens as it bellies. A net that runs
 * away, or swings on and on, is tried with the next share; at 1 the step is stable whatever way the links turn.
 */
const MASS_FLOOR_SHARES = [0.06, 0.25, 1] as const;
/** Steps after which a net that only swings is taken on with the next share, from where it is. */
const ATTEMPT_LIMIT = 1_200;
const DEFAULT_TOLERANCE = 0.004;
const DEFAULT_ITERATION_LIMIT = 3_000;

/**
 * Lets a net find its shape under a load. Bounded: a net that does not settle comes back with `isSettled` false.
 *
 * @param net from `compileNet`
 * @param netLoad pressures (Pa) that follow the panels, and dead loads (N)
 * @param options start, a link left out, tolerance (share of all loads, default 0.004), iteration limit (default 3000)
 */
export function relaxNet(net: Net, netLoad: NetLoad, options: NetOptions = {}): NetState {
  const limit = options.iterationLimit ?? DEFAULT_ITERATION_LIMIT;
  let start = options.start ?? net.drawn;
  let iterations = 0;
  let attempt: ReturnType<typeof runRelaxation> | null = null;
  for (const massFloorShare of MASS_FLOOR_SHARES) {
    const isLast = massFloorShare === 1;
    const iterationLimit = isLast ? limit - iterations : Math.min(limit - iterations, ATTEMPT_LIMIT);
    attempt = runRelaxation(net, netLoad, { ...options, start, iterationLimit }, massFloorShare);
    iterations += attempt.state.iterations;
    if (attempt.state.isSettled || attempt.state.hasCollapsed || iterations >= limit) break;
    start = attempt.hasRunAway ? (options.start ?? net.drawn) : attempt.state.positions;
  }
  if (!attempt) throw new RangeError("Nothing was tried.");
  return { ...attempt.state, iterations };
}

function runRelaxation(
  net: Net,
  netLoad: NetLoad,
  options: NetOptions,
  massFloorShare: number,
): { state: NetState; hasRunAway: boolean } {
  const { tolerance = DEFAULT_TOLERANCE, iterationLimit = DEFAULT_ITERATION_LIMIT, loadFloorN = 1 } = options;
  const work = new NetMotion(net, netLoad, options.removedLink ?? -1, massFloorShare, options.start ?? net.drawn);
  const deadSize = sizeOfForces(netLoad.nodeForceN);
  let target = 0;
  let lastEnergy = 0;
  let isStarting = true;
  let isSettled = false;
  let hasCollapsed = false;
  let hasRunAway = false;
  let iterations = 0;
  let residual = { sum: Number.POSITIVE_INFINITY, largest: Number.POSITIVE_INFINITY };
  for (; iterations < iterationLimit; iterations += 1) {
    work.computeForces();
    if (isStarting) work.computeMasses();
    residual = work.residual();
    if (iterations === 0) target = tolerance * Math.max(loadFloorN, work.loadSize + deadSize);
    if (residual.sum <= target) {
      isSettled = true;
      break;
    }
    if (iterations % 40 === 39) {
      hasRunAway = !work.isNear();
      hasCollapsed = !hasRunAway && options.collapse !== undefined && isBelow(work.x, net.drawn, options.collapse);
      if (hasRunAway || hasCollapsed) break;
    }
    const energy = work.accelerate(isStarting ? 0.5 : 1);
    if (energy < lastEnergy) {
      work.stop();
      lastEnergy = 0;
      isStarting = true;
      continue;
    }
    lastEnergy = energy;
    isStarting = false;
    work.advance();
  }
  return {
    hasRunAway,
    state: {
      positions: work.x,
      linkTensionN: work.linkTension,
      poleCompressionN: work.poleCompression,
      strutCompressionN: work.strutCompression,
      reactionN: work.supportReaction(),
      loadN: work.load,
      loadSizeN: work.loadSize + deadSize,
      residualSumN: residual.sum,
      residualN: residual.largest,
      isSettled,
      hasCollapsed,
      iterations,
    },
  };
}

function sizeOfForces(force: Float64Array | null): number {
  let size = 0;
  for (let o = 0; force && o < force.length; o += 3)
    size += Math.hypot(force[o] as number, force[o + 1] as number, force[o + 2] as number);
  return size;
}

function isBelow(
  x: Float64Array,
  drawn: Float64Array,
  { nodes, share }: { readonly nodes: readonly number[]; readonly share: number },
): boolean {
  return nodes.some((node) => (x[3 * node + 2] as number) < share * (drawn[3 * node + 2] as number));
}
