import { DAY_SECONDS } from "../bodies/constants.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import { ApsidaryError } from "../error.ts";
import type { Passage } from "../passages/passage.ts";
import type { SourceChoice } from "../passages/timeline-for.ts";
import { rounded } from "../report/rounded.ts";
import type { Sky } from "../sky/open-sky.ts";
import type { Solstice } from "../sky/solstice.ts";
import { formatUtc } from "../time/format-utc.ts";
import { utcOf } from "../time/utc-of.ts";
import { meanPerihelionLongitude, osculatingPerihelionLongitude } from "./perihelion-longitude.ts";
import { extremumNear } from "./supply-near.ts";

/** A passage of the Earth among the seasons. Frozen; rounded to 1 ms, 1e-8 d and 1e-6°. */
export interface Season {
  readonly solstice: Solstice;
  /** The last one before the passage, TDB seconds past J2000; within 100 s from 1900 to 2100. */
  readonly solsticeTdbSeconds: number;
  /** ISO 8601; UT1 before 1972. */
  readonly solsticeUtc: string;
  /** Days of 86 400 s from the solstice to the passage. */
  readonly daysAfterSolstice: number;
  /** Mean longitude of perihelion, as the Sun's longitude there, from the mean equinox of date. */
  readonly meanPerihelionLongitudeDeg: number;
  /** The same of the barycentre's osculating two-body orbit at its own passage; `null` where no source reaches it. */
  readonly osculatingPerihelionLongitudeDeg: number | null;
}

/**
 * Gives where a passage of the Earth stands among the seasons: the solstice before it (a perihelion's of December, an aphelion's of June),
 * and the longitude of perihelion, mean and osculating.
 *
 * The osculating one is that of the barycentre of the Earth and the Moon: the Earth's own, which the Moon swings by more
 * than a degree, says nothing of the orbit.
 *
 * @param sky       what `openSky` gave
 * @param ephemeris what `openSources` gave
 * @param passage   a passage of `earth-sun` or `emb-sun` that it gave
 * @param choice    which sources may serve
 * @throws ApsidaryError `bad-pair` for another pair; `not-covered` outside the years −1000 to 4000
 */
export function seasonOf(sky: Sky, ephemeris: Ephemeris, passage: Passage, choice: SourceChoice = "auto"): Season {
  const { pair, kind, tdbSeconds } = passage;
  if (pair !== "earth-sun" && pair !== "emb-sun") {
    throw new ApsidaryError("bad-pair", `solstices are the Earth's: ask for earth-sun or emb-sun, not ${pair}.`);
  }
  const solstice = kind === "periapsis" ? "december" : "june";
  const solsticeTdb = sky.solsticeBefore(tdbSeconds, solstice);
  const barycentre = extremumNear(ephemeris, "emb-sun", kind, tdbSeconds, passage.source, choice);
  return Object.freeze({
    solstice,
    solsticeTdbSeconds: rounded(solsticeTdb, 3),
    solsticeUtc: formatUtc(utcOf(solsticeTdb, ephemeris.leapSeconds), 3),
    daysAfterSolstice: rounded((tdbSeconds - solsticeTdb) / DAY_SECONDS, 8),
    meanPerihelionLongitudeDeg: rounded(meanPerihelionLongitude(tdbSeconds), 6),
    osculatingPerihelionLongitudeDeg:
      barycentre && rounded(osculatingPerihelionLongitude(barycentre.supply, kind, barycentre.tdb), 6),
  });
}
