import type { Point } from "./argument-chain.ts";

/** A series to be written: its points and, by variable and power, the entries with the place of their point. */
export interface SeriesToWrite {
  readonly name: string;
  /** Number of rates of each base. */
  readonly degree: number;
  readonly points: readonly Point[];
  readonly entries: readonly {
    readonly variable: number;
    readonly power: number;
    readonly place: number;
    readonly cosine: number;
    readonly sine: number;
  }[];
  /** Entries with a greater amplitude are written with 8 bytes a number, others with 4. */
  readonly wideAbove: readonly number[];
}

const SUM_SIGN_BIT = 0x8000;

/**
 * Lays out series in the file format that `src/ephemeris/series-file.ts` reads and describes.
 *
 * @throws RangeError where a series has more points than a place can name
 */
export function writeSeriesFile(all: readonly SeriesToWrite[]): Uint8Array {
  const out: number[] = [];
  const scratch = new DataView(new ArrayBuffer(8));
  const written = (length: number) => {
    for (let i = 0; i < length; i++) out.push(scratch.getUint8(i));
  };
  const u8 = (x: number) => {
    out.push(x);
  };
  const u16 = (x: number) => {
    scratch.setUint16(0, x, true);
    written(2);
  };
  const u32 = (x: number) => {
    scratch.setUint32(0, x, true);
    written(4);
  };
  const f32 = (x: number) => {
    scratch.setFloat32(0, x, true);
    written(4);
  };
  const f64 = (x: number) => {
    scratch.setFloat64(0, x, true);
    written(8);
  };
  const text = (s: string, length: number) => {
    for (let i = 0; i < length; i++) u8(i < s.length ? s.charCodeAt(i) : 0);
  };
  text("APSERIES", 8);
  u32(1); // version of the format
  u32(all.length);
  for (const { name, degree, points, entries, wideAbove } of all) {
    if (points.length > SUM_SIGN_BIT) throw new RangeError(`${name} has ${points.length} points`);
    const bases = points.flatMap((point) => ("rates" in point ? [point.rates] : []));
    const sums = points.flatMap((point) => ("rates" in point ? [] : [point]));
    const blocks = blocksOf(entries, wideAbove);
    text(name, 16);
    for (const n of [degree, bases.length, sums.length, blocks.length]) u32(n);
    for (const { variable, power, wide, narrow } of blocks) {
      u8(variable);
      u8(power);
      u16(0);
      u32(wide.length);
      u32(narrow.length);
    }
    for (const rates of bases) for (let k = 0; k < degree; k++) f64(rates[k] ?? 0);
    for (const e of blocks.flatMap(({ wide }) => wide)) {
      f64(e.cosine);
      f64(e.sine);
    }
    for (const e of blocks.flatMap(({ narrow }) => narrow)) {
      f32(e.cosine);
      f32(e.sine);
    }
    for (const { first, second, sign } of sums) {
      u16(first);
      u16(second | (sign < 0 ? SUM_SIGN_BIT : 0));
    }
    for (const { wide, narrow } of blocks) for (const e of [...wide, ...narrow]) u16(e.place);
  }
  return Uint8Array.from(out);
}

function blocksOf(entries: SeriesToWrite["entries"], wideAbove: readonly number[]) {
  const blocks: { variable: number; power: number; wide: typeof entries; narrow: typeof entries }[] = [];
  for (let variable = 0; variable < 3; variable++) {
    for (let power = 0; power < 6; power++) {
      const own = entries.filter((e) => e.variable === variable && e.power === power);
      if (own.length === 0) continue;
      const isWide = (e: (typeof own)[number]) => Math.hypot(e.cosine, e.sine) > (wideAbove[variable] ?? 0);
      const byPlace = (a: (typeof own)[number], b: (typeof own)[number]) => a.place - b.place;
      blocks.push({
        variable,
        power,
        wide: own.filter(isWide).sort(byPlace),
        narrow: own.filter((e) => !isWide(e)).sort(byPlace),
      });
    }
  }
  return blocks;
}
