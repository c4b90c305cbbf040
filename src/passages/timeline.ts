import { DAY_SECONDS } from "../bodies/constants.ts";
import type { Pair } from "../bodies/pair.ts";
import { pointLabel } from "../bodies/point.ts";
import type { Source, Span } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { type RangeFunction, rangeFunction } from "./range-function.ts";
import { type Extremum, scanExtrema } from "./scan-extrema.ts";

/** A source at work for a pair: its distance function and the stretch of time in which it may be evaluated. */
export interface Supply {
  readonly source: Source;
  readonly range: RangeFunction;
  readonly span: Span;
}

/** An extremum and who supplied it. */
export interface SuppliedExtremum extends Extremum {
  readonly supply: Supply;
}

/** A stretch of time in which one source is the best. */
interface Piece {
  readonly supply: Supply;
  readonly from: number;
  readonly to: number;
}

/** Which extrema of a piece are kept: those with `from ≤ t < until`, wherever they lie against the piece's own ends. */
interface Kept {
  readonly from: number;
  readonly until: number;
}

/** The sources of a pair laid along time, the best one at each moment. */
export interface Timeline {
  readonly pair: Pair<string>;
  /** Stretches without a gap, in order. */
  readonly covered: readonly Span[];
  /** All supplies, the best first. */
  readonly supplies: readonly Supply[];
  /** Gives the supply that is best at a time, `null` in a gap. */
  supplyAt(tdb: number): Supply | null;
  /**
   * Gives the extrema one after the other within one covered stretch.
   * @param from  where to begin (inside `covered`); no extremum at or after it is missed, earlier ones may come first
   * @param until where the search may end; none before it is missed
   * @returns a function that gives the next extremum, `null` at the end
   */
  extremaFrom(from: number, until?: number): () => SuppliedExtremum | null;
}

/**
 * Lays the sources of a pair along time.
 *
 * Where two sources meet, their instants differ (the engine by hours), so a cut by time alone would lose a passage that
 * each puts on the other's side, or give it twice. Instead the better source's first extremum past the seam is paired
 * with the other source's nearest of the same kind, beyond the seam if need be; the other source's list ends (or
 * begins) next to that one. So a passage that both know comes from the better source, one that the other source puts
 * just across the seam is kept, and kinds go on alternating.
 *
 * @param pair    the pair
 * @param sources the sources, the best first
 * @throws ApsidaryError `not-supplied` where none supplies the pair
 */
export function timelineOf(pair: Pair<string>, sources: readonly Source[]): Timeline {
  const all = sources.flatMap((source) =>
    source.spans(pair).map((span): Supply => {
      const range = rangeFunction(source.motion(pair), `${source.title}, ${pair.name},`);
      return { source, range, span };
    }),
  );
  // A supply too short to hold an extremum cannot be paired at its seams; where another one covers it, that one serves.
  const supplies = all.filter(
    (supply) => !all.some((other) => reachesPast(other, supply)) || holdsExtremum(supply, pair),
  );
  if (supplies.length === 0) {
    const asked = sources.length === 1 ? (sources[0] as Source).title : "no source that is open";
    throw new ApsidaryError(
      "not-supplied",
      `${asked} ${sources.length === 1 ? "does not supply" : "supplies"} ${pair.name} ` +
        `(${pointLabel(pair.target)} about ${pointLabel(pair.centre)}). Open a kernel that has both points, or another source.`,
    );
  }
  const pieces = piecesOf(supplies);
  const covered = coveredBy(pieces);
  const kept = new Map<number, Kept>(); // worked out when a piece is first used
  const keptOf = (index: number): Kept => {
    let known = kept.get(index);
    if (!known) {
      known = { from: rightFrom(pair, pieces, index - 1), until: leftUntil(pair, pieces, index) };
      kept.set(index, known);
    }
    return known;
  };

  return {
    pair,
    covered,
    supplies,
    supplyAt: (tdb) => pieces.find((piece) => tdb >= piece.from && tdb <= piece.to)?.supply ?? null,
    extremaFrom(from, until = Infinity) {
      let index = pieces.findIndex((piece) => from <= piece.to);
      // A passage just after `from` may belong to the piece before it, whose source puts it past the seam.
      if (index > 0 && from < latestOf(pair, pieces, index - 1)) index--;
      let scan: (() => Extremum | null) | null = null;
      return () => {
        for (; index >= 0 && index < pieces.length; index++, scan = null) {
          const { supply, from: start } = pieces[index] as Piece;
          if (start - twinReach(pair) > until) return null;
          const keep = keptOf(index);
          if (keep.until > from) {
            scan ??= scanExtrema(supply.range, supply.span, pair, Math.max(from, keep.from), until);
            for (let found = scan(); found && found.tdb < keep.until; found = scan()) {
              if (found.tdb >= keep.from) return { kind: found.kind, tdb: found.tdb, supply };
            }
          }
          if (!joined(pieces, index)) return null;
        }
        return null;
      };
    },
  };
}

