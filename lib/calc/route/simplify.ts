import { itemAt } from "../indexed";

/** A queue of point numbers by their weight, the lightest first; weights may change while they wait. */
class LightestFirst {
  private readonly heap: number[] = [];
  private readonly places: Int32Array;

  constructor(
    private readonly weights: Float64Array,
    points: readonly number[],
  ) {
    this.places = new Int32Array(weights.length).fill(-1);
    for (const point of points) {
      this.places[point] = this.heap.length;
      this.heap.push(point);
    }
    for (let at = Math.floor(this.heap.length / 2) - 1; at >= 0; at -= 1) this.sink(at);
  }

  take(): number | undefined {
    const [first] = this.heap;
    const last = this.heap.pop();
    if (first === undefined || last === undefined) return undefined;
    this.places[first] = -1;
    if (first !== last) {
      this.put(last, 0);
      this.sink(0);
    }
    return first;
  }

  /** Its weight has changed. */
  move(point: number): void {
    const at = itemAt(this.places, point);
    if (at < 0) return;
    this.rise(at);
    this.sink(itemAt(this.places, point));
  }

  private put(point: number, at: number): void {
    this.heap[at] = point;
    this.places[point] = at;
  }

  private weightAt(at: number): number {
    return itemAt(this.weights, itemAt(this.heap, at));
  }

  private swap(a: number, b: number): void {
    const [one, other] = [itemAt(this.heap, a), itemAt(this.heap, b)];
    this.put(one, b);
    this.put(other, a);
  }

  private rise(from: number): void {
    let at = from;
    while (at > 0) {
      const parent = (at - 1) >> 1;
      if (this.weightAt(parent) <= this.weightAt(at)) return;
      this.swap(at, parent);
      at = parent;
    }
  }

  private sink(from: number): void {
    let at = from;
    for (;;) {
      const left = 2 * at + 1;
      const right = left + 1;
      let lightest = at;
      if (left < this.heap.length && this.weightAt(left) < this.weightAt(lightest)) lightest = left;
      if (right < this.heap.length && this.weightAt(right) < this.weightAt(lightest)) lightest = right;
      if (lightest === at) return;
      this.swap(at, lightest);
      at = lightest;
    }
  }
}

/** Area of the triangle of three points, m². */
function triangle(x: ArrayLike<number>, y: ArrayLike<number>, a: number, b: number, c: number): number {
  const [ax, ay] = [itemAt(x, a), itemAt(y, a)];
  return Math.abs((itemAt(x, b) - ax) * (itemAt(y, c) - ay) - (itemAt(x, c) - ax) * (itemAt(y, b) - ay)) / 2;
}

/**
 * Indices of at most so many points that keep a line's shape best, its ends among them: the point whose triangle with its
 * neighbours is smallest goes first. The work grows with n·log n, whatever the line looks like.
 * Source: M. Visvalingam, J. D. Whyatt, Cartographic Journal 30 (1993) 46.
 * @param x, y plane coordinates, m @param maxPoints ≥ 2
 */
export function simplifyToCount(x: ArrayLike<number>, y: ArrayLike<number>, maxPoints: number): number[] {
  const count = x.length;
  if (count <= Math.max(2, maxPoints)) return Array.from({ length: count }, (_, index) => index);
  const before = Int32Array.from({ length: count }, (_, index) => index - 1);
  const after = Int32Array.from({ length: count }, (_, index) => index + 1);
  const areas = new Float64Array(count);
  const inner = Array.from({ length: count - 2 }, (_, index) => index + 1);
  for (const point of inner) areas[point] = triangle(x, y, point - 1, point, point + 1);
  const queue = new LightestFirst(areas, inner);
  const isGone = new Uint8Array(count);
  for (let left = count; left > Math.max(2, maxPoints); left -= 1) {
    const point = queue.take();
    if (point === undefined) break;
    isGone[point] = 1;
    const [from, to] = [itemAt(before, point), itemAt(after, point)];
    after[from] = to;
    before[to] = from;
    for (const neighbour of [from, to]) {
      if (neighbour === 0 || neighbour === count - 1) continue;
      const area = triangle(x, y, itemAt(before, neighbour), neighbour, itemAt(after, neighbour));
      // Never lighter than what went before: else a detail could outlive the whole that it is part of.
      areas[neighbour] = Math.max(area, itemAt(areas, point));
      queue.move(neighbour);
    }
  }
  return Array.from({ length: count }, (_, index) => index).filter((index) => isGone[index] === 0);
}
