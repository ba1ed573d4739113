import { itemAt } from "../indexed";
import type { ShelterModel, TieOut, TieOutKind, Vec3 } from "../types";
import { add, bearingDeg, cross, distance, dot, lengthOf, scale, subtract, vec } from "../vectors";

/** Tension that a hand puts into each line when pitching, N (judgement: a firm pull, well below what bends a light pole). */
export const LINE_PRETENSION_N = 20;
/** Tape and doubled cloth along hems, and seams along ridges, add this axial stiffness, N (judgement). */
const HEM_STIFFNESS_N = 8_000;
const RIDGE_STIFFNESS_N = 12_000;
/**
 * Poles are some 1 MN stiff along their axis. That is ten times stiffer than all else and only slows the settling, so the
 * model takes 120 kN: at 500 N a 1.5 m pole shortens by 6 mm instead of 1 mm (judgement).
 */
const POLE_STIFFNESS_N = 120_000;
const HOOP_STIFFNESS_N = 60_000;

export interface MeshMaterials {
  /** Membrane stiffness of the fabric, N/m. */
  readonly fabricStiffnessNPerM: number;
  /** Stiffness of shear diagonals as a share of it. */
  readonly shearShare: number;
  /** EA of the lines, N. */
  readonly lineStiffnessN: number;
  /** Wanted line lengths by tie-out id, m. */
  readonly lineLengthsM: Readonly<Record<string, number>>;
}

export interface TieOutRequest {
  readonly id: string;
  readonly name: string;
  readonly kind: TieOutKind;
  readonly node: number;
  /** Plan direction in which the line runs out; need not be a unit vector. */
  readonly towards: { readonly x: number; readonly y: number };
  /** Typical line: by its angle above the ground, degrees, or by its length, m. */
  readonly typical: { readonly angleDeg: number } | { readonly lengthM: number };
}

interface LinkDraft {
  readonly a: number;
  readonly b: number;
  stiffnessN: number;
  sides: number;
  readonly zones: Set<string>;
  isDiagonal: boolean;
  role: "fabric" | "edge" | "ridge" | null;
}

export interface ShelterDrawing {
  readonly outline: readonly Vec3[];
  /** The folds between zones are a ridge even where they slope. */
  readonly hasSlopingRidge?: boolean;
  readonly sleepingPlaces: ShelterModel["drawing"]["sleepingPlaces"];
}

/**
 * Builds the cable net of a shelter: surfaces are cut into quads, whose sides carry the fabric's stiffness over their
 * tributary width and whose diagonals carry its shear. Points that coincide become one node; a side with fabric on one
 * hand only is a hem, a side between two zones is a ridge or seam.
 */
export class ShelterMesh {
  readonly problems: { field: string; message: string }[] = [];
  private readonly nodes: { position: Vec3; fixed: boolean }[] = [];
  private readonly nodeByKey = new Map<string, number>();
  private readonly links = new Map<string, LinkDraft>();
  private readonly panels: { nodes: [number, number, number, number]; zone: string }[] = [];
  private readonly poles: ShelterModel["poles"][number][] = [];
  private readonly hoops: ShelterModel["hoops"][number][] = [];
  private readonly requests: TieOutRequest[] = [];
  private readonly feet: Vec3[] = [];
  private readonly straps: { a: number; b: number; stiffnessN: number }[] = [];

  constructor(
    private readonly materials: MeshMaterials,
    /** 1 = working mesh; 2 halves every cell, for the check on mesh size. */
    readonly refinement: number,
  ) {}

  /** Index of the free node at this place; made when there is none within a tenth of a millimetre. */
  node(position: Vec3): number {
    const key = [position.x, position.y, position.z].map((value) => Math.round(value * 1e4) + 0).join(",");
    const known = this.nodeByKey.get(key);
    if (known !== undefined) return known;
    const index = this.nodes.push({ position, fixed: false }) - 1;
    this.nodeByKey.set(key, index);
    return index;
  }

  positionOf(node: number): Vec3 {
    return itemAt(this.nodes, node).position;
  }

  /** A surface given by a function of u, v in 0…1, cut into `across` × `along` quads (times the refinement). */
  surface(zone: string, across: number, along: number, at: (u: number, v: number) => Vec3): void {
    const columns = across * this.refinement;
    const rows = along * this.refinement;
    const grid: number[][] = [];
    for (let row = 0; row <= rows; row += 1) {
      grid.push(Array.from({ length: columns + 1 }, (_, column) => this.node(at(column / columns, row / rows))));
    }
    for (let row = 0; row < rows; row += 1) {
      for (let column = 0; column < columns; column += 1) {
        const corner = (dr: number, dc: number) => itemAt(itemAt(grid, row + dr), column + dc);
        this.panel(zone, [corner(0, 0), corner(0, 1), corner(1, 1), corner(1, 0)]);
      }
    }
  }

