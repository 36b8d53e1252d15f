/**
 * The cheapest way to give every row a column of its own: shortest augmenting paths with potentials
 * (the Hungarian method; Kuhn 1955, in the O(rows² · columns) form of Jonker and Volgenant 1987; from memory).
 * Ties are settled by row and column order, so the same table always gives the same answer.
 * @param rows number of rows, 0 or more
 * @param columns number of columns, at least `rows`
 * @param cost row-major, finite; exact where all sums stay whole numbers below 2^53
 * @returns the column of each row
 * @throws RangeError when there are fewer columns than rows or the table has the wrong size
 */
export function solveAssignment(rows: number, columns: number, cost: Float64Array): Int32Array {
  if (columns < rows || cost.length !== rows * columns) {
    throw new RangeError(`an assignment needs columns ≥ rows and ${rows} × ${columns} costs, got ${cost.length}`);
  }
  const rowPrice = new Float64Array(rows + 1);
  const columnPrice = new Float64Array(columns + 1);
  const rowOf = new Int32Array(columns + 1);
  const cameFrom = new Int32Array(columns + 1);
  const slack = new Float64Array(columns + 1);
  const isDone = new Uint8Array(columns + 1);
  for (let row = 1; row <= rows; row += 1) {
    rowOf[0] = row;
    slack.fill(Infinity);
    isDone.fill(0);
    let column = 0;
    do {
      isDone[column] = 1;
      const here = rowOf[column]!;
      const base = (here - 1) * columns - 1;
      const price = rowPrice[here]!;
      let step = Infinity;
      let next = 0;
      for (let j = 1; j <= columns; j += 1) {
        if (isDone[j]) continue;
        const reduced = cost[base + j]! - price - columnPrice[j]!;
        if (reduced < slack[j]!) {
          slack[j] = reduced;
          cameFrom[j] = column;
        }
        if (slack[j]! < step) {
          step = slack[j]!;
          next = j;
        }
      }
      for (let j = 0; j <= columns; j += 1) {
        if (isDone[j]) {
          rowPrice[rowOf[j]!]! += step;
          columnPrice[j]! -= step;
        } else slack[j]! -= step;
      }
      column = next;
    } while (rowOf[column] !== 0);
    while (column !== 0) {
      const before = cameFrom[column]!;
      rowOf[column] = rowOf[before]!;
      column = before;
    }
  }
  const columnOf = new Int32Array(rows);
  for (let j = 1; j <= columns; j += 1) if (rowOf[j]! > 0) columnOf[rowOf[j]! - 1] = j - 1;
  return columnOf;
}
