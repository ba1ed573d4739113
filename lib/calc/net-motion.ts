import type { Net, NetLoad } from "./net";

/** Stiffness of the ground under a node that is pressed into it, N/m (judgement: stiff beside the cloth). */
const GROUND_STIFFNESS_N_PER_M = 20_000;
/** Gershgorin's bound asks for a half; the rest covers links that turn while they move. */
const MASS_SAFETY = 0.55;
/** A net has run away when a node is this far from the middle, m. */
const RUNAWAY_M = 60;

/** Working memory of one relaxation, and the loops over it. Indices are valid by construction (compileNet). */
export class NetMotion {
  readonly x: Float64Array;
  readonly force: Float64Array;
  readonly velocity: Float64Array;
  readonly mass: Float64Array;
  readonly linkTension: Float64Array;
  readonly poleCompression: Float64Array;
  readonly strutCompression: Float64Array;
  readonly load: [number, number, number] = [0, 0, 0];
  loadSize = 0;
  groundZ = 0;

  constructor(
    private readonly net: Net,
    private readonly netLoad: NetLoad,
    private readonly removedLink: number,
    private readonly massFloorShare: number,
    start: Float64Array,
  ) {
    this.x = Float64Array.from(start);
    this.force = new Float64Array(start.length);
    this.velocity = new Float64Array(start.length);
    this.mass = new Float64Array(start.length);
    this.linkTension = new Float64Array(net.linkRestM.length);
    this.poleCompression = new Float64Array(net.poleLengthM.length);
    this.strutCompression = new Float64Array(net.strutRestM.length);
  }

  /** Out-of-balance force on every node at the present shape. */
  computeForces(): void {
    const { force } = this;
    const dead = this.netLoad.nodeForceN;
    if (dead) force.set(dead);
    else force.fill(0);
    this.addPressure();
    this.addLinks();
    this.addCompression(this.net.poleEnds, this.net.poleLengthM, this.net.poleStiffnessN, this.poleCompression, false);
    this.addCompression(this.net.strutEnds, this.net.strutRestM, this.net.strutStiffnessN, this.strutCompression, true);
    this.addBends();
    this.addGround();
  }

  /** Follower pressure: on each panel p times the area vector ½ d1 × d2 of its diagonals, against the outward normal. */
  private addPressure(): void {
    const { x, force, load } = this;
    const { panelNodes, panelShares } = this.net;
    const pressure = this.netLoad.panelPressurePa;
    const count = pressure.length;
    let lx = 0;
    let ly = 0;
    let lz = 0;
    let size = 0;
    for (let panel = 0; panel < count; panel += 1) {
      const p = pressure[panel] as number;
      if (p === 0) continue;
      const o = 4 * panel;
      const a = 3 * (panelNodes[o] as number);
      const b = 3 * (panelNodes[o + 1] as number);
      const c = 3 * (panelNodes[o + 2] as number);
      const d = 3 * (panelNodes[o + 3] as number);
      const ux = (x[c] as number) - (x[a] as number);
      const uy = (x[c + 1] as number) - (x[a + 1] as number);
      const uz = (x[c + 2] as number) - (x[a + 2] as number);
      const wx = (x[d] as number) - (x[b] as number);
      const wy = (x[d + 1] as number) - (x[b + 1] as number);
      const wz = (x[d + 2] as number) - (x[b + 2] as number);
      const half = -0.5 * p;
      const fx = half * (uy * wz - uz * wy);
      const fy = half * (uz * wx - ux * wz);
      const fz = half * (ux * wy - uy * wx);
      lx += fx;
      ly += fy;
      lz += fz;
      size += Math.sqrt(fx * fx + fy * fy + fz * fz);
      for (let corner = 0; corner < 4; corner += 1) {
        const share = panelShares[o + corner] as number;
        const n = 3 * (panelNodes[o + corner] as number);
        force[n] = (force[n] as number) + share * fx;
        force[n + 1] = (force[n + 1] as number) + share * fy;
        force[n + 2] = (force[n + 2] as number) + share * fz;
      }
    }
    load[0] = lx;
    load[1] = ly;
    load[2] = lz;
    this.loadSize = size;
  }
  private addLinks(): void {
    const { x, force, linkTension } = this;
    const { linkEnds, linkRestM, linkStiffnessN } = this.net;
    const count = linkRestM.length;
    for (let link = 0; link < count; link += 1) {
      const a = 3 * (linkEnds[2 * link] as number);
      const b = 3 * (linkEnds[2 * link + 1] as number);
      const dx = (x[b] as number) - (x[a] as number);
      const dy = (x[b + 1] as number) - (x[a + 1] as number);
      const dz = (x[b + 2] as number) - (x[a + 2] as number);
      const length = Math.sqrt(dx * dx + dy * dy + dz * dz);
      const rest = linkRestM[link] as number;
      if (length <= rest || link === this.removedLink) {
        linkTension[link] = 0;
        continue;
      }
      const tension = ((linkStiffnessN[link] as number) * (length - rest)) / rest;
      linkTension[link] = tension;
      const pull = tension / length;
      force[a] = (force[a] as number) + pull * dx;
      force[a + 1] = (force[a + 1] as number) + pull * dy;
      force[a + 2] = (force[a + 2] as number) + pull * dz;
      force[b] = (force[b] as number) - pull * dx;
      force[b + 1] = (force[b + 1] as number) - pull * dy;
      force[b + 2] = (force[b + 2] as number) - pull * dz;
    }
  }