  /** One panel; equal neighbours in the list make it a triangle, all on one line makes it nothing. */
  panel(zone: string, corners: readonly number[]): void {
    const distinct = corners.filter((node, index) => node !== corners[(index + corners.length - 1) % corners.length]);
    const [a, b, c, d] = distinct;
    if (a === undefined || b === undefined || c === undefined || new Set(distinct).size !== distinct.length) return;
    const ordered: [number, number, number, number] = [a, b, c, d ?? c];
    const [pa, pb, pc, pd] = ordered.map((node) => this.positionOf(node)) as [Vec3, Vec3, Vec3, Vec3];
    const normal = cross(subtract(pc, pa), subtract(pd === pc ? pc : pd, pb));
    const middle = scale(add(add(pa, pb), add(pc, pd)), 0.25);
    const isOutward = dot(normal, middle) >= 0;
    this.panels.push({ zone, nodes: isOutward ? ordered : d === undefined ? [b, a, c, c] : [a, d, c, b] });
    const stiffness = this.materials.fabricStiffnessNPerM;
    if (d === undefined) {
      const area = lengthOf(cross(subtract(pb, pa), subtract(pc, pa))) / 2;
      for (const [p, q] of [
        [a, b],
        [b, c],
        [c, a],
      ] as const) {
        // A third of the triangle is carried along each side: width = area ÷ 1.5 sides.
        this.fabricLink(p, q, zone, (stiffness * area) / (1.5 * distance(this.positionOf(p), this.positionOf(q))));
      }
      return;
    }
    const ab = (distance(pa, pb) + distance(pc, pd)) / 2;
    const bc = (distance(pb, pc) + distance(pd, pa)) / 2;
    this.fabricLink(a, b, zone, (stiffness * bc) / 2);
    this.fabricLink(c, d, zone, (stiffness * bc) / 2);
    this.fabricLink(b, c, zone, (stiffness * ab) / 2);
    this.fabricLink(d, a, zone, (stiffness * ab) / 2);
    const shear = stiffness * this.materials.shearShare * Math.sqrt(ab * bc);
    this.fabricLink(a, c, zone, shear, true);
    this.fabricLink(b, d, zone, shear, true);
  }

  private fabricLink(a: number, b: number, zone: string, stiffnessN: number, isDiagonal = false): void {
    const key = a < b ? `${a}-${b}` : `${b}-${a}`;
    const known = this.links.get(key);
    const link = known ?? { a, b, stiffnessN: 0, sides: 0, zones: new Set<string>(), isDiagonal, role: null };
    link.stiffnessN += stiffnessN;
    link.sides += 1;
    link.zones.add(zone);
    if (!known) this.links.set(key, link);
  }

  /** A straight upright or leaning pole from a foot on the ground to a node of the fabric. */
  pole(id: string, name: string, head: number, footPosition: Vec3): void {
    const foot = this.nodes.push({ position: footPosition, fixed: true }) - 1;
    const lengthM = distance(footPosition, this.positionOf(head));
    this.poles.push({ id, name, foot, head, lengthM, stiffnessN: POLE_STIFFNESS_N });
    this.feet.push(footPosition);
  }

  /** A bent pole through nodes of the fabric; its feet stand on the ground and a floor strap keeps them together. */
  hoop(id: string, name: string, nodes: readonly number[], bendingStiffnessNm2: number): void {
    this.hoops.push({ id, name, nodes, stiffnessN: HOOP_STIFFNESS_N, bendingStiffnessNm2 });
    const [first, last] = [itemAt(nodes, 0), itemAt(nodes, nodes.length - 1)];
    this.feet.push(this.positionOf(first), this.positionOf(last));
    this.straps.push({ a: first, b: last, stiffnessN: 2 * RIDGE_STIFFNESS_N });
  }

  /** A strip of sewn-in floor, this wide, between two nodes of the hem: it ties them together and takes no wind. */
  floorStrip(a: number, b: number, widthM: number): void {
    this.straps.push({ a, b, stiffnessN: this.materials.fabricStiffnessNPerM * widthM });
  }

  tieOut(request: TieOutRequest): void {
    this.requests.push(request);
  }

