import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import { rounded } from "../report/rounded.ts";
import type { Sky } from "../sky/open-sky.ts";
import { tdbOf } from "../time/tdb-of.ts";
import type { PlanRow } from "./plan-row.ts";

/** A near and a far picture that go side by side: the best moments of a periapsis and an apoapsis that are alike in phase and altitude. */
export interface MatchedPair {
  readonly site: string;
  /** The passages. */
  readonly periapsisUtc: string;
  readonly apoapsisUtc: string;
  /** When each is best seen. */
  readonly nearPictureUtc: string;
  readonly farPictureUtc: string;
  /** Apparent diameter at the near picture over that at the far one. */
  readonly diameterRatio: number;
  /** The Moon's elongation from the Sun, 0 new, 180 full; `null` for the Sun. */
  readonly nearPhaseDeg: number | null;
  readonly farPhaseDeg: number | null;
  readonly phaseDifferenceDeg: number | null;
  readonly nearAltitudeDeg: number;
  readonly farAltitudeDeg: number;
  readonly altitudeDifferenceDeg: number;
}

interface Picture {
  readonly row: PlanRow;
  readonly utc: string;
  readonly altitude: number;
  readonly diameter: number;
  readonly phase: number | null;
}

/**
 * Gives, for each periapsis of a season, the apoapsis nearest to it in phase and altitude, the greatest ratio of diameters first.
 *
 * Nearest: least √(Δphase² + Δaltitude²), both in degrees, at the best moment of each (a measure of our own). Passages that cannot be observed within a day are left
 * out.
 *
 * @param rows      the season of one site, as `planSeason` gives it
 * @param ephemeris what `openSources` gave
 * @param sky       what `openSky` gave
 * @throws ApsidaryError `bad-pair` where the passages are not of the Moon or the Earth: a planet's distance from the Sun does not set its size
 */
export function matchedPairs(
  rows: Iterable<PlanRow>,
  ephemeris: Pick<Ephemeris, "leapSeconds">,
  sky: Pick<Sky, "moonElongationDeg">,
): MatchedPair[] {
  const near: Picture[] = [];
  const far: Picture[] = [];
  for (const row of rows) {
    if (!/^(moon-earth|earth-sun|emb-sun)$/.test(row.pair)) {
      throw new ApsidaryError(
        "bad-pair",
        `pictures of ${row.pair} cannot be matched: only passages of moon-earth and earth-sun make the body look larger or smaller from here.`,
      );
    }
    if (row.bestUtc === null || row.bestAltitudeDeg === null || row.bestDiameterArcmin === null) continue;
    const phase = row.pair === "moon-earth" ? sky.moonElongationDeg(tdbOf(row.bestUtc, ephemeris.leapSeconds)) : null;
    const picture = { row, utc: row.bestUtc, altitude: row.bestAltitudeDeg, diameter: row.bestDiameterArcmin, phase };
    (row.kind === "periapsis" ? near : far).push(picture);
  }
  const pairs = near.flatMap((one) => {
    let best: Picture | null = null;
    for (const other of far) if (best === null || unlike(one, other) < unlike(one, best)) best = other;
    return best ? [matched(one, best)] : [];
  });
  return pairs.sort((a, b) => b.diameterRatio - a.diameterRatio);
}

function unlike(a: Picture, b: Picture): number {
  return Math.hypot(phaseDifference(a, b) ?? 0, a.altitude - b.altitude);
}

function phaseDifference(a: Picture, b: Picture): number | null {
  if (a.phase === null || b.phase === null) return null;
  const difference = Math.abs(a.phase - b.phase);
  return Math.min(difference, 360 - difference);
}

function matched(near: Picture, far: Picture): MatchedPair {
  const degrees = (value: number | null) => (value === null ? null : rounded(value, 2));
  return Object.freeze({
    site: near.row.site,
    periapsisUtc: near.row.utc,
    apoapsisUtc: far.row.utc,
    nearPictureUtc: near.utc,
    farPictureUtc: far.utc,
    diameterRatio: rounded(near.diameter / far.diameter, 5),
    nearPhaseDeg: degrees(near.phase),
    farPhaseDeg: degrees(far.phase),
    phaseDifferenceDeg: degrees(phaseDifference(near, far)),
    nearAltitudeDeg: near.altitude,
    farAltitudeDeg: far.altitude,
    altitudeDifferenceDeg: rounded(Math.abs(near.altitude - far.altitude), 4),
  });
}
