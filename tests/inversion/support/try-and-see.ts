/** A function to be made small by trying, within bounds; only the free coordinates move. */
export interface Search {
  of: (x: readonly number[]) => number;
  free: readonly number[];
  lower: readonly number[];
  upper: readonly number[];
}

export interface Found {
  x: readonly number[];
  value: number;
}

const MOST_ROUNDS = 400;
const CLOSE = 1e-5;

function within({ lower, upper }: Search, x: readonly number[]): number[] {
  return x.map((value, k) => Math.min(Math.max(value, lower[k]!), upper[k]!));
}

/** J. A. Nelder and R. Mead, Comput. J. 7, 308 (1965), with points outside the bounds put on them. */
export function nelderMead(
  search: Search,
  start: readonly number[],
  step: readonly number[],
): Found {
  const at = (x: readonly number[]): Found => {
    const inside = within(search, x);
    return { x: inside, value: search.of(inside) };
  };
  const simplex = [at(start)];
  for (const k of search.free) {
    const up = start[k]! + step[k]! <= search.upper[k]!;
    simplex.push(at(start.map((value, l) => (l === k ? value + (up ? 1 : -1) * step[k]! : value))));
  }
  const m = search.free.length;
  for (let round = 0; round < MOST_ROUNDS && m > 0; round++) {
    simplex.sort((a, b) => a.value - b.value);
    const worst = simplex[m]!;
    if (worst.value - simplex[0]!.value < CLOSE) break;
    const middle = worst.x.map((_, k) => {
      let sum = 0;
      for (let p = 0; p < m; p++) sum += simplex[p]!.x[k]!;
      return sum / m;
    });
    const along = (t: number): Found =>
      at(middle.map((value, k) => value + t * (worst.x[k]! - value)));
    const mirrored = along(-1);
    if (mirrored.value < simplex[0]!.value) {
      const further = along(-2);
      simplex[m] = further.value < mirrored.value ? further : mirrored;
    } else if (mirrored.value < simplex[m - 1]!.value) {
      simplex[m] = mirrored;
    } else {
      const nearer = along(mirrored.value < worst.value ? -0.5 : 0.5);
      if (nearer.value < Math.min(worst.value, mirrored.value)) simplex[m] = nearer;
      else {
        const best = simplex[0]!;
        for (let p = 1; p <= m; p++)
          simplex[p] = at(best.x.map((value, k) => (value + simplex[p]!.x[k]!) / 2));
      }
    }
  }
  return simplex.reduce((a, b) => (b.value < a.value ? b : a));
}

/** R. Hooke and T. A. Jeeves, J. ACM 8, 212 (1961), without the pattern moves: steps along each axis, halved when none helps. */
export function patternSearch(search: Search, start: Found, step: readonly number[]): Found {
  let best = start;
  for (let halving = 0; halving < 14; halving++) {
    for (let moved = true, tries = 0; moved && tries < 30; tries++) {
      moved = false;
      for (const k of search.free) {
        for (const sign of [-1, 1]) {
          const x = within(
            search,
            best.x.map((value, l) => (l === k ? value + (sign * step[k]!) / 2 ** halving : value)),
          );
          const value = search.of(x);
          if (!(value < best.value)) continue;
          best = { x, value };
          moved = true;
          break;
        }
      }
    }
  }
  return best;
}
