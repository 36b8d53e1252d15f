/**
 * The cheapest arborescence on a complete directed graph: every node but the root gets exactly one arc in, and all hang from the root
 * (Chu and Liu 1965, Edmonds 1967; dense form in O(n²) by growing a path against the arcs and contracting rings, after Tarjan 1977; from memory).
 * Made once for a size and used again for many costs, so nothing is allocated in the ascent's loop.
 */
export interface ArborescenceFinder {
  /**
   * @param cost row-major n × n, cost[from · n + to], finite; the diagonal is not read
   * @param parentOf filled with the node each node's arc comes from; −1 for the root
   * @returns the arborescence's cost
   */
  find(cost: Float64Array, parentOf: Int32Array): number;
  /**
   * After `find` with the same costs: fills `added[from · n + to]` with a lower bound on what forcing that arc in adds to the cost, from the
   * dual prices of Edmonds' method (0 for arcs of the answer; arcs into the root are left alone).
   */
  priceArcs(cost: Float64Array, added: Float64Array): void;
}

/** @param n nodes, 2 or more @param root the node everything hangs from */
export function makeArborescenceFinder(n: number, root: number): ArborescenceFinder {
  const most = 2 * n;
  // Between live (contracted) nodes: cheapest arc w → v as weight[v][w], and the arc it stands for (from · n + to).
  const weight = Array.from({ length: most }, () => new Float64Array(most));
  const arc = Array.from({ length: most }, () => new Int32Array(most));
  const holder = new Int32Array(most);
  const chosen = new Int32Array(most);
  const chosenWeight = new Float64Array(most);
  const isLive = new Uint8Array(most);
  const place = new Int32Array(most);
  const path = new Int32Array(most);
  const live = new Int32Array(n);
  const members: number[][] = Array.from({ length: most }, () => []);

  function find(cost: Float64Array, parentOf: Int32Array): number {
    let liveCount = n;
    for (let v = 0; v < n; v += 1) {
      const into = weight[v]!;
      const arcs = arc[v]!;
      for (let w = 0; w < n; w += 1) {
        into[w] = cost[w * n + v]!;
        arcs[w] = w * n + v;
      }
      live[v] = v;
    }
    holder.fill(-1);
    isLive.fill(0);
    isLive.fill(1, 0, n);
    place.fill(-1);
    // place: −1 not looked at, −2 settled (hangs from the root by chosen arcs), else its step on the path.
    place[root] = -2;
    let made = n;
    let total = 0;
    for (let s = 0; s < n; s += 1) {
      let node = s;
      while (holder[node] !== -1) node = holder[node]!;
      if (place[node] === -2) continue;
      let length = 0;
      for (;;) {
        place[node] = length;
        path[length++] = node;
        const into = weight[node]!;
        let best = -1;
        let least = Infinity;
        for (let k = 0; k < liveCount; k += 1) {
          const w = live[k]!;
          if (w !== node && into[w]! < least) {
            least = into[w]!;
            best = w;
          }
        }
        total += least;
        chosen[node] = arc[node]![best]!;
        chosenWeight[node] = least;
        if (place[best] === -1) {
          node = best;
          continue;
        }
        if (place[best] === -2) break;
        // A ring: path[place[best]…]. Contract it; arcs into it now cost what they add over the arc they would replace.
        const first = place[best]!;
        const ring = made++;
        const inside = members[ring]!;
        inside.length = 0;
        for (let k = first; k < length; k += 1) inside.push(path[k]!);
        for (const member of inside) {
          holder[member] = ring;
          isLive[member] = 0;
        }
        let kept = 0;
        for (let k = 0; k < liveCount; k += 1) if (isLive[live[k]!]) live[kept++] = live[k]!;
        const intoRing = weight[ring]!;
        const arcsIntoRing = arc[ring]!;
        for (let k = 0; k < kept; k += 1) {
          const w = live[k]!;
          const intoW = weight[w]!;
          let cheapest = Infinity;
          let by = 0;
          let cheapestOut = Infinity;
          let byOut = 0;
          for (const member of inside) {
            const enters = weight[member]![w]! - chosenWeight[member]!;
            if (enters < cheapest) {
              cheapest = enters;
              by = arc[member]![w]!;
            }
            if (intoW[member]! < cheapestOut) {
              cheapestOut = intoW[member]!;
              byOut = arc[w]![member]!;
            }
          }
          intoRing[w] = cheapest;
          arcsIntoRing[w] = by;
          intoW[ring] = cheapestOut;
          arc[w]![ring] = byOut;
        }
        live[kept++] = ring;
        liveCount = kept;
        isLive[ring] = 1;
        length = first;
        node = ring;
      }
      for (let k = 0; k < length; k += 1) place[path[k]!] = -2;
    }
    // Take the rings apart, outermost first: the arc that enters a ring replaces the one its target had inside.
    for (let ring = made - 1; ring >= n; ring -= 1) {
      const entering = chosen[ring]!;
      let target = entering % n;
      while (holder[target] !== ring) target = holder[target]!;
      chosen[target] = entering;
    }
    for (let v = 0; v < n; v += 1) parentOf[v] = v === root ? -1 : Math.floor(chosen[v]! / n);
    return total;
  }

  function priceArcs(cost: Float64Array, added: Float64Array): void {
    const above = new Uint8Array(most);
    for (let from = 0; from < n; from += 1) {
      for (let ring = from; ring !== -1; ring = holder[ring]!) above[ring] = 1;
      for (let to = 0; to < n; to += 1) {
        if (to === from || to === root) continue;
        let rest = cost[from * n + to]!;
        for (let ring = to; ring !== -1 && above[ring] === 0; ring = holder[ring]!) rest -= chosenWeight[ring]!;
        added[from * n + to] = rest;
      }
      for (let ring = from; ring !== -1; ring = holder[ring]!) above[ring] = 0;
    }
  }
  return { find, priceArcs };
}
