import { DAY_SECONDS } from "../bodies/constants.ts";
import type { Pair } from "../bodies/pair.ts";
import { POINTS } from "../bodies/point.ts";
import type { Ephemeris } from "../ephemeris/open-sources.ts";
import type { Span } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { brentMinimum } from "../numeric/brent-minimum.ts";
import { commonIntervals } from "../numeric/common-intervals.ts";
import { nearWindow } from "../passages/near-window.ts";
import type { Passage } from "../passages/passage.ts";
import { toRow } from "../passages/to-row.ts";
import { rounded } from "../report/rounded.ts";
import { LOOK } from "../sky/horizon.ts";
import { dateTimeOf } from "../time/date-time-of.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { utcText } from "../time/format-utc.ts";
import { zoneOf } from "../time/zone-of.ts";
import { bodyInSky, LIGHT_SPEED, norm, type Place, sunInSky } from "./body-in-sky.ts";
import { completePlanOptions, type PlanOptions, type PlanSite, siteLabel } from "./plan-options.ts";
import type { PlanRow, WhyNoRise, WhyNoTransit, WhyNot } from "./plan-row.ts";
import { type Stretch, stretchesAbove } from "./stretches.ts";

/** Seconds from sample to sample of an altitude; its period is a day. */
const STEP = 7200;
/** Seconds to which rise, set and the ends of windows are bracketed; the chord over the bracket leaves 10⁻⁵ s where nothing grazes. */
const TOLERANCE = 0.5;
/** A body that rises and sets does so once in this many seconds; the Moon's day is up to 24 h 59 min where it is not grazing. */
const MOON_DAY = 91_000;
/** Seconds to either side of a passage within which the site's own extreme lies: the turning Earth moves it by half a day and little more. */
const OWN_EXTREME = 2 * DAY_SECONDS;
/** Seconds from sample to sample in its search; it has one minimum and one maximum a day. */
const OWN_STEP = 7200;
/** Degrees an hour angle gains in a second, for the fixed stars. */
const HOUR_ANGLE_RATE = (360 * 1.002_737_909_35) / DAY_SECONDS;

/**
 * Makes the function that tells how a site sees a passage; it allocates little and keeps nothing from one passage to the next.
 *
 * @param ephemeris what `openSources` gave
 * @param pair      the pair of the passages
 * @param site      where
 * @param options   how
 * @throws ApsidaryError `bad-pair` for `*-ssb`, `not-supplied`, `bad-input` for a site that is none, `bad-zone`, `bad-option`. The function: `not-covered`
 *   where a passage lies where the sources do not tell the places of Earth and body
 */
