interface Window {
  startedMs: number;
  count: number;
}

const windows = new Map<string, Window>();
const MOST_KEYS = 50_000;

/** Counts one call under a key in a fixed window; says whether it may go on, and after how many seconds it may. */
export function takeTurn(key: string, most: number, windowS: number, nowMs: number = Date.now()): { allowed: boolean; retryAfterS: number } {
  if (windows.size > MOST_KEYS) windows.clear();
  const current = windows.get(key);
  if (!current || nowMs - current.startedMs >= windowS * 1000) {
    windows.set(key, { startedMs: nowMs, count: 1 });
    return { allowed: true, retryAfterS: 0 };
  }
  current.count += 1;
  const retryAfterS = Math.max(1, Math.ceil((current.startedMs + windowS * 1000 - nowMs) / 1000));
  return { allowed: current.count <= most, retryAfterS };
}

/** Begins a key's window anew: the turns so far were honest ones. */
export function forgetTurns(key: string): void {
  windows.delete(key);
}
