/** Something whose entries can be visited: a stamped kernel matrix. */
export interface EntrySource {
  forEachEntry(visit: (row: number, column: number, re: number, im: number) => void): void;
}

/**
 * P·A·Q = L·U of a general sparse complex matrix with partial pivoting, left-looking.
 *
 * For each column k: x = L⁻¹·A(:, Q(k)) on the rows reached, the pivot is the largest |x| among the rows
 * not yet pivotal. Gilbert and Peierls, SIAM J. Sci. Stat. Comput. 9 (1988) 862; T. A. Davis, Direct
 * Methods for Sparse Linear Systems, SIAM 2006, §6.2. Built afresh and allocating: the net under the
 * kernels without pivoting, and their oracle, not a hot path. Repeated entries add up.
 */
export class PivotedLu {
  readonly size: number;
  readonly status: 'factored' | 'singular';
  private readonly lower: Column[] = []; // rows as original row numbers, unit diagonal left out
  private readonly upper: Column[] = []; // rows as pivot numbers, diagonal left out
  private readonly pivotRow: Int32Array; // original row of each pivot
  private readonly columnOrder: Int32Array; // Q
  private readonly pivot: Float64Array; // U_kk, interleaved

  /** `order`: column order Q, e.g. the elimination order of the plan; natural when absent. */
  constructor(size: number, source: EntrySource, order?: Int32Array) {
    this.size = size;
    this.columnOrder = order ?? Int32Array.from({ length: size }, (_, k) => k);
    this.pivotRow = new Int32Array(size);
    this.pivot = new Float64Array(2 * size);
    this.status = this.factor(gatherColumns(size, source));
  }

  private factor(columns: Column[]): 'factored' | 'singular' {
    const n = this.size;
    const pivotOf = new Int32Array(n).fill(-1); // pivot number of an original row
    const x = new Float64Array(2 * n);
    const marked = new Int32Array(n).fill(-1);
    for (let k = 0; k < n; k++) {
      const column = columns[this.columnOrder[k]!]!;
      const reached = this.reach(column, pivotOf, marked, k);
      for (const row of reached) x[2 * row] = x[2 * row + 1] = 0;
      for (let e = 0; e < column.rows.length; e++) {
        const row = column.rows[e]!;
        x[2 * row] = x[2 * row]! + column.re[e]!;
        x[2 * row + 1] = x[2 * row + 1]! + column.im[e]!;
      }
      const upper = this.eliminate(reached, pivotOf, x);
      const row = largest(reached, pivotOf, x);
      if (row < 0) return 'singular';
      this.upper.push(upper);
      this.lower.push(this.divide(reached, pivotOf, x, row, k));
      pivotOf[row] = k;
      this.pivotRow[k] = row;
    }
    return 'factored';
  }

  /** Rows that become non-zero in L⁻¹·a, in topological order (depth-first, reversed). */
  private reach(column: Column, pivotOf: Int32Array, marked: Int32Array, k: number): number[] {
    const finished: number[] = [];
    const stack: number[] = [];
    const next: number[] = [];
    for (const start of column.rows) {
      if (marked[start] === k) continue;
      marked[start] = k;
      stack.push(start);
      next.push(0);
      while (stack.length > 0) {
        const row = stack[stack.length - 1]!;
        const below = pivotOf[row]! < 0 ? undefined : this.lower[pivotOf[row]!]!.rows;
        let e = next[next.length - 1]!;
        while (below && e < below.length && marked[below[e]!] === k) e++;
        if (below && e < below.length) {
          next[next.length - 1] = e + 1;
          marked[below[e]!] = k;
          stack.push(below[e]!);
          next.push(0);
        } else {
          finished.push(row);
          stack.pop();
          next.pop();
        }
      }
    }
    return finished.reverse();
  }

