export interface OrderRequest {
  /** Song ids in the performer's own order; ties keep it. */
  songs: string[];
  /** Seconds to set up each song as the opener. */
  setupS: Record<string, number>;
  /** Seconds from song (row) to song (column), in the order of `songs`; the diagonal is not read. */
  changeoverS: number[][];
  /** Position of a song, counted from 0. */
  pinned?: Record<string, number> | undefined;
  /** [a, b]: b comes right after a. */
  together?: [string, string][] | undefined;
  /** [a, b]: never neighbours, in either order. */
  apart?: [string, string][] | undefined;
}

export interface SetOrder {
  order: string[];
  /** Set-up of the first song and the changeovers between neighbours. */
  totalS: number;
  /** No order that keeps the constraints takes less. */
  lowerBoundS: number;
  provenOptimal: boolean;
}

export type OrderOutcome =
  | ({ ok: true } & SetOrder)
  /** `conflicts`: sentences that name constraints which cannot all hold. `undecided`: none was proved, but no order was found either. */
  | { ok: false; conflicts: string[]; undecided: boolean };

export interface OrderProgress {
  bestS: number;
  lowerBoundS: number;
  /** 0…1 of the effort allowed. */
  done: number;
}

export interface OrderOptions {
  /** A clock in milliseconds, if the search is to stop by time. */
  now?: (() => number) | undefined;
  /** Milliseconds a search beyond the exact method may take; wants `now`. */
  budgetMs?: number | undefined;
  /** Rounds of search beyond the exact method, the limit where there is no clock; default 60. */
  rounds?: number | undefined;
  /** Seed of the search's random source; default 1. The same seed and rounds give the same order. */
  seed?: number | undefined;
  shouldStop?: (() => boolean) | undefined;
  onProgress?: ((progress: OrderProgress) => void) | undefined;
}
