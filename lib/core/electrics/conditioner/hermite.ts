/** Cubic through two values with two slopes, at the share 0…1 of the way. */
export function hermite(v0: number, d0: number, v1: number, d1: number, h: number, share: number): number {
  const rest = 1 - share;
  return rest * rest * ((1 + 2 * share) * v0 + share * h * d0) + share * share * ((3 - 2 * share) * v1 - rest * h * d1);
}

/** Where on the way the cubic turns, where its slopes at the ends differ in sign; 0…1. */
export function turnOf(v0: number, d0: number, v1: number, d1: number, h: number): number {
  const a = 3 * (2 * (v0 - v1) + h * (d0 + d1));
  const b = 2 * (3 * (v1 - v0) - h * (2 * d0 + d1));
  const c = h * d0;
  if (Math.abs(a) < 1e-12 * Math.abs(b)) return clamp(-c / b);
  const root = Math.sqrt(Math.max(0, b * b - 4 * a * c));
  const q = -0.5 * (b + (b < 0 ? -root : root));
  const first = q / a;
  return first >= 0 && first <= 1 ? first : clamp(c / q);
}

/** Where on the way the cubic meets a level that lies between its ends; 0…1. */
export function meetingOf(v0: number, d0: number, v1: number, d1: number, h: number, level: number): number {
  let low = 0;
  let high = 1;
  const rising = v1 > v0;
  let share = (level - v0) / (v1 - v0);
  for (let i = 0; i < 12; i += 1) {
    const off = hermite(v0, d0, v1, d1, h, share) - level;
    if (off > 0 === rising) high = share;
    else low = share;
    const near = share + 1e-6;
    const slope = (hermite(v0, d0, v1, d1, h, near) - level - off) * 1e6;
    const next = share - off / slope;
    if (Math.abs(next - share) < 1e-6) return clamp(next);
    share = next > low && next < high ? next : (low + high) / 2;
  }
  return share;
}

function clamp(share: number): number {
  return share > 0 ? (share < 1 ? share : 1) : 0;
}