  private addCompression(
    ends: Int32Array,
    restM: Float64Array,
    stiffnessN: Float64Array,
    compressionN: Float64Array,
    takesTension: boolean,
  ): void {
    const { x, force } = this;
    for (let strut = 0; strut < restM.length; strut += 1) {
      const a = 3 * (ends[2 * strut] as number);
      const b = 3 * (ends[2 * strut + 1] as number);
      const dx = (x[b] as number) - (x[a] as number);
      const dy = (x[b + 1] as number) - (x[a + 1] as number);
      const dz = (x[b + 2] as number) - (x[a + 2] as number);
      const length = Math.sqrt(dx * dx + dy * dy + dz * dz);
      const rest = restM[strut] as number;
      const thrust = ((stiffnessN[strut] as number) * (rest - length)) / rest;
      if ((thrust <= 0 && !takesTension) || length < 1e-9) {
        compressionN[strut] = 0;
        continue;
      }
      compressionN[strut] = thrust;
      const push = thrust / length;
      force[a] = (force[a] as number) - push * dx;
      force[a + 1] = (force[a + 1] as number) - push * dy;
      force[a + 2] = (force[a + 2] as number) - push * dz;
      force[b] = (force[b] as number) + push * dx;
      force[b + 1] = (force[b + 1] as number) + push * dy;
      force[b + 2] = (force[b + 2] as number) + push * dz;
    }
  }

