import { ApsidaryError } from "../error.ts";

/** A place on the Earth, by WGS 84. */
export interface Site {
  /** Geodetic latitude, degrees, north positive: −90 … 90. */
  readonly latitudeDeg: number;
  /** Longitude, degrees, east positive: −180 … 360. */
  readonly longitudeDeg: number;
  /** Height above the ellipsoid, m: −500 … 100 000. */
  readonly heightM: number;
}

/** A site's place in the turning Earth and the directions that belong to it; x to longitude 0 on the equator, z to the north pole. */
export interface TopocentricFrame {
  /** From the Earth's centre, km. */
  readonly place: readonly [number, number, number];
  readonly east: readonly [number, number, number];
  readonly north: readonly [number, number, number];
  /** Along the normal of the ellipsoid. */
  readonly up: readonly [number, number, number];
}

/** Equatorial radius of WGS 84, km. NIMA TR8350.2 (2000), table 3.1. */
export const WGS84_RADIUS_KM = 6378.137;
/** Flattening of WGS 84. NIMA TR8350.2 (2000), table 3.1. */
const WGS84_FLATTENING = 1 / 298.257223563;
/** Heights that may be given, m: those for which the air's density is known. */
const LOWEST = -500;
const HIGHEST = 100_000;

/**
 * Refuses a site that is none.
 *
 * @throws ApsidaryError `bad-input`, with what may be meant where latitude and longitude seem to have changed places
 */
export function requireSite({ latitudeDeg, longitudeDeg, heightM }: Site): void {
  if (!(Math.abs(latitudeDeg) <= 90)) {
    const swapped = Math.abs(longitudeDeg) <= 90 && Math.abs(latitudeDeg) <= 360;
    throw new ApsidaryError(
      "bad-input",
      `the latitude ${latitudeDeg} is not within -90 and 90 degrees` +
        (swapped
          ? `; latitude comes first, then east longitude: did you mean ${longitudeDeg},${latitudeDeg}?`
          : ". Give latitude, east longitude, height, such as 46.5,8.0,2100."),
    );
  }
  if (!(longitudeDeg >= -180 && longitudeDeg <= 360)) {
    throw new ApsidaryError(
      "bad-input",
      `the longitude ${longitudeDeg} is not within -180 and 360 degrees; east is positive, west negative.`,
    );
  }
  if (!(heightM >= LOWEST && heightM <= HIGHEST)) {
    throw new ApsidaryError(
      "bad-input",
      `the height ${heightM} is not within ${LOWEST} and ${HIGHEST}; give metres above the ellipsoid (above the sea will do).`,
    );
  }
}

/**
 * Gives place and directions of a site in the turning Earth.
 *
 * Geodetic to rectangular by the radius of curvature of the ellipsoid's prime vertical; *Explanatory Supplement to the Astronomical
 * Almanac* (3rd ed., 2013), section 7.4 (from memory).
 *
 * @throws ApsidaryError `bad-input`
 */
export function topocentricFrame(site: Site): TopocentricFrame {
  requireSite(site);
  const latitude = (site.latitudeDeg * Math.PI) / 180;
  const longitude = (site.longitudeDeg * Math.PI) / 180;
  const sin = Math.sin(latitude);
  const cos = Math.abs(site.latitudeDeg) === 90 ? 0 : Math.cos(latitude);
  const east = [-Math.sin(longitude), Math.cos(longitude), 0] as const;
  const outward = [Math.cos(longitude), Math.sin(longitude)] as const;
  const e2 = WGS84_FLATTENING * (2 - WGS84_FLATTENING);
  const normal = WGS84_RADIUS_KM / Math.sqrt(1 - e2 * sin * sin);
  const height = site.heightM / 1000;
  const across = (normal + height) * cos;
  return Object.freeze({
    place: Object.freeze([across * outward[0], across * outward[1], (normal * (1 - e2) + height) * sin] as const),
    east: Object.freeze(east),
    north: Object.freeze([-sin * outward[0], -sin * outward[1], cos] as const),
    up: Object.freeze([cos * outward[0], cos * outward[1], sin] as const),
  });
}