/** Cuts time at all ends of spans and gives each stretch to the first supply that covers it. */
function piecesOf(supplies: readonly Supply[]): Piece[] {
  const cuts = [...new Set(supplies.flatMap(({ span }) => [span.from, span.to]))].sort((a, b) => a - b);
  const pieces: Piece[] = [];
  for (let i = 0; i + 1 < cuts.length; i++) {
    const from = cuts[i] as number;
    const to = cuts[i + 1] as number;
    const supply = supplies.find(({ span }) => span.from <= from && to <= span.to);
    if (!supply) continue;
    const last = pieces.at(-1);
    if (last?.supply === supply && last.to === from) pieces[pieces.length - 1] = { supply, from: last.from, to };
    else pieces.push({ supply, from, to });
  }
  return pieces;
}

function joined(pieces: readonly Piece[], index: number): boolean {
  const left = pieces[index];
  const right = pieces[index + 1];
  return left !== undefined && right !== undefined && left.to === right.from;
}

function coveredBy(pieces: readonly Piece[]): Span[] {
  const covered: { from: number; to: number }[] = [];
  pieces.forEach((piece, index) => {
    if (joined(pieces, index - 1)) (covered.at(-1) as { to: number }).to = piece.to;
    else covered.push({ from: piece.from, to: piece.to });
  });
  return covered;
}

/** How far from a better source's extremum the other source's twin is sought, seconds: real sources differ by less, at most by months for Neptune. */
function twinReach(pair: Pair<string>): number {
  return Math.min(pair.halfPeriodSeconds / 2, TWO_YEARS);
}

const TWO_YEARS = 730 * DAY_SECONDS;

/** Whether the left one of two neighbouring pieces has the lesser source, which could have gone on. */
function leftGoesOn(left: Piece, right: Piece): boolean {
  return left.supply.span.to > right.from;
}

/** The end of a piece's list: its extrema before this are kept, those of the next piece follow. */
function leftUntil(pair: Pair<string>, pieces: readonly Piece[], index: number): number {
  const left = pieces[index];
  const right = pieces[index + 1];
  if (!left || !right || !joined(pieces, index)) return Infinity;
  const at = right.from;
  if (!leftGoesOn(left, right)) return at;
  const first = firstIn(right, pair);
  const twin = first && nearestOfKind(left.supply, pair, first);
  if (twin === null || twin <= at) return twin ?? at;
  const stray = extremaIn(left.supply, pair, at, twin - RESOLUTION);
  return stray.find((it) => it.tdb - at > strayReach(left.supply, pair, it))?.tdb ?? twin;
}