  /** Bent poles: moment EI/s · (turn − turn at rest) in the plane of the two segments, as a couple on each segment. */
  private addBends(): void {
    const { x, force } = this;
    const { bendNodes, bendRestRad, bendStiffnessNm } = this.net;
    for (let bend = 0; bend < bendRestRad.length; bend += 1) {
      const a = 3 * (bendNodes[3 * bend] as number);
      const b = 3 * (bendNodes[3 * bend + 1] as number);
      const c = 3 * (bendNodes[3 * bend + 2] as number);
      const px = (x[b] as number) - (x[a] as number);
      const py = (x[b + 1] as number) - (x[a + 1] as number);
      const pz = (x[b + 2] as number) - (x[a + 2] as number);
      const qx = (x[c] as number) - (x[b] as number);
      const qy = (x[c + 1] as number) - (x[b + 1] as number);
      const qz = (x[c + 2] as number) - (x[b + 2] as number);
      const nx = py * qz - pz * qy;
      const ny = pz * qx - px * qz;
      const nz = px * qy - py * qx;
      const size = Math.sqrt(nx * nx + ny * ny + nz * nz);
      if (size < 1e-12) continue;
      const turn = Math.atan2(size, px * qx + py * qy + pz * qz);
      const moment = ((bendStiffnessNm[bend] as number) * (turn - (bendRestRad[bend] as number))) / size;
      const pp = px * px + py * py + pz * pz;
      const qq = qx * qx + qy * qy + qz * qz;
      // Gradient of the turn: n × p / |p|² at a, n × q / |q|² at c, minus both at b.
      const ax = (moment * (ny * pz - nz * py)) / pp;
      const ay = (moment * (nz * px - nx * pz)) / pp;
      const az = (moment * (nx * py - ny * px)) / pp;
      const cx = (moment * (ny * qz - nz * qy)) / qq;
      const cy = (moment * (nz * qx - nx * qz)) / qq;
      const cz = (moment * (nx * qy - ny * qx)) / qq;
      force[a] = (force[a] as number) - ax;
      force[a + 1] = (force[a + 1] as number) - ay;
      force[a + 2] = (force[a + 2] as number) - az;
      force[c] = (force[c] as number) - cx;
      force[c + 1] = (force[c + 1] as number) - cy;
      force[c + 2] = (force[c + 2] as number) - cz;
      force[b] = (force[b] as number) + ax + cx;
      force[b + 1] = (force[b + 1] as number) + ay + cy;
      force[b + 2] = (force[b + 2] as number) + az + cz;
    }
  }

  private addGround(): void {
    const { x, force } = this;
    const { isFree, nodeCount } = this.net;
    let total = 0;
    for (let node = 0; node < nodeCount; node += 1) {
      const z = x[3 * node + 2] as number;
      if (z >= 0 || isFree[node] === 0) continue;
      const push = -GROUND_STIFFNESS_N_PER_M * z;
      force[3 * node + 2] = (force[3 * node + 2] as number) + push;
      total += push;
    }
    this.groundZ = total;
  }

  /** Fictitious masses at the present shape: half the row sums of the stiffness by direction, with a floor. */
  computeMasses(): void {
    const { mass, x } = this;
    const { linkEnds, linkRestM, linkStiffnessN, isFree } = this.net;
    mass.fill(0);
    const all = new Float64Array(this.net.nodeCount);
    const spread = (ends: Int32Array, restM: Float64Array, stiffnessN: Float64Array, tensions: Float64Array | null) => {
      for (let link = 0; link < restM.length; link += 1) {
        const a = ends[2 * link] as number;
        const b = ends[2 * link + 1] as number;
        const dx = Math.abs((x[3 * b] as number) - (x[3 * a] as number));
        const dy = Math.abs((x[3 * b + 1] as number) - (x[3 * a + 1] as number));
        const dz = Math.abs((x[3 * b + 2] as number) - (x[3 * a + 2] as number));
        const sum = dx + dy + dz;
        const square = dx * dx + dy * dy + dz * dz + 1e-12;
        const k = (stiffnessN[link] as number) / (restM[link] as number);
        const geometric = tensions ? Math.abs(tensions[link] as number) / Math.sqrt(square) : 0;
        for (const node of [a, b]) {
          mass[3 * node] = (mass[3 * node] as number) + (k * dx * sum) / square + geometric;
          mass[3 * node + 1] = (mass[3 * node + 1] as number) + (k * dy * sum) / square + geometric;
          mass[3 * node + 2] = (mass[3 * node + 2] as number) + (k * dz * sum) / square + geometric;
          all[node] = (all[node] as number) + k + geometric;
        }
      }
    };
    spread(linkEnds, linkRestM, linkStiffnessN, this.linkTension);
    spread(this.net.poleEnds, this.net.poleLengthM, this.net.poleStiffnessN, this.poleCompression);
    spread(this.net.strutEnds, this.net.strutRestM, this.net.strutStiffnessN, this.strutCompression);
    this.addBendMasses(all);
    for (let node = 0; node < this.net.nodeCount; node += 1) {
      const floor = this.massFloorShare * (all[node] as number);
      const ground = isFree[node] === 1 && (x[3 * node + 2] as number) < 0.02 ? GROUND_STIFFNESS_N_PER_M : 0;
      for (let axis = 0; axis < 3; axis += 1) {
        const own = (mass[3 * node + axis] as number) + (axis === 2 ? ground : 0);
        mass[3 * node + axis] = MASS_SAFETY * Math.max(own, floor, 1e-6);
      }
    }
  }

