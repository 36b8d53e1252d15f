/** Room for rounding in the last digits: far below any figure on a bench, so that a level equal to its limit counts as equal. */
function slack(a: number, b: number): number {
  return 1e-12 * Math.max(Math.abs(a), Math.abs(b)) + 1e-15;
}

export function isAbove(a: number, b: number): boolean {
  return a > b + slack(a, b);
}

export function isBelow(a: number, b: number): boolean {
  return isAbove(b, a);
}

export function isAtOrAbove(a: number, b: number): boolean {
  return !isBelow(a, b);
}
