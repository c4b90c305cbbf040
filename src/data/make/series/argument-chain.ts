/** An argument to be reached: its rates, and how far its phase may be off (rad) at the greatest T. */
export interface Wanted {
  readonly rates: readonly number[];
  readonly tolerance: number;
}

/** A point of the chain: a base, or `first ± second` of two earlier points. Point 0 is the argument nought. */
export type Point =
  | { readonly rates: readonly number[] }
  | { readonly first: number; readonly second: number; readonly sign: 1 | -1 };

interface Reached {
  readonly rates: readonly number[];
  readonly from: { readonly first: number; readonly second: number; readonly sign: 1 | -1 } | null;
}

/**
 * Writes many arguments as sums and differences of few, so that one complex product gives the sine and cosine of each.
 *
 * Multiples of the seeds are laid out first; then each argument is sought as the sum or difference of two points
 * already there, over and over; where nothing more is found, the one that stands first becomes a base of its own. The
 * arguments of planetary theories are integer combinations of a dozen mean longitudes, so few are left to that.
 *
 * @param wanted  arguments, the most important first
 * @param seeds   rates that most are made of, and the highest multiple to lay out
 * @param reach   greatest |T|
 * @returns the points that are needed, and for each argument the place of its point
 */
export function argumentChain(
  wanted: readonly Wanted[],
  seeds: readonly { readonly rates: readonly number[]; readonly multiples: number }[],
  reach: number,
): { readonly points: readonly Point[]; readonly places: readonly number[] } {
  const cell = 1e-6;
  const reached: Reached[] = [];
  const cells = new Map<number, number[]>();
  const put = (rates: readonly number[], from: Reached["from"]): number => {
    const place = reached.push({ rates, from }) - 1;
    const key = Math.round((rates[0] ?? 0) / cell);
    cells.set(key, [...(cells.get(key) ?? []), place]);
    return place;
  };
  const look = (rates: readonly number[], tolerance: number): number => {
    let best = -1;
    let least = tolerance;
    const key = Math.round((rates[0] ?? 0) / cell);
    for (let k = key - 1; k <= key + 1; k++) {
      for (const place of cells.get(k) ?? []) {
        const gap = phaseGap((reached[place] as Reached).rates, rates, reach);
        if (gap < least) {
          least = gap;
          best = place;
        }
      }
    }
    return best;
  };
  const join = (first: number, second: number, sign: 1 | -1): number => {
    const a = (reached[first] as Reached).rates;
    const b = (reached[second] as Reached).rates;
    return put(
      a.map((rate, k) => rate + sign * (b[k] ?? 0)),
      { first, second, sign },
    );
  };
  /** Seeks `rates` as the sum or difference of two points, the first of which stands at `start` or later. */
  const seek = ({ rates, tolerance }: Wanted, start: number): number => {
    const there = look(rates, tolerance);
    if (there >= 0) return there;
    for (let p = start; p < reached.length; p++) {
      const known = (reached[p] as Reached).rates;
      const rest = rates.map((rate, k) => rate - (known[k] ?? 0));
      const up = (rest[0] ?? 0) >= 0;
      const q = look(up ? rest : rest.map((rate) => -rate), tolerance);
      if (q >= 0) return join(p, q, up ? 1 : -1);
      const sum = look(
        rates.map((rate, k) => rate + (known[k] ?? 0)),
        tolerance,
      );
      if (sum >= 0) return join(sum, p, -1);
    }
    return -1;
  };

  put(wanted[0]?.rates.map(() => 0) ?? [0], null);
  for (const { rates, multiples } of seeds) {
    const one = put(rates, null);
    for (let k = 2, last = one; k <= multiples; k++) last = join(last, one, 1);
  }
  const places = new Array<number>(wanted.length).fill(-1);
  let start = 0;
  for (;;) {
    for (let found = true; found; ) {
      found = false;
      for (const [i, want] of wanted.entries()) {
        if (places[i] !== -1) continue;
        places[i] = seek(want, start);
        if (places[i] !== -1) found = true;
      }
    }
    const next = places.indexOf(-1);
    if (next < 0) break;
    start = put((wanted[next] as Wanted).rates, null); // older pairs were tried in vain: only sums with new points can help
    places[next] = start;
  }
  return pruned(reached, places);
}

/** How far two arguments may part for |T| ≤ reach, rad. */
function phaseGap(a: readonly number[], b: readonly number[], reach: number): number {
  let gap = 0;
  let power = 1;
  for (let k = 0; k < a.length; k++) {
    power *= reach;
    gap += Math.abs((a[k] ?? 0) - (b[k] ?? 0)) * power;
  }
  return gap;
}

/**
 * Drops points that nothing needs, puts the bases before the sums and the sums in order of their depth: neighbours
 * then do not wait for each other when they are computed.
 */
function pruned(reached: readonly Reached[], places: readonly number[]) {
  const needed = new Set([0, ...places]);
  for (let i = reached.length - 1; i >= 0; i--) {
    const from = reached[i]?.from;
    if (!needed.has(i) || !from) continue;
    needed.add(from.first);
    needed.add(from.second);
  }
  const kept = [...reached.keys()].filter((i) => needed.has(i));
  const depths: number[] = [];
  for (const { from } of reached) {
    depths.push(from ? 1 + Math.max(depths[from.first] ?? 0, depths[from.second] ?? 0) : 0);
  }
  const order = kept.sort((a, b) => (depths[a] ?? 0) - (depths[b] ?? 0) || a - b);
  const renamed = new Map(order.map((old, now) => [old, now]));
  const at = (old: number) => renamed.get(old) as number;
  const points = order.map((i): Point => {
    const { rates, from } = reached[i] as Reached;
    return from ? { first: at(from.first), second: at(from.second), sign: from.sign } : { rates };
  });
  return { points, places: places.map(at) };
}