  /** x ← L⁻¹·x over the reached rows; the pivotal ones are the column of U. */
  private eliminate(reached: number[], pivotOf: Int32Array, x: Float64Array): Column {
    const upper: Column = { rows: [], re: [], im: [] };
    for (const row of reached) {
      const j = pivotOf[row]!;
      if (j < 0) continue;
      const re = x[2 * row]!;
      const im = x[2 * row + 1]!;
      push(upper, j, re, im);
      subtract(this.lower[j]!, re, im, x);
    }
    return upper;
  }

  private divide(
    reached: number[],
    pivotOf: Int32Array,
    x: Float64Array,
    pivotRow: number,
    k: number,
  ): Column {
    const re = x[2 * pivotRow]!;
    const im = x[2 * pivotRow + 1]!;
    this.pivot[2 * k] = re;
    this.pivot[2 * k + 1] = im;
    const scale = 1 / (re * re + im * im);
    const lower: Column = { rows: [], re: [], im: [] };
    for (const row of reached) {
      if (pivotOf[row]! >= 0 || row === pivotRow) continue;
      const a = x[2 * row]!;
      const b = x[2 * row + 1]!;
      push(lower, row, (a * re + b * im) * scale, (b * re - a * im) * scale);
    }
    return lower;
  }

  /** x ← A⁻¹·x, interleaved complex; RangeError when the factor is singular. */
  solve(x: Float64Array, count = 1): void {
    if (this.status === 'singular') throw new RangeError('a singular factor cannot solve');
    for (let c = 0; c < count; c++) this.solveOne(x.subarray(2 * this.size * c, 2 * this.size * (c + 1)));
  }

  private solveOne(x: Float64Array): void {
    const n = this.size;
    const y = new Float64Array(2 * n);
    for (let k = 0; k < n; k++) {
      const row = this.pivotRow[k]!;
      y[2 * k] = x[2 * row]!;
      y[2 * k + 1] = x[2 * row + 1]!;
      subtract(this.lower[k]!, y[2 * k]!, y[2 * k + 1]!, x);
    }
    for (let k = n - 1; k >= 0; k--) {
      const re = this.pivot[2 * k]!;
      const im = this.pivot[2 * k + 1]!;
      const scale = 1 / (re * re + im * im);
      const a = (y[2 * k]! * re + y[2 * k + 1]! * im) * scale;
      const b = (y[2 * k + 1]! * re - y[2 * k]! * im) * scale;
      subtract(this.upper[k]!, a, b, y);
      x[2 * this.columnOrder[k]!] = a;
      x[2 * this.columnOrder[k]! + 1] = b;
    }
  }
}

interface Column {
  rows: number[];
  re: number[];
  im: number[];
}

function push(column: Column, row: number, re: number, im: number): void {
  column.rows.push(row);
  column.re.push(re);
  column.im.push(im);
}

/** x ← x − column·(re + j·im). */
function subtract(column: Column, re: number, im: number, x: Float64Array): void {
  for (let e = 0; e < column.rows.length; e++) {
    const row = column.rows[e]!;
    const a = column.re[e]!;
    const b = column.im[e]!;
    x[2 * row] = x[2 * row]! - (a * re - b * im);
    x[2 * row + 1] = x[2 * row + 1]! - (a * im + b * re);
  }
}

/** The not yet pivotal row with the largest |x|; −1 when all are zero or one is not finite. */
function largest(reached: number[], pivotOf: Int32Array, x: Float64Array): number {
  let best = -1;
  let size = 0;
  for (const row of reached) {
    if (pivotOf[row]! >= 0) continue;
    const s = Math.hypot(x[2 * row]!, x[2 * row + 1]!);
    if (!Number.isFinite(s)) return -1;
    if (s > size) {
      size = s;
      best = row;
    }
  }
  return best;
}

function gatherColumns(size: number, source: EntrySource): Column[] {
  const columns = Array.from({ length: size }, (): Column => ({ rows: [], re: [], im: [] }));
  source.forEachEntry((row, column, re, im) => {
    if (re !== 0 || im !== 0) push(columns[column]!, row, re, im);
  });
  return columns;
}
