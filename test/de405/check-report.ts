import type { PairCheck, PassageError } from "./check-source.ts";

/** A source's checks in figures. */
interface Figures {
  readonly rmsSeconds: number;
  readonly maxSeconds: number;
  readonly rmsKm: number;
  readonly maxKm: number;
  /** Share of errors within the stated half-width. */
  readonly timeCoverage: number;
  readonly distanceCoverage: number;
  /** Medians of the stated half-widths, s and km; then over the rms of the errors. */
  readonly statedSeconds: number;
  readonly statedKm: number;
  readonly timeWidth: number;
  readonly distanceWidth: number;
}

/** What a report says and which limits it found broken. */
export interface CheckReport {
  /** Markdown: a table and a histogram. */
  readonly text: string;
  /** One line each. */
  readonly broken: readonly string[];
}

/** Pairs with so many passages that coverage and width of the stated half-widths mean something. */
const COUNTED_PAIRS = ["moon-earth", "mercury-sun", "venus-sun", "earth-sun", "emb-sun", "mars-sun", "earth-ssb"];

/** The built-in kernel: what the refit may add to the moment of a passage, seconds, and to its distance, km. Pluto: not promised. */
const KERNEL_SECONDS: Record<string, number> = {
  moon: 0.3,
  mercury: 0.3,
  venus: 0.3,
  earth: 0.3,
  emb: 0.3,
  mars: 0.3,
  jupiter: 1,
  saturn: 1,
  uranus: 1,
  neptune: 10,
};
const KERNEL_KM = 0.005;
/** Stated half-widths: at least this share of the errors lies inside, and their median is at most so many times the rms, by source. */
const COVERAGE = 0.95;
const WIDTH: Record<string, number> = { engine: 3, series: 4 };

const rms = (values: readonly number[]) => Math.sqrt(values.reduce((sum, x) => sum + x * x, 0) / values.length);
const median = (values: readonly number[]) => [...values].sort((a, b) => a - b)[values.length >> 1] ?? Number.NaN;

function figuresOf(errors: readonly PassageError[]): Figures {
  const seconds = errors.map((it) => Math.abs(it.seconds));
  const km = errors.map((it) => Math.abs(it.km));
  const share = (inside: (it: PassageError) => boolean) => errors.filter(inside).length / errors.length;
  const statedSeconds = median(errors.map((it) => it.statedSeconds));
  const statedKm = median(errors.map((it) => it.statedKm));
  return {
    rmsSeconds: rms(seconds),
    maxSeconds: Math.max(...seconds),
    rmsKm: rms(km),
    maxKm: Math.max(...km),
    timeCoverage: share((it) => Math.abs(it.seconds) <= it.statedSeconds),
    distanceCoverage: share((it) => Math.abs(it.km) <= it.statedKm),
    statedSeconds,
    statedKm,
    timeWidth: statedSeconds / rms(seconds),
    distanceWidth: statedKm / rms(km),
  };
}

/**
 * Makes the table of a source's errors against DE405, with a histogram of error over stated half-width, and tests the limits.
 *
 * @param source `kernel`, `series` or `engine`
 */
export function checkReport(source: string, checks: readonly PairCheck[]): CheckReport {
  const broken: string[] = [];
  const rows = checks.map((check) => {
    const figures = figuresOf(check.errors);
    broken.push(...brokenLimits(source, check, figures));
    const found = check.errors.length + check.extra.length;
    const cells = [
      check.pair,
      check.trueCount,
      found,
      check.missed.length,
      check.extra.length,
      `${time(figures.rmsSeconds)} / ${time(figures.maxSeconds)}`,
      `${distance(figures.rmsKm)} / ${distance(figures.maxKm)}`,
      `${percent(figures.timeCoverage)} / ${percent(figures.distanceCoverage)}`,
      `${time(figures.statedSeconds)} / ${distance(figures.statedKm)}`,
      `${width(figures.timeWidth)} / ${width(figures.distanceWidth)}`,
    ];
    return `| ${cells.join(" | ")} |`;
  });
  const text = [
    "| pair | true | found | missed | extra | time error, rms / max | distance error, rms / max | inside the stated half-width, time / distance | stated half-width, median, time / distance | ÷ rms error |",
    "|---|---|---|---|---|---|---|---|---|---|",
    ...rows,
    "",
    `Error ÷ stated half-width, % of passages, ${COUNTED_PAIRS.join(", ")} counting alike:`,
    "",
    "```text",
    ...histogram(checks),
    "```",
  ].join("\n");
  return { text, broken };
}

