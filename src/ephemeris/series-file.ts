import { ApsidaryError } from "../error.ts";

/** The sums Σ Tᵖ (c cos ψ + s sin ψ) of one variable and one power of T, by point of the chain of arguments. */
export interface SeriesBlock {
  /** 0, 1, 2: which of the series' three variables. */
  readonly variable: number;
  /** Power of T. */
  readonly power: number;
  /** Point whose argument ψ is meant, by entry. */
  readonly places: Uint16Array;
  /** c and s of each entry, by turns. */
  readonly coefficients: Float64Array;
}

/**
 * Three variables as Poisson series, with their arguments written as a chain.
 *
 * Point 0 … `bases` − 1 are the bases: ψ = f₁T + f₂T² + … . Each later point is the sum or the difference of two
 * earlier ones.
 */
export interface PoissonSeries {
  readonly name: string;
  /** Rates of each base. */
  readonly degree: number;
  /** f₁ … of all bases, rad per powers of the unit of time. */
  readonly rates: Float64Array;
  readonly bases: number;
  /** By point beyond the bases: the two points, and +1 or −1 before the second. */
  readonly first: Uint16Array;
  readonly second: Uint16Array;
  readonly signs: Float64Array;
  /** By variable, then by power. */
  readonly blocks: readonly SeriesBlock[];
}

const MAGIC = "APSERIES";
const VERSION = 1;
const MINUS_BIT = 0x8000;

/**
 * Reads a file of series.
 *
 * All little-endian. "APSERIES", version (u32, 1), number of series (u32). Each series: name (16 bytes, padded with
 * zeros); u32: degree, bases, sums, blocks; by block u8 variable, u8 power, u16 nought, u32 wide, u32 narrow entries;
 * rates of the bases (f64); c and s of all wide entries (f64), then of all narrow ones (f32); by sum u16 first, u16
 * second with the top bit set for a difference; by block the u16 places of its entries, wide ones first.
 *
 * @param bytes the whole file
 * @param title what messages call it
 * @throws ApsidaryError `bad-kernel` where the bytes are not such a file, are cut short, or name what is not there
 */
export function readSeriesFile(bytes: Uint8Array, title: string): ReadonlyMap<string, PoissonSeries> {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const bad = (what: string) =>
    new ApsidaryError("bad-kernel", `${title}: ${what}; give the file as the package carries it.`);
  let at = 0;
  const next = (length: number) => {
    at += length;
    return at - length;
  };
  const text = (length: number) => {
    const start = next(length);
    return String.fromCharCode(...bytes.subarray(start, start + length)).replace(/\0+$/, "");
  };
  const u16 = () => view.getUint16(next(2), true);
  const u32 = () => view.getUint32(next(4), true);
  const f32 = () => view.getFloat32(next(4), true);
  const f64 = () => view.getFloat64(next(8), true);
  if (bytes.length < 16 || text(8) !== MAGIC) throw bad(`these ${bytes.length} bytes are not a file of series`);
  const version = u32();
  if (version !== VERSION) throw bad(`its format has version ${version}, version ${VERSION} is known`);
  try {
    const found = new Map<string, PoissonSeries>();
    for (let left = u32(); left > 0; left--) {
      const series = readSeries();
      found.set(series.name, series);
    }
    if (at !== bytes.length) throw new RangeError("some are left over");
    return found;
  } catch (error) {
    if (error instanceof RangeError) throw bad(`its ${bytes.length} bytes do not fit together (${error.message})`);
    throw error;
  }

  /** Refuses counts that the rest of the file cannot hold, before memory is taken for them. */
  function need(count: number, size: number): void {
    if (count * size > bytes.length - at) throw new RangeError("it is cut short");
  }

  function readSeries(): PoissonSeries {
    const name = text(16);
    const [degree, bases, sums, blockCount] = [u32(), u32(), u32(), u32()];
    need(blockCount, 12);
    need(bases * degree, 8);
    need(sums, 4);
    const heads = Array.from({ length: blockCount }, () => {
      const variable = view.getUint8(at);
      const power = view.getUint8(at + 1);
      next(4);
      const wide = u32();
      const narrow = u32();
      need(wide + narrow, 10);
      return { variable, power, wide, coefficients: new Float64Array(2 * (wide + narrow)), narrow };
    });
    const rates = new Float64Array(bases * degree);
    for (let i = 0; i < rates.length; i++) rates[i] = f64();
    for (const { wide, coefficients } of heads) {
      for (let i = 0; i < 2 * wide; i++) coefficients[i] = f64();
    }
    for (const { wide, narrow, coefficients } of heads) {
      for (let i = 2 * wide; i < 2 * (wide + narrow); i++) coefficients[i] = f32();
    }
    const first = new Uint16Array(sums);
    const second = new Uint16Array(sums);
    const signs = new Float64Array(sums);
    for (let i = 0; i < sums; i++) {
      first[i] = u16();
      const word = u16();
      second[i] = word & ~MINUS_BIT;
      signs[i] = word & MINUS_BIT ? -1 : 1;
      if (Math.max(first[i] as number, second[i] as number) >= bases + i) throw new RangeError("a sum of later points");
    }
    const blocks = heads.map(({ variable, power, wide, narrow, coefficients }): SeriesBlock => {
      const places = new Uint16Array(wide + narrow);
      for (let i = 0; i < places.length; i++) {
        places[i] = u16();
        if ((places[i] as number) >= bases + sums) throw new RangeError("a place beyond the points");
      }
      if (variable > 2) throw new RangeError("a fourth variable");
      return { variable, power, places, coefficients };
    });
    return { name, degree, rates, bases, first, second, signs, blocks };
  }
}