  private lineLength(request: TieOutRequest, heightM: number): number {
    const { typical } = request;
    const rounded =
      "lengthM" in typical
        ? typical.lengthM
        : Math.ceil((heightM / Math.sin((typical.angleDeg * Math.PI) / 180)) * 20) / 20;
    const wanted = this.materials.lineLengthsM[request.id];
    if (wanted === undefined) return rounded;
    const shortest = Math.max(0.04, heightM * 1.02);
    if (wanted >= shortest && wanted <= 10) return wanted;
    this.problems.push({
      field: `lineLengthsM.${request.id}`,
      message: `${request.name}: the line must be ${(Math.ceil(shortest * 100) / 100).toFixed(2)} to 10 m long to reach the ground.`,
    });
    return rounded;
  }

  private finishTieOuts(links: ShelterModel["links"][number][]): TieOut[] {
    const drafts = this.requests.map((request) => {
      const point = this.positionOf(request.node);
      const lineLengthM = this.lineLength(request, point.z);
      const size = Math.hypot(request.towards.x, request.towards.y);
      const reach = Math.sqrt(Math.max(0, lineLengthM * lineLengthM - point.z * point.z)) / size;
      const anchor = vec(point.x + request.towards.x * reach, point.y + request.towards.y * reach, 0);
      const end = this.nodes.push({ position: anchor, fixed: true }) - 1;
      const stiffnessN = this.materials.lineStiffnessN;
      const restLengthM = lineLengthM / (1 + LINE_PRETENSION_N / stiffnessN);
      links.push({ a: request.node, b: end, restLengthM, stiffnessN, role: "line", tieOutId: request.id });
      const lineAngleDeg = (Math.asin(Math.min(1, point.z / lineLengthM)) * 180) / Math.PI;
      return { id: request.id, name: request.name, kind: request.kind, point, anchor, lineLengthM, lineAngleDeg };
    });
    return drafts
      .map((draft) => {
        const bearing = bearingDeg(draft.anchor);
        return { draft, bearing: bearing > 359.99 ? 0 : bearing, radius: Math.hypot(draft.anchor.x, draft.anchor.y) };
      })
      .sort((p, q) => (Math.abs(p.bearing - q.bearing) > 0.01 ? p.bearing - q.bearing : q.radius - p.radius))
      .map(({ draft }, index) => ({ ...draft, number: index + 1 }));
  }

  /** The finished model. Links come hem, ridge and fabric first, then straps, then lines in the order of the requests. */
  finish(kind: ShelterModel["kind"], drawing: ShelterDrawing): ShelterModel {
    const links: ShelterModel["links"][number][] = [];
    const ridges: [Vec3, Vec3][] = [];
    const seams: [Vec3, Vec3][] = [];
    for (const draft of this.links.values()) {
      const ends: [Vec3, Vec3] = [this.positionOf(draft.a), this.positionOf(draft.b)];
      const isHem = !draft.isDiagonal && draft.sides === 1;
      const isSeam = !draft.isDiagonal && draft.zones.size > 1;
      if (isSeam) (drawing.hasSlopingRidge || isLevel(ends) ? ridges : seams).push(ends);
      const extra = isHem ? HEM_STIFFNESS_N : isSeam ? RIDGE_STIFFNESS_N : 0;
      links.push({
        a: draft.a,
        b: draft.b,
        restLengthM: distance(ends[0], ends[1]),
        stiffnessN: draft.stiffnessN + extra,
        role: isHem ? "edge" : isSeam ? "ridge" : "fabric",
        tieOutId: null,
      });
    }
    for (const { a, b, stiffnessN } of this.straps) {
      const restLengthM = distance(this.positionOf(a), this.positionOf(b));
      links.push({ a, b, restLengthM, stiffnessN, role: "fabric", tieOutId: null });
    }
    const tieOuts = this.finishTieOuts(links);
    const hoopLines = this.hoops.flatMap((hoop) =>
      hoop.nodes
        .slice(1)
        .map((node, index): [Vec3, Vec3] => [this.positionOf(itemAt(hoop.nodes, index)), this.positionOf(node)]),
    );
    return {
      kind,
      nodes: this.nodes,
      links,
      poles: this.poles,
      hoops: this.hoops,
      panels: this.panels,
      tieOuts,
      drawing: {
        outline: drawing.outline,
        ridges: [...ridges, ...hoopLines],
        seams,
        poleFeet: this.feet,
        sleepingPlaces: drawing.sleepingPlaces,
      },
    };
  }
}

const isLevel = ([a, b]: readonly [Vec3, Vec3]): boolean => Math.abs(a.z - b.z) < 0.02 && Math.max(a.z, b.z) > 0.3;