/** The beginning of the list of the piece after a seam: its extrema from here on are kept. */
function rightFrom(pair: Pair<string>, pieces: readonly Piece[], index: number): number {
  const left = pieces[index];
  const right = pieces[index + 1];
  if (!left || !right || !joined(pieces, index)) return -Infinity;
  const at = right.from;
  if (leftGoesOn(left, right)) return at;
  const last = lastIn(left, pair);
  const twin = last && nearestOfKind(right.supply, pair, last);
  if (twin === null || twin >= at) return twin === null ? at : twin + RESOLUTION;
  const stray = extremaIn(right.supply, pair, twin + RESOLUTION, at).reverse();
  return (stray.find((it) => at - it.tdb > strayReach(right.supply, pair, it))?.tdb ?? twin) + RESOLUTION;
}

/** A time by which a piece's own list has surely ended, told without a search of its source. */
function latestOf(pair: Pair<string>, pieces: readonly Piece[], index: number): number {
  const left = pieces[index];
  const right = pieces[index + 1];
  if (!left || !right || !joined(pieces, index)) return -Infinity;
  if (!leftGoesOn(left, right)) return right.from;
  const first = firstIn(right, pair);
  return first ? first.tdb + twinReach(pair) : right.from;
}

/**
 * Seconds by which the lesser source may have put an extremum on the wrong side of a seam: three of its half-widths.
 *
 * One that lies deeper in the better source's span without a twin there is the lesser source's own invention, as a slow planet's series
 * makes two extrema where there is none.
 */
function strayReach(supply: Supply, pair: Pair<string>, { tdb }: Extremum): number {
  const measures = new Float64Array(2);
  supply.range.measure(tdb, measures);
  return (3 * supply.source.accuracy(pair, tdb).rangeRateKmS) / Math.abs(measures[1] as number);
}

/** Seconds by which an instant is passed to leave it out; numbers of this size resolve 10⁻⁶ s. */
const RESOLUTION = 1e-5;

function holdsExtremum(supply: Supply, pair: Pair<string>): boolean {
  if (supply.span.to - supply.span.from > 2 * pair.halfPeriodSeconds) return true;
  return scanExtrema(supply.range, supply.span, pair, supply.span.from)() !== null;
}

function reachesPast(other: Supply, supply: Supply): boolean {
  return other !== supply && other.span.from <= supply.span.from && other.span.to >= supply.span.to;
}

function firstIn(piece: Piece, pair: Pair<string>): Extremum | null {
  const next = scanExtrema(piece.supply.range, piece.supply.span, pair, piece.from, piece.to);
  for (let found = next(); found && found.tdb <= piece.to; found = next()) if (found.tdb >= piece.from) return found;
  return null;
}

/** Searches in growing stretches before the piece's end, so that a long piece is not scanned whole for its last extremum. */
function lastIn(piece: Piece, pair: Pair<string>): Extremum | null {
  for (let reach = pair.halfPeriodSeconds; ; reach *= 2) {
    const from = Math.max(piece.from, piece.to - reach);
    const last = extremaIn(piece.supply, pair, from, piece.to).at(-1);
    if (last || from === piece.from) return last ?? null;
  }
}

/** A supply's extrema with `from ≤ t < to`. */
function extremaIn(supply: Supply, pair: Pair<string>, from: number, to: number): Extremum[] {
  const next = scanExtrema(supply.range, supply.span, pair, from, to);
  const list: Extremum[] = [];
  for (let found = next(); found && found.tdb < to; found = next()) if (found.tdb >= from) list.push(found);
  return list;
}

/** The instant of a supply's extremum of the same kind nearest to another source's, within `twinReach`; `null` where there is none. */
function nearestOfKind(supply: Supply, pair: Pair<string>, twin: Extremum): number | null {
  const reach = twinReach(pair);
  let nearest: number | null = null;
  for (const { kind, tdb } of extremaIn(supply, pair, twin.tdb - reach, twin.tdb + reach)) {
    if (kind !== twin.kind) continue;
    if (nearest === null || Math.abs(tdb - twin.tdb) < Math.abs(nearest - twin.tdb)) nearest = tdb;
  }
  return nearest;
}
