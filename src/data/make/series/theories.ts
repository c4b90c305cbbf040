/**
 * One term of a theory, amplitude · Tᵖ · cos(argument) + … : what stands beside one argument in one place of the
 * theory.
 */
export interface Entry {
  /** 0, 1, 2: longitude, latitude, distance. */
  readonly variable: number;
  /** Power of T. */
  readonly power: number;
  cosine: number;
  sine: number;
}

/** All that hangs on one argument f₁T + f₂T² + …; its constant part is in the entries. */
export interface Argument {
  /** f₁, f₂ …, radians per power of the theory's unit of time; f₁ ≥ 0. */
  readonly rates: readonly number[];
  readonly entries: Entry[];
}

/** A term as a theory prints it: amplitude, phase and the rates of the argument. */
interface Term {
  readonly variable: number;
  readonly power: number;
  readonly amplitude: number;
  /** For amplitude · cos(phase + argument). */
  readonly phase: number;
  readonly rates: readonly number[];
}

const ARCSECOND = Math.PI / 648_000;

/** The planets of VSOP87, in order from the Sun. */
export const PLANETS = ["mercury", "venus", "earth", "mars", "jupiter", "saturn", "uranus", "neptune"] as const;

/**
 * Reads the complete VSOP87, version B, of one planet: heliocentric longitude and latitude (rad) and distance (au),
 * dynamical ecliptic and equinox J2000, T in thousands of Julian years of TDB from J2000.
 */
export async function vsop87Terms(planet: (typeof PLANETS)[number]): Promise<readonly Argument[]> {
  const data = await load(`astronomia/data/vsop87B${planet}`);
  const terms: Term[] = [];
  for (const [variable, letter] of ["L", "B", "R"].entries()) {
    for (const [power, rows] of tablesOf(data, letter)) {
      for (const [amplitude = 0, phase = 0, rate = 0] of rows) {
        terms.push({ variable, power, amplitude, phase, rates: [rate] });
      }
    }
  }
  return byArgument(terms, 8);
}

/**
 * Reads the complete ELP/MPP02 of the Moon with the constants fitted to DE405 (and, for the secular terms, to DE406):
 * longitude and latitude (rad) and distance (km), inertial mean ecliptic and departure point of J2000, of date in
 * longitude as the theory has it; T in Julian centuries of TDB from J2000.
 */
export async function elpMpp02Terms(): Promise<readonly Argument[]> {
  const data = await load("astronomia/data/elpMppDeFull");
  if (data.name !== "ElpMppDE405") throw new Error("the Moon's data are not those fitted to DE405");
  const terms: Term[] = (data.W1 as number[]).map((amplitude, power) => ({
    variable: 0,
    power,
    amplitude,
    phase: 0,
    rates: [0, 0, 0, 0],
  }));
  for (const [variable, letter] of ["L", "B", "R"].entries()) {
    for (const [power, rows] of tablesOf(data, letter)) {
      for (const [a = 0, phase = 0, ...rates] of rows) {
        // printed as a sine
        terms.push({ variable, power, amplitude: variable < 2 ? a * ARCSECOND : a, phase: phase - Math.PI / 2, rates });
      }
    }
  }
  return byArgument(terms, 8);
}

async function load(specifier: string): Promise<Record<string, unknown>> {
  const module: unknown = await import(specifier);
  return (module as { default: Record<string, unknown> }).default;
}

function tablesOf(data: Record<string, unknown>, letter: string): [number, number[][]][] {
  return Object.entries(data[letter] as Record<string, number[][]>).map(([power, rows]) => [Number(power), rows]);
}

/** Gathers terms whose arguments agree to `digits` decimals of the first rate and to 1e-12 of the others. */
function byArgument(terms: readonly Term[], digits: number): Argument[] {
  const found = new Map<string, Argument>();
  for (const { variable, power, amplitude, phase, rates } of terms) {
    if (amplitude === 0) continue;
    const turned = (rates[0] ?? 0) < 0 || (rates[0] === 0 && (rates[1] ?? 0) < 0);
    const upright = turned ? rates.map((rate) => -rate) : rates;
    const key = upright.map((rate, k) => rate.toFixed(k === 0 ? digits : 12)).join(" ");
    let argument = found.get(key);
    if (!argument) {
      argument = { rates: upright.map((rate) => rate || 0), entries: [] };
      found.set(key, argument);
    }
    let entry = argument.entries.find((e) => e.variable === variable && e.power === power);
    if (!entry) {
      entry = { variable, power, cosine: 0, sine: 0 };
      argument.entries.push(entry);
    }
    // a cos(p + ψ) = a cos p cos ψ − a sin p sin ψ, and ψ is turned where the argument was
    entry.cosine += amplitude * Math.cos(phase);
    entry.sine -= amplitude * Math.sin(phase) * (turned ? -1 : 1);
  }
  return [...found.values()];
}
