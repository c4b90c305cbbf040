import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import type { TruePassage } from "../de405/true-passages.ts";

let opened: Promise<Ephemeris> | undefined;

/** Opens the built-in sources, once for all tests of a file. */
export function builtIn(): Promise<Ephemeris> {
  opened ??= openSources();
  return opened;
}

/** Root of the mean square. */
export function rms(values: readonly number[]): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

export function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

/** Mean square of the deviations from the mean. */
export function variance(values: readonly number[]): number {
  return rms(values.map((value) => value - mean(values))) ** 2;
}

/** The coefficient of correlation. */
export function correlation(a: readonly number[], b: readonly number[]): number {
  const [meanA, meanB] = [mean(a), mean(b)];
  const product = mean(a.map((value, i) => (value - meanA) * ((b[i] ?? 0) - meanB)));
  return product / Math.sqrt(variance(a) * variance(b));
}

/** The nearest passage of a kind. */
export function nearestTo(passages: readonly TruePassage[], kind: string, tdb: number): TruePassage {
  const ofKind = passages.filter((passage) => passage.kind === kind);
  return ofKind.reduce((best, one) => (Math.abs(one.tdb - tdb) < Math.abs(best.tdb - tdb) ? one : best));
}