  private addBendMasses(all: Float64Array): void {
    const { mass, x } = this;
    const { bendNodes, bendStiffnessNm } = this.net;
    const gap = (p: number, q: number) =>
      Math.hypot(
        (x[3 * p] as number) - (x[3 * q] as number),
        (x[3 * p + 1] as number) - (x[3 * q + 1] as number),
        (x[3 * p + 2] as number) - (x[3 * q + 2] as number),
      ) + 1e-6;
    for (let bend = 0; bend < bendStiffnessNm.length; bend += 1) {
      const [a, b, c] = [
        bendNodes[3 * bend] as number,
        bendNodes[3 * bend + 1] as number,
        bendNodes[3 * bend + 2] as number,
      ];
      const p = 1 / gap(a, b);
      const q = 1 / gap(b, c);
      const k = 2 * (bendStiffnessNm[bend] as number) * (p + q);
      for (const [node, row] of [
        [a, k * p],
        [b, k * (p + q)],
        [c, k * q],
      ] as const) {
        all[node] = (all[node] as number) + row;
        for (let axis = 0; axis < 3; axis += 1) mass[3 * node + axis] = (mass[3 * node + axis] as number) + row;
      }
    }
  }

  /** Sum and largest of the out-of-balance forces on free nodes, N. */
  residual(): { sum: number; largest: number } {
    const { force } = this;
    const { isFree, nodeCount } = this.net;
    let sum = 0;
    let largest = 0;
    for (let node = 0; node < nodeCount; node += 1) {
      if (isFree[node] === 0) continue;
      const o = 3 * node;
      const size = Math.sqrt(
        (force[o] as number) * (force[o] as number) +
          (force[o + 1] as number) * (force[o + 1] as number) +
          (force[o + 2] as number) * (force[o + 2] as number),
      );
      sum += size;
      if (size > largest) largest = size;
    }
    return { sum, largest };
  }

  /** One step of velocities; returns twice the kinetic energy. `share` is ½ for the first step after a stop. */
  accelerate(share: number): number {
    const { force, velocity, mass } = this;
    const { isFree, nodeCount } = this.net;
    let energy = 0;
    for (let node = 0; node < nodeCount; node += 1) {
      if (isFree[node] === 0) continue;
      for (let o = 3 * node; o < 3 * node + 3; o += 1) {
        const m = mass[o] as number;
        const v = (velocity[o] as number) + (share * (force[o] as number)) / m;
        velocity[o] = v;
        energy += m * v * v;
      }
    }
    return energy;
  }

  advance(): void {
    const { x, velocity } = this;
    for (let o = 0; o < x.length; o += 1) x[o] = (x[o] as number) + (velocity[o] as number);
  }

  /** Back to the energy peak half a step ago, at rest (Barnes 1999). */
  stop(): void {
    const { x, velocity, force, mass } = this;
    const { isFree, nodeCount } = this.net;
    for (let node = 0; node < nodeCount; node += 1) {
      if (isFree[node] === 0) continue;
      for (let o = 3 * node; o < 3 * node + 3; o += 1)
        x[o] = (x[o] as number) - 0.5 * (velocity[o] as number) + (0.5 * (force[o] as number)) / (mass[o] as number);
    }
    velocity.fill(0);
  }

  /** False once a node has flown off or a coordinate is no longer a number. */
  isNear(): boolean {
    return this.x.every((value) => Math.abs(value) < RUNAWAY_M);
  }

  supportReaction(): [number, number, number] {
    const { force } = this;
    const { isFree, nodeCount } = this.net;
    const sum: [number, number, number] = [0, 0, this.groundZ];
    for (let node = 0; node < nodeCount; node += 1) {
      if (isFree[node] === 1) continue;
      for (const axis of [0, 1, 2] as const) sum[axis] -= force[3 * node + axis] as number;
    }
    return sum;
  }
}
