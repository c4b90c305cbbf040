/** Measures of a conic orbit by name, as the textbooks have them. */
export type Truth = Readonly<Record<string, number>>;

/**
 * Computes a conic by the plain relations, from periapsis distance (km), μ (km³/s²) and 1 + e, |1 − e| and e, each to its own precision.
 *
 * Source: R. R. Bate, D. D. Mueller and J. E. White, *Fundamentals of Astrodynamics* (1971), ch. 1 (from memory).
 */
export function conicTruth(
  rp: number,
  mu: number,
  { e, plus, minus }: { e: number; plus: number; minus: number },
): Truth {
  const p = rp * plus;
  const h = Math.sqrt(mu * p);
  const common = {
    gravitationalParameterKm3S2: mu,
    eccentricity: e,
    periapsisKm: rp,
    semiLatusRectumKm: p,
    periapsisSpeedKmS: h / rp,
    angularMomentumKm2S: h,
  };
  if (e === 1) return { ...common, specificEnergyKm2S2: 0 };
  const a = rp / minus;
  const b = rp * Math.sqrt(plus / minus);
  if (e > 1) return { ...common, semiMajorAxisKm: -a, semiMinorAxisKm: b, specificEnergyKm2S2: mu / (2 * a) };
  const ra = a * plus;
  return {
    ...common,
    semiMajorAxisKm: a,
    semiMinorAxisKm: b,
    apoapsisKm: ra,
    apoapsisSpeedKmS: h / ra,
    specificEnergyKm2S2: -mu / (2 * a),
    periodSeconds: 2 * Math.PI * Math.sqrt(a ** 3 / mu),
  };
}

/** All choices of three names. */
export function triplesOf(names: readonly string[]): [string, string, string][] {
  return names.flatMap((a, i) =>
    names.slice(i + 1).flatMap((b, j) => names.slice(i + j + 2).map((c): [string, string, string] => [a, b, c])),
  );
}

/**
 * Tells whether three measures fix an orbit, by the rank of their derivatives by rp, μ and e, differenced at an eccentricity
 * where nothing special happens.
 */
export function fixesAnOrbit(names: readonly string[], e: number): boolean {
  const at = (rp: number, mu: number, x: number) => {
    const truth = conicTruth(rp, mu, { e: x, plus: 1 + x, minus: Math.abs(1 - x) });
    return names.map((name) => Math.log(Math.abs(truth[name] ?? Number.NaN)));
  };
  const step = 1e-4;
  const difference = (f: (d: number) => number[]) =>
    f(step).map((value, i) => (value - (f(-step)[i] ?? Number.NaN)) / (2 * step));
  const [x, y, z] = [
    difference((d) => at(7000 * Math.exp(d), 4e5, e)),
    difference((d) => at(7000, 4e5 * Math.exp(d), e)),
    difference((d) => at(7000, 4e5, e + d)),
  ] as [number[], number[], number[]];
  const minor = (i: number, j: number) => (y[i] ?? 0) * (z[j] ?? 0) - (y[j] ?? 0) * (z[i] ?? 0);
  return Math.abs((x[0] ?? 0) * minor(1, 2) - (x[1] ?? 0) * minor(0, 2) + (x[2] ?? 0) * minor(0, 1)) > 1e-5;
}
