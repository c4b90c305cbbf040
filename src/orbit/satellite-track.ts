import { DAY_SECONDS } from "../bodies/constants.ts";
import { physicalBody } from "../bodies/physical.ts";
import { POINTS } from "../bodies/point.ts";
import { trackPair } from "../bodies/track-pair.ts";
import type { Accuracy, Motion } from "../ephemeris/source.ts";
import { ApsidaryError } from "../error.ts";
import { formatTdb } from "../time/format-tdb.ts";
import { utcText } from "../time/format-utc.ts";
import { differencedMotion } from "./differenced-motion.ts";
import type { MeanElements } from "./mean-elements.ts";
import { type Track, trackOf } from "./track.ts";

/** A satellite's track, and when its elements bring it down, if they do. */
export interface SatelliteTrack extends Track {
  /** TDB seconds past J2000; `null` where it stays up as long as the track lasts. */
  readonly decayTdb: number | null;
}

/** Days on either side of the epoch for which mean elements serve. Common practice, no source. */
const DAYS = 30;
/**
 * What mean elements are off by: along the track 1 km at the epoch and 2 km more a day; radially a kilometre, and a fifth as much a day. The order of
 * what comparisons with precise orbits find for low satellites: C. Levit and W. Marshall, *Improved orbit predictions using two-line elements*, Adv. Space
 * Res. 47 (2011) 1107 (from memory).
 */
const ALONG_KM = [1, 2] as const;
const RADIAL_KM = [1, 0.2] as const;
/** Parts of a period by which positions are differenced: SGP4's own velocities are not quite the rates of its positions. */
const STEPS_PER_PERIOD = 1000;
const SAMPLES_PER_PERIOD = 20;
/** Steps of room for the differences at either end. */
const ROOM = 22;

/** Loads `satellite.js`. @throws ApsidaryError `not-supplied` where it is not installed */
async function library() {
  try {
    return await import("satellite.js");
  } catch (error) {
    throw new ApsidaryError(
      "not-supplied",
      `satellites need the package satellite.js (7 or later), which cannot be loaded (${error instanceof Error ? error.message.split("\n")[0]?.slice(0, 80) : "?"}). ` +
        "Install it: npm install satellite.js",
    );
  }
}

/**
 * Makes a track from a satellite's mean elements, by SGP4 and SDP4, for thirty days on either side of their epoch.
 *
 * Distances are from the Earth's centre; the axes are those of SGP4 (true equator, mean equinox). Where the elements bring the satellite
 * down, the track ends there, and `decayTdb` and the title tell when.
 *
 * @param elements as `parseTleFile` or `parseOmmFile` gave them
 * @param name     what to call the pair; left out, after the object: `OBJECT-earth`
 * @throws ApsidaryError `bad-input` where the satellite has decayed at its epoch; `not-supplied` without `satellite.js`
 *
 * Method: D. A. Vallado et al., *Revisiting Spacetrack Report #3*, AIAA 2006-6753, as `satellite.js` has it.
 */
