/**
 * The sliding wedge in front of a leaning stake by plain search over its angle: the independent check of lean.ts, which
 * has the minimum in closed form. Level or falling ground, smooth face, per metre of width, N.
 * P(β) = min over ρ of [W·sin(ρ+φ) + c·ℓ·cosφ]/cos(ρ+φ−β).
 */
export function wedgePush(input: {
  readonly phiDeg: number;
  readonly unitWeight: number;
  readonly cohesion: number;
  readonly length: number;
  readonly leanDeg: number;
  readonly slopeDeg: number;
}): number {
  const rad = Math.PI / 180;
  const phi = input.phiDeg * rad;
  const beta = input.leanDeg * rad;
  const omega = input.slopeDeg * rad;
  const height = input.length * (Math.cos(beta) - Math.sin(beta) * Math.tan(omega));
  let least = Infinity;
  for (let step = 1; step < 20_000; step += 1) {
    const rho = -omega + (step / 20_000) * (Math.PI / 2 + omega);
    const across = Math.cos(rho + phi - beta);
    const reach = height / (Math.tan(rho) + Math.tan(omega));
    if (across <= 1e-3 || reach <= 0) continue;
    const weight = 0.5 * input.unitWeight * height * (input.length * Math.sin(beta) + reach);
    const push = (weight * Math.sin(rho + phi) + ((input.cohesion * reach) / Math.cos(rho)) * Math.cos(phi)) / across;
    if (push > 0) least = Math.min(least, push);
  }
  return least;
}
