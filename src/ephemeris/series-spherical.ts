/** Writes a state, km and km/s in ICRF axes, for TDB seconds past J2000 to `out[0 … 5]`. */
export type StateWriter = (tdb: number, out: Float64Array) => void;

/**
 * Turns longitude, latitude, distance and their rates into x, y, z and theirs, in place.
 *
 * @param length unit of the distance, in the unit wanted
 * @param frequency 1 ÷ unit of time
 */
export function sphericalToRectangular(out: Float64Array, length: number, frequency: number): void {
  const cosL = Math.cos(out[0] as number);
  const sinL = Math.sin(out[0] as number);
  const cosB = Math.cos(out[1] as number);
  const sinB = Math.sin(out[1] as number);
  const r = (out[2] as number) * length;
  const alongL = (out[3] as number) * frequency * r * cosB;
  const alongB = (out[4] as number) * frequency * r;
  const alongR = (out[5] as number) * frequency * length;
  const outward = alongR * cosB - alongB * sinB; // in the plane of the ecliptic
  out[0] = r * cosB * cosL;
  out[1] = r * cosB * sinL;
  out[2] = r * sinB;
  out[3] = outward * cosL - alongL * sinL;
  out[4] = outward * sinL + alongL * cosL;
  out[5] = alongR * sinB + alongB * cosB;
}