export async function satelliteTrack(elements: MeanElements, name?: string): Promise<SatelliteTrack> {
  const { json2satrec, sgp4 } = await library();
  const { epochTdb, meanMotion } = elements;
  const id = elements.objectName ?? elements.objectId ?? "satellite";
  const pairName =
    name ??
    `${
      id
        .replace(/[^\p{L}\p{N}]+/gu, "-")
        .replace(/^-|-$/g, "")
        .slice(0, 50) || "satellite"
    }-earth`;
  const record = json2satrec({
    OBJECT_NAME: id,
    OBJECT_ID: elements.objectId ?? "",
    // to the millisecond, for the Sun's and the Moon's place; elapsed time is reckoned from the whole epoch
    EPOCH: utcText(epochTdb, 3).replace("Z", ""),
    MEAN_MOTION: meanMotion,
    ECCENTRICITY: elements.eccentricity,
    INCLINATION: elements.inclination,
    RA_OF_ASC_NODE: elements.node,
    ARG_OF_PERICENTER: elements.argument,
    MEAN_ANOMALY: elements.meanAnomaly,
    EPHEMERIS_TYPE: 0,
    CLASSIFICATION_TYPE: "U",
    NORAD_CAT_ID: 0,
    ELEMENT_SET_NO: 0,
    REV_AT_EPOCH: 0,
    BSTAR: elements.bstar,
    MEAN_MOTION_DOT: 0,
    MEAN_MOTION_DDOT: 0,
  });
  const period = DAY_SECONDS / meanMotion;
  const placeAt = (tdb: number) => {
    const found = sgp4(record, (tdb - epochTdb) / 60);
    return found && record.error === 0 ? found.position : null;
  };
  const [from, whole] = [epochTdb - DAYS * DAY_SECONDS, epochTdb + DAYS * DAY_SECONDS];
  const decayTdb = firstFailure(placeAt, epochTdb, whole, period / SAMPLES_PER_PERIOD);
  if (decayTdb !== null && decayTdb <= epochTdb) {
    throw new ApsidaryError(
      "bad-input",
      `${id} has decayed: its elements put it underground at their epoch, ${utcText(epochTdb, 0)}.`,
    );
  }
  const step = period / STEPS_PER_PERIOD;
  const positions: Motion = {
    givesVelocity: false,
    state(tdb, out) {
      const place = placeAt(tdb);
      if (!place) throw new ApsidaryError("bad-state", `SGP4 gives no place of ${id} for ${formatTdb(tdb)} TDB.`);
      out[0] = place.x;
      out[1] = place.y;
      out[2] = place.z;
    },
  };
  const motion = differencedMotion(positions, step);
  const start = firstFailure(placeAt, epochTdb, from, -period / SAMPLES_PER_PERIOD);
  const span = { from: (start ?? from) + ROOM * step, to: (decayTdb ?? whole) - ROOM * step };
  if (!(span.from < span.to)) {
    throw new ApsidaryError(
      "bad-input",
      `${id} decays at once: by its elements on ${utcText(decayTdb ?? epochTdb, 0)}.`,
    );
  }
  const { equatorialRadiusKm, radiusSource } = physicalBody("earth");
  const pair = trackPair({
    name: pairName,
    centre: POINTS.earth,
    sampleSeconds: period / SAMPLES_PER_PERIOD,
    halfPeriodSeconds: period / 2,
    toleranceSeconds: Math.min(8, period * 1e-5 * (1 - elements.eccentricity) ** 1.5),
    referenceRadiusKm: equatorialRadiusKm,
    radiusSource,
  });
  const place = new Float64Array(9);
  const angular = (2 * Math.PI) / period;
  const decay = decayTdb === null ? "" : `; it decays on ${utcText(decayTdb, 0)} by them`;
  const title = `mean elements of ${id} by SGP4${decay}`;
  const track = trackOf({
    pair,
    id: "sgp4",
    title,
    spans: [span],
    motion,
    accuracy(tdb): Accuracy {
      const days = Math.abs(tdb - epochTdb) / DAY_SECONDS;
      const along = ALONG_KM[0] + ALONG_KM[1] * days;
      const radial = RADIAL_KM[0] + RADIAL_KM[1] * days;
      motion.stateAndAcceleration?.(tdb, place);
      const [x = 0, y = 0, z = 0, vx = 0, vy = 0, vz = 0, ax = 0, ay = 0, az = 0] = place;
      const range = Math.hypot(x, y, z);
      const rate = (x * vx + y * vy + z * vz) / range;
      const speed = Math.hypot(vx, vy, vz);
      const acceleration = (speed * speed + x * ax + y * ay + z * az - rate * rate) / range;
      return {
        rangeKm: radial,
        rangeRateKmS: Math.hypot(angular * radial, (acceleration * along) / speed),
        basis: "assumed",
      };
    },
  });
  return Object.freeze({ ...track, decayTdb });
}

/** The first time from `from` towards `to` at which there is no place, to a millisecond; `null` where there is one throughout. */
function firstFailure(placeAt: (tdb: number) => unknown, from: number, to: number, step: number): number | null {
  if (!placeAt(from)) return from;
  for (let good = from; good !== to; ) {
    let next = good + step;
    if (step > 0 ? next > to : next < to) next = to;
    if (placeAt(next)) {
      good = next;
      continue;
    }
    let failing = next;
    while (Math.abs(failing - good) > 1e-3) {
      const middle = (good + failing) / 2;
      if (placeAt(middle)) good = middle;
      else failing = middle;
    }
    return good;
  }
  return null;
}
