const ARCSECOND = Math.PI / 648_000;

/** A rotation, row by row: v′ = m v. */
export type Rotation = readonly [number, number, number, number, number, number, number, number, number];

/**
 * From VSOP87's dynamical ecliptic and equinox J2000 to the axes of DE405 (ICRF).
 *
 * Obliquity 23° 26′ 21.40889″ and −0.07893″ and 0.01196″ about the z and y axes of the equator: fitted to the
 * directions of the Earth from the Sun in DE405, 1960–2059, which it then meets within 0.007″ (rms). VSOP87's own
 * rotation to the FK5 (P. Bretagnon and G. Francou, Astron. Astrophys. 202 (1988) 309: 23° 26′ 21.4091″ and
 * −0.0990″), carried to the ICRF by the spin of 0.0229″ between the two (F. Mignard and M. Froeschlé, Astron.
 * Astrophys. 354 (2000) 732), agrees within 0.02″. (Both from memory.) Distances from the Sun do not depend on it.
 */
export function vsop87ToIcrf(): Rotation {
  return small(eclipticToEquator(84381.40889), 0.01196, -0.07893);
}

/**
 * From the inertial mean ecliptic of J2000 and the departure point of ELP/MPP02 (constants fitted to DE405) to the
 * axes of DE405.
 *
 * Obliquity 23° 26′ 21.40928″, and −0.05028″ along the equator: J. Chapront, M. Chapront-Touzé and G. Francou, *A new
 * determination of lunar orbital parameters, precession constant and tidal acceleration from LLR measurements*,
 * Astron. Astrophys. 387 (2002) 700, the row for DE405 (from memory). Held against DE405 1960–2059 the rest is below
 * 0.001″ about each axis.
 */
export function elpToIcrf(): Rotation {
  return small(eclipticToEquator(84381.40928), 0, -0.05028);
}

/** Writes m · v to `out[at …]`, for v at `at` of `out` itself. */
export function rotateInPlace(m: Rotation, out: Float64Array, at: number): void {
  const x = out[at] as number;
  const y = out[at + 1] as number;
  const z = out[at + 2] as number;
  out[at] = m[0] * x + m[1] * y + m[2] * z;
  out[at + 1] = m[3] * x + m[4] * y + m[5] * z;
  out[at + 2] = m[6] * x + m[7] * y + m[8] * z;
}

function eclipticToEquator(arcseconds: number): Rotation {
  const c = Math.cos(arcseconds * ARCSECOND);
  const s = Math.sin(arcseconds * ARCSECOND);
  return [1, 0, 0, 0, c, -s, 0, s, c];
}

/** Turns the result of `m` about y, then about z, by small angles (″), counted as for a vector that is turned. */
function small(m: Rotation, aboutY: number, aboutZ: number): Rotation {
  const [cy, sy] = [Math.cos(aboutY * ARCSECOND), Math.sin(aboutY * ARCSECOND)];
  const [cz, sz] = [Math.cos(aboutZ * ARCSECOND), Math.sin(aboutZ * ARCSECOND)];
  const column = (k: 0 | 1 | 2) => {
    const [x, y, z] = [m[k], m[k + 3] as number, m[k + 6] as number];
    const turned = cy * x + sy * z;
    return [cz * turned - sz * y, sz * turned + cz * y, cy * z - sy * x] as const;
  };
  const [a, b, c] = [column(0), column(1), column(2)];
  return [a[0], b[0], c[0], a[1], b[1], c[1], a[2], b[2], c[2]];
}
