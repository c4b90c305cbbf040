import { type PairName, pairOf } from "../bodies/pair.ts";
import type { ApsisKind } from "../bodies/term.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { nextPassage, previousPassage } from "../passages/next-passage.ts";
import type { Passage } from "../passages/passage.ts";
import { type SourceChoice, timelineFor } from "../passages/timeline-for.ts";
import { rounded } from "../report/rounded.ts";

/** The same passage, reckoned between other centres. Frozen; rounded to 1 ms, 1 m and 1e-7 h; `null` where the sources end before it. */
export interface CentrePassage {
  readonly pair: PairName;
  /** TDB seconds past J2000. */
  readonly tdbSeconds: number | null;
  readonly distanceKm: number | null;
  /** How much later than the first pair's passage. */
  readonly laterHours: number | null;
  /** How much farther than at the first pair's passage. */
  readonly fartherKm: number | null;
  readonly timeUncertaintySeconds: number | null;
  /** Id of the source. */
  readonly source: string | null;
}

const EARTH_PAIRS: readonly PairName[] = ["earth-sun", "emb-sun", "earth-ssb", "emb-ssb"];

/**
 * Gives a passage about each of the centres that it might be meant for.
 *
 * For the Earth four: its own centre and the barycentre of the Earth and the Moon, about the Sun's centre and about the barycentre of the
 * solar system. For another planet two: about the Sun's centre and about the barycentre of the solar system.
 *
 * @param ephemeris what `openSources` gave
 * @param passage   a passage that it gave, of any of these pairs
 * @param choice    which sources may serve
 * @returns the pairs in that order, each with the principal passage of the same kind nearest to the given one
 * @throws ApsidaryError `bad-pair` for a pair that has no other centre
 */
export function compareCentres(
  ephemeris: Ephemeris,
  passage: Passage,
  choice: SourceChoice = "auto",
): readonly CentrePassage[] {
  const found = centresOf(passage.pair).map((pair) => ({
    pair,
    passage: pair === passage.pair ? passage : nearest(ephemeris, pair, passage.kind, passage.tdbSeconds, choice),
  }));
  const first = found[0]?.passage ?? null;
  return Object.freeze(
    found.map(({ pair, passage: at }) =>
      Object.freeze({
        pair,
        tdbSeconds: at && rounded(at.tdbSeconds, 3),
        distanceKm: at && rounded(at.distanceKm, 3),
        laterHours: at && first && rounded((at.tdbSeconds - first.tdbSeconds) / 3600, 7),
        fartherKm: at && first && rounded(at.distanceKm - first.distanceKm, 3),
        timeUncertaintySeconds: at && Math.ceil(at.timeUncertaintySeconds * 1e3) / 1e3,
        source: at ? at.source : null,
      }),
    ),
  );
}

function centresOf(pair: PairName): readonly PairName[] {
  const [body = "", centre] = pair.split("-");
  if (EARTH_PAIRS.includes(pair)) return EARTH_PAIRS;
  if (centre === "sun" || centre === "ssb") return [`${body}-sun`, `${body}-ssb`] as PairName[];
  throw new ApsidaryError(
    "bad-pair",
    `centres are compared for the Earth and the planets (the Sun's centre against the solar system's barycentre); ${pair} has one centre only.`,
  );
}

function nearest(
  ephemeris: Ephemeris,
  name: PairName,
  kind: ApsisKind,
  tdb: number,
  source: SourceChoice,
): Passage | null {
  const pair = pairOf(name);
  const supplied = ephemeris.sources.some(
    (one) => (source === "auto" || one.kind === source) && one.spans(pair).length > 0,
  );
  if (!supplied || !timelineFor(ephemeris, pair, source).covered.some(({ from, to }) => from < tdb && tdb < to)) {
    return null;
  }
  const options = { source, rank: "principal" } as const;
  const before = previousPassage(ephemeris, pair, { tdbSeconds: tdb }, kind, options);
  const after = nextPassage(ephemeris, pair, { tdbSeconds: tdb }, kind, options);
  const within = [before, after].filter((one) => one && Math.abs(one.tdbSeconds - tdb) <= pair.halfPeriodSeconds);
  const [one = null, other = null] = within;
  if (!one || !other) return one;
  return tdb - one.tdbSeconds <= other.tdbSeconds - tdb ? one : other;
}