export function planner(
  ephemeris: Ephemeris,
  pair: Pair,
  site: PlanSite,
  options: PlanOptions,
): (passage: Passage) => PlanRow {
  const { sky, within, minAltitudeDeg, darkBelowDeg, refraction, windowDays, source } = completePlanOptions(options);
  const body = bodyInSky(ephemeris, pair, source);
  const sun = body.isSun ? body : sunInSky(ephemeris, source);
  const { leapSeconds } = ephemeris;
  const horizon = sky.horizon(
    { latitudeDeg: site.latitudeDeg, longitudeDeg: site.longitudeDeg, heightM: site.heightM },
    leapSeconds,
  );
  const label = siteLabel(site);
  const zone = site.zone ?? null;
  const clock = zone === null ? null : zoneOf(zone);
  /** The distance of the pair is the distance from the Earth, so that a site has an extreme of its own. */
  const ownExtreme = body.isSun || pair.centre === POINTS.earth;
  const atPole = Math.abs(site.latitudeDeg) === 90;

  const place = new Float64Array(9);
  const here = new Float64Array(3);
  const looked = new Float64Array(4);
  const look = (where: Place, tdb: number): Float64Array => {
    where(tdb, place);
    horizon.look(tdb, place, looked);
    return looked;
  };
  const height = (where: Place, tdb: number): number => {
    where(tdb, place);
    return horizon.altitude(tdb, place);
  };
  const lifted = (altitude: number) => (refraction ? altitude + horizon.refraction(altitude) : altitude);
  const altitude = (tdb: number) => lifted(height(body.apparentNearby, tdb));
  const sunAltitude = (tdb: number) => height(sun.apparentNearby, tdb);
  const distance = (tdb: number) => look(body.geometric, tdb)[LOOK.distance] as number;

  const utc = (tdb: number | null) => (tdb === null ? null : utcText(tdb, 3, leapSeconds));
  const local = (tdb: number | null) =>
    tdb === null || clock === null ? null : dateTimeOf(tdb, "UTC", leapSeconds).setZone(clock).toISO();
  const diameter = (km: number) =>
    body.radiusKm === null ? null : rounded((2 * Math.asin(body.radiusKm / km) * 10_800) / Math.PI, 4);

  const aboveZero = ({ from, to }: Span) => stretchesAbove(altitude, from, to, STEP, TOLERANCE);
  const aboveLeast = ({ from, to }: Span) =>
    stretchesAbove((t) => altitude(t) - minAltitudeDeg, from, to, STEP, TOLERANCE);
  const darkIn = ({ from, to }: Span) =>
    stretchesAbove((t) => darkBelowDeg - sunAltitude(t), from, to, STEP, TOLERANCE);
  /** Of the stretches in which the body is up, what is dark. */
  const observable = (ups: readonly Stretch[]) => (body.isSun ? [...ups] : ups.flatMap((up) => darkIn(up)));
  const whyNone = (ups: readonly Stretch[], span: Span): WhyNot => {
    if (ups.length === 0) return "never-up";
    return darkIn(span).length === 0 ? "never-dark" : "up-only-while-bright";
  };

  return (passage) => {
    const t = passage.tdbSeconds;
    const covered = body.covered.find((span) => span.from <= t && t <= span.to);
    if (!covered) {
      throw new ApsidaryError(
        "not-covered",
        `the sky of ${formatTdb(t, 0)} (TDB) is not covered: the sources allowed here do not tell the places of both Earth and body then.`,
      );
    }
    const around = (before: number, after = before): Span => ({
      from: Math.max(t - before, covered.from),
      to: Math.min(t + after, covered.to),
    });

    const seen = look(body.apparent, t);
    const altitudeDeg = lifted(seen[LOOK.altitude] as number);
    const azimuthDeg = rounded(seen[LOOK.azimuth] as number, 4) % 360;
    const sunAltitudeDeg = sunAltitude(t);
    body.geometric(t, place);
    const geocentricKm = norm(place);
    const topocentricKm = distance(t);

    const stays = aboveZero(around(MOON_DAY));
    const { riseUtc, transitUtc, setUtc, whyNoRise, whyNoTransit } = visit(t, stays, around(MOON_DAY), covered);

    const day = around(DAY_SECONDS);
    const upInDay = minAltitudeDeg === 0 ? commonIntervals(stays, [day]) : aboveLeast(day);
    const best = highest(observable(upInDay));

    const near = nearWindow(ephemeris, passage, within);
    const reach = around(Math.min(windowDays * DAY_SECONDS, 2 * pair.halfPeriodSeconds));
    const from = Math.max(near.from ?? -Infinity, reach.from);
    const to = Math.min(near.to ?? Infinity, reach.to);
    const upWhileNear = aboveLeast({ from, to });
    const windows = observable(upWhileNear);

    const own = ownExtreme ? ownMoment(around(OWN_EXTREME), passage.kind === "periapsis" ? 1 : -1) : null;
    return Object.freeze({
      ...toRow(passage, ephemeris),
      site: label,
      zone,
      local: local(t),
      altitudeDeg: rounded(altitudeDeg, 4),
      azimuthDeg,
      sunAltitudeDeg: rounded(sunAltitudeDeg, 4),
      turnUncertaintyDeg: Math.ceil(horizon.turnUncertaintyDeg(t) * 1e4) / 1e4,
      up: altitudeDeg > minAltitudeDeg,
      dark: body.isSun ? null : sunAltitudeDeg < darkBelowDeg,
      topocentricDistanceKm: rounded(topocentricKm, 3),
      geocentricDistanceKm: rounded(geocentricKm, 3),
      topocentricLeastUtc: passage.kind === "periapsis" ? utc(own) : null,
      topocentricGreatestUtc: passage.kind === "apoapsis" ? utc(own) : null,
      topocentricExtremeKm: own === null ? null : rounded(distance(own), 3),
      diameterArcmin: diameter(topocentricKm),
      geocentricDiameterArcmin: diameter(geocentricKm),
      illuminatedFraction: litPart(t),
      lightTimeSeconds: rounded(topocentricKm / LIGHT_SPEED, 3),
      riseUtc,
      transitUtc,
      setUtc,
      whyNoRise,
      whyNoTransit,
      bestUtc: utc(best?.at ?? null),
      bestLocal: local(best?.at ?? null),
      bestAltitudeDeg: best && rounded(best.altitude, 4),
      bestDiameterArcmin: best && diameter(distance(best.at)),
      whyNoBest: best ? null : whyNone(upInDay, day),
      nearFromUtc: utc(near.from),
      nearToUtc: utc(near.to),
      nearCut: near.why !== null,
      whyNoNear: near.why,
      windows: Object.freeze(
        windows.map((window) =>
          Object.freeze({ fromUtc: utc(window.from) as string, toUtc: utc(window.to) as string }),
        ),
      ),
      windowsCut: (near.from ?? covered.from) < reach.from || (near.to ?? covered.to) > reach.to,
      whyNot: windows.length > 0 ? null : from < to ? whyNone(upWhileNear, { from, to }) : "no-data",
    });
  };

  /** Rise, transit and set of the stay above the horizon that holds an instant, or is nearest to it. */
  function visit(t: number, stays: readonly Stretch[], span: Span, covered: Span) {
    let stay: Stretch | null = null;
    for (const it of stays) if (stay === null || gap(it, t) < gap(stay, t)) stay = it;
    const full = span.to - span.from >= 2 * MOON_DAY - 1;
    if (!stay) {
      const why = full ? ("stays-down" as const) : ("no-data" as const);
      return { riseUtc: null, transitUtc: null, setUtc: null, whyNoRise: why, whyNoTransit: why };
    }
    const rise = stay.from > span.from ? stay.from : beginBefore(span.from, covered);
    const set = stay.to < span.to ? stay.to : endAfter(span.to, covered);
    const transit = atPole ? null : transitNear(rise !== null && set !== null ? (rise + set) / 2 : t, covered);
    const whyNoRise: WhyNoRise | null =
      rise !== null && set !== null ? null : full || stay.to - stay.from > MOON_DAY ? "stays-up" : "no-data";
    const whyNoTransit: WhyNoTransit | null = transit !== null ? null : atPole ? "pole" : "no-data";
    return { riseUtc: utc(rise), transitUtc: utc(transit), setUtc: utc(set), whyNoRise, whyNoTransit };
  }

  /** Where a stay that lasts at an instant began, `null` where that is more than a day before. */
  function beginBefore(at: number, covered: Span): number | null {
    const from = Math.max(at - MOON_DAY, covered.from);
    const last = aboveZero({ from, to: at }).at(-1);
    return last && last.to === at && last.from > from ? last.from : null;
  }

  /** Where a stay that lasts at an instant ends, `null` where that is more than a day after. */
  function endAfter(at: number, covered: Span): number | null {
    const to = Math.min(at + MOON_DAY, covered.to);
    const [first] = aboveZero({ from: at, to });
    return first && first.from === at && first.to < to ? first.to : null;
  }

  /** The upper passage of the meridian nearest to an instant; each round leaves a thirtieth of the error, for the Moon. */
  function transitNear(t: number, span: Span): number | null {
    let at = t;
    for (let i = 0; i < 10; i++) {
      at -= (look(body.apparentNearby, at)[LOOK.hourAngle] as number) / HOUR_ANGLE_RATE;
      if (!(at > span.from && at < span.to)) return null;
    }
    return at;
  }

  /** The moment at which the body stands highest. */
  function highest(windows: readonly Stretch[]): { at: number; altitude: number } | null {
    let best: { at: number; altitude: number } | null = null;
    const consider = (at: number): number => {
      const there = altitude(at);
      if (best === null || there > best.altitude) best = { at, altitude: there };
      return there;
    };
    for (const { from, to } of windows) {
      const count = Math.max(2, Math.ceil((to - from) / STEP));
      const step = (to - from) / count;
      let top = 0;
      let most = -Infinity;
      for (let i = 0; i <= count; i++) {
        const there = consider(i === count ? to : from + i * step);
        if (there > most) {
          most = there;
          top = i;
        }
      }
      const [a, b] = [from + Math.max(top - 1, 0) * step, Math.min(from + (top + 1) * step, to)];
      consider(brentMinimum((at) => -altitude(at), a, b, 1));
    }
    return best;
  }

  /** The site's own moment of least (sign 1) or greatest (−1) distance: of one a day, near enough to be compared only when each is found. */
  function ownMoment({ from, to }: Span, sign: 1 | -1): number | null {
    const signed = (tdb: number) => sign * distance(tdb);
    const count = Math.ceil((to - from) / OWN_STEP);
    const step = (to - from) / count;
    let least = Infinity;
    let at: number | null = null;
    let [before, here] = [signed(from), signed(from + step)];
    if (before < here) least = before; // an end where the data end: no extreme
    for (let i = 1; i < count; i++) {
      const after = signed(i + 1 === count ? to : from + (i + 1) * step);
      if (here <= before && here < after) {
        const moment = brentMinimum(signed, from + (i - 1) * step, from + (i + 1) * step, 0.1);
        const there = signed(moment);
        if (there < least) [least, at] = [there, moment];
      }
      [before, here] = [here, after];
    }
    return here < least ? null : at;
  }

  /** Lit part of the disk: (1 + cos i) / 2, with i the angle at the body between Sun and site. */
  function litPart(t: number): number | null {
    if (body.isSun) return null;
    body.geometric(t, place);
    horizon.place(t, here);
    const sunward = new Float64Array(3);
    body.fromSun(t, sunward);
    let product = 0;
    for (let i = 0; i < 3; i++) {
      here[i] = (here[i] as number) - (place[i] as number);
      product -= (here[i] as number) * (sunward[i] as number);
    }
    return rounded((1 + product / (norm(here) * norm(sunward))) / 2, 4);
  }
}

/** How far an instant lies from a stretch. */
function gap({ from, to }: Stretch, t: number): number {
  return Math.max(from - t, t - to, 0);
}
