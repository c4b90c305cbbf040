import type { EngineLibrary } from "../ephemeris/engine-library.ts";
import { horizonRefraction } from "./horizon-refraction.ts";
import type { EarthTurn } from "./horizon-turn.ts";
import { type Site, topocentricFrame, WGS84_RADIUS_KM } from "./topocentric-frame.ts";

/** Places in what `look` writes. */
export const LOOK = { altitude: 0, azimuth: 1, distance: 2, hourAngle: 3 } as const;

/** What a site sees. Frozen; allocates nothing after it is made. */
export interface Horizon {
  readonly site: Site;
  /**
   * Writes how a body stands: altitude and azimuth without refraction (degrees; azimuth from north through east, 0 … 360), the
   * distance from the site (km), and the hour angle at the site (degrees, −180 … 180, west positive).
   * @param tdb   TDB seconds past J2000
   * @param place the body from the Earth's centre, ICRF, km; only read
   * @param out   four places, in the order of `LOOK`
   */
  look(tdb: number, place: Float64Array, out: Float64Array): void;
  /** Gives the altitude alone, as `look` does. */
  altitude(tdb: number, place: Float64Array): number;
  /** Writes the site's own place from the Earth's centre, ICRF, km, to `out[0 … 2]`. */
  place(tdb: number, out: Float64Array): void;
  /** Gives by how much the air lifts a body, degrees. */
  refraction(altitudeDeg: number): number;
  /** Gives by how much the Earth may have turned farther or less far, degrees, half-width of 95 %. */
  turnUncertaintyDeg(tdb: number): number;
  /** How far the sea's horizon lies below the level, degrees, without refraction; `null` for a site below the sea. */
  readonly dipDeg: number | null;
}

/**
 * Makes the horizon of a site: directions against the normal of the WGS 84 ellipsoid (the plumb line differs by up to a minute of
 * arc in mountains).
 *
 * @param library astronomy-engine
 * @param turn    how the Earth stands
 * @param site    where
 * @throws ApsidaryError `bad-input` for a site that is none
 */
export function horizonOf(library: EngineLibrary, turn: EarthTurn, site: Site): Horizon {
  const { place, east, north, up } = topocentricFrame(site);
  const refraction = horizonRefraction(library, site.heightM);
  const longitude = (site.longitudeDeg * Math.PI) / 180;
  const [outX, outY] = [Math.cos(longitude), Math.sin(longitude)];
  const m = new Float64Array(9);
  const from = new Float64Array(3);
  const degrees = 180 / Math.PI;
  /** Writes where a body is from the site, axes of the turning Earth, to `from`. */
  const fromSite = (tdb: number, body: Float64Array): void => {
    turn.matrix(tdb, m);
    const x = body[0] as number;
    const y = body[1] as number;
    const z = body[2] as number;
    for (let i = 0; i < 3; i++) {
      from[i] =
        (m[3 * i] as number) * x + (m[3 * i + 1] as number) * y + (m[3 * i + 2] as number) * z - (place[i] as number);
    }
  };
  return Object.freeze({
    site: Object.freeze({ ...site }),
    look(tdb: number, body: Float64Array, out: Float64Array): void {
      fromSite(tdb, body);
      const [dx, dy, dz] = [from[0] as number, from[1] as number, from[2] as number];
      const e = dx * east[0] + dy * east[1];
      const n = dx * north[0] + dy * north[1] + dz * north[2];
      const u = dx * up[0] + dy * up[1] + dz * up[2];
      const azimuth = Math.atan2(e, n) * degrees;
      out[LOOK.altitude] = Math.atan2(u, Math.sqrt(e * e + n * n)) * degrees;
      out[LOOK.azimuth] = azimuth < 0 ? azimuth + 360 : azimuth;
      out[LOOK.distance] = Math.sqrt(dx * dx + dy * dy + dz * dz);
      out[LOOK.hourAngle] = Math.atan2(-e, dx * outX + dy * outY) * degrees;
    },
    altitude(tdb: number, body: Float64Array): number {
      fromSite(tdb, body);
      const [dx, dy, dz] = [from[0] as number, from[1] as number, from[2] as number];
      const u = dx * up[0] + dy * up[1] + dz * up[2];
      return Math.atan2(u, Math.sqrt(Math.max(dx * dx + dy * dy + dz * dz - u * u, 0))) * degrees;
    },
    place(tdb: number, out: Float64Array): void {
      turn.matrix(tdb, m);
      for (let i = 0; i < 3; i++) {
        out[i] = (m[i] as number) * place[0] + (m[i + 3] as number) * place[1] + (m[i + 6] as number) * place[2];
      }
    },
    refraction,
    turnUncertaintyDeg: turn.uncertaintyDeg,
    dipDeg: site.heightM < 0 ? null : Math.acos(WGS84_RADIUS_KM / (WGS84_RADIUS_KM + site.heightM / 1000)) * degrees,
  });
}