function brokenLimits(source: string, { pair, missed, extra }: PairCheck, figures: Figures): string[] {
  const broken: string[] = [];
  const hold = (kept: boolean, what: string) => {
    if (!kept) broken.push(`${source}, ${pair}: ${what}`);
  };
  if (source === "kernel") {
    const limit = KERNEL_SECONDS[pair.split("-")[0] ?? ""] ?? Number.POSITIVE_INFINITY;
    hold(
      missed.length === 0 && extra.length === 0,
      `${missed.length} passages missed, ${extra.length} doubled or made up`,
    );
    hold(figures.maxSeconds <= limit, `${time(figures.maxSeconds)} in time, allowed ${limit} s`);
    hold(figures.maxKm <= KERNEL_KM, `${distance(figures.maxKm)} in distance, allowed ${distance(KERNEL_KM)}`);
  }
  if (!COUNTED_PAIRS.includes(pair)) return broken;
  hold(
    missed.length === 0 && extra.length === 0,
    `${missed.length} passages missed, ${extra.length} doubled or made up`,
  );
  hold(figures.timeCoverage >= COVERAGE, `the half-widths of time hold only ${percent(figures.timeCoverage)}`);
  hold(
    figures.distanceCoverage >= COVERAGE,
    `the half-widths of distance hold only ${percent(figures.distanceCoverage)}`,
  );
  // The kernel's half-widths bound DE405's own error, which this comparison cannot see.
  if (source === "kernel") return broken;
  // Nor can it see where the barycentre truly lies: DE405 knew no masses beyond Neptune, which is most of the series' half-width there.
  if (source === "series" && pair.endsWith("-ssb")) return broken;
  const most = WIDTH[source] ?? 0;
  hold(figures.timeWidth <= most, `the median half-width of time is ${width(figures.timeWidth)} × the rms error`);
  hold(
    figures.distanceWidth <= most,
    `the median half-width of distance is ${width(figures.distanceWidth)} × the rms error`,
  );
  return broken;
}

const BINS = 12;
const BIN = 0.1;
const BAR = 40;

/** Lines of a histogram with bins of a tenth, for time and distance side by side. */
function histogram(checks: readonly PairCheck[]): string[] {
  const counted = checks.filter(({ pair }) => COUNTED_PAIRS.includes(pair));
  const shares = (ratio: (it: PassageError) => number): number[] => {
    const bins = new Array<number>(BINS + 1).fill(0);
    for (const { errors } of counted) {
      for (const error of errors) {
        const bin = Math.min(Math.floor(Math.abs(ratio(error)) / BIN), BINS);
        bins[bin] = (bins[bin] ?? 0) + 100 / errors.length / counted.length;
      }
    }
    return bins;
  };
  const inTime = shares((it) => it.seconds / it.statedSeconds);
  const inDistance = shares((it) => it.km / it.statedKm);
  const most = Math.max(...inTime, ...inDistance);
  const bar = (share: number) =>
    `${share.toFixed(1).padStart(5)} ${"█".repeat(Math.round((share / most) * BAR)).padEnd(BAR)}`;
  const lines = inTime.map((share, i) => {
    const label =
      i < BINS ? `${(i * BIN).toFixed(1)}–${((i + 1) * BIN).toFixed(1)}` : `over ${(BINS * BIN).toFixed(1)}`;
    return `${label.padEnd(9)}${bar(share)}  ${bar(inDistance[i] ?? 0)}`.trimEnd();
  });
  return [`${" ".repeat(9)}${"time".padEnd(BAR + 8)}distance`, ...lines];
}

function time(seconds: number): string {
  if (seconds < 60) return `${digits(seconds)} s`;
  if (seconds < 7200) return `${digits(seconds / 60)} min`;
  return seconds < 172800 ? `${digits(seconds / 3600)} h` : `${digits(seconds / 86400)} d`;
}

function distance(km: number): string {
  return km < 1 ? `${digits(km * 1000)} m` : `${digits(km)} km`;
}

/** Two significant digits, no exponent. */
function digits(value: number): string {
  if (value < 0.001) return "< 0.001";
  return value >= 10 ? value.toFixed(0) : Number(value.toPrecision(2)).toString();
}

function percent(share: number): string {
  return `${(100 * share).toFixed(share === 1 ? 0 : 1)} %`;
}

function width(ratio: number): string {
  return ratio >= 100 ? "> 100" : digits(ratio);
}
