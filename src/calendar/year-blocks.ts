import type { PairName } from "../bodies/pair.ts";
import type { CalendarRow } from "./calendar-row.ts";

/** The rows of one pair in one year, in order of time. */
export interface YearBlock {
  /** As ISO 8601 writes it. */
  readonly year: string;
  readonly pair: PairName;
  readonly rows: readonly CalendarRow[];
}

/** The order of blocks; what is not named comes after, in the order in which it first passes. */
const ORDER: readonly PairName[] = ["earth-sun", "moon-earth"];

/**
 * Parts rows into blocks, year by year and in a year body by body; one year at a time is in memory.
 *
 * @param rows in order of time
 */
export function* yearBlocks(rows: Iterable<CalendarRow>): Generator<YearBlock, void, undefined> {
  let year = "";
  let blocks = new Map<PairName, CalendarRow[]>();
  for (const row of rows) {
    const own = row.local.slice(0, row.local.indexOf("-", 1));
    if (own !== year) {
      yield* ordered(year, blocks);
      year = own;
      blocks = new Map();
    }
    const block = blocks.get(row.pair);
    if (block) block.push(row);
    else blocks.set(row.pair, [row]);
  }
  yield* ordered(year, blocks);
}

function* ordered(year: string, blocks: ReadonlyMap<PairName, CalendarRow[]>): Generator<YearBlock, void, undefined> {
  const pairs = [...blocks.keys()];
  const place = (pair: PairName) => (ORDER.includes(pair) ? ORDER.indexOf(pair) : ORDER.length + pairs.indexOf(pair));
  for (const pair of pairs.sort((a, b) => place(a) - place(b))) yield { year, pair, rows: blocks.get(pair) ?? [] };
}
