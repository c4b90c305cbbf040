import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { afterAll, describe, expect, it } from "vitest";
import { writeSpk } from "../../src/data/make/write-spk.ts";
import { addSegmentState, readSpk, type SpkSegment } from "../../src/ephemeris/spk.ts";

const python = "/usr/bin/python3";
const script = fileURLToPath(new URL("read-with-jplephem.py", import.meta.url));
const kernel = fileURLToPath(new URL("../../src/data/de405.bsp", import.meta.url));
const installed = spawnSync(python, ["-c", "import jplephem"]).status === 0;
const missing = installed ? "" : " (skipped: Debian's python3-jplephem is not installed)";

/** TDB days past J2000 inside a segment, both ends among them, in steps of 1/128 d, which are exact in seconds and in a Julian date. */
function datesOf(segment: SpkSegment, count: number): number[] {
  const first = Math.ceil((segment.from / 86400) * 128) / 128;
  const last = Math.floor((segment.to / 86400) * 128) / 128;
  let seed = 12345 + segment.target;
  const dates = [first, last];
  while (dates.length < count) {
    seed = (seed * 1103515245 + 12345) % 2147483648;
    dates.push(first + Math.floor((seed / 2147483648) * (last - first) * 128) / 128);
  }
  return dates;
}

function readWithJplephem(path: string, segments: readonly SpkSegment[], dates: readonly number[][]): number[][][] {
  const input = JSON.stringify({
    kernel: path,
    segments: segments.map(({ centre, target }, i) => [centre, target, dates[i]?.map((days) => 2451545 + days)]),
  });
  const run = spawnSync(python, [script], { input, encoding: "utf8", maxBuffer: 1 << 28 });
  if (run.status !== 0) throw new Error(run.stderr);
  return JSON.parse(run.stdout);
}

function compare(path: string, count: number): void {
  const { segments } = readSpk(new Uint8Array(readFileSync(path)), path);
  const dates = segments.map((segment) => datesOf(segment, count));
  const others = readWithJplephem(path, segments, dates);
  const state = new Float64Array(6);
  segments.forEach((segment, i) => {
    dates[i]?.forEach((days, k) => {
      state.fill(0);
      addSegmentState(segment, days * 86400, 1, 1, state);
      const other = others[i]?.[k] ?? [];
      const off = (j: number, unit: number) => (state[j] as number) - (other[j] ?? Number.NaN) / unit;
      // In each coordinate: a double's own step at Pluto's distance is 0.95 mm.
      const worst = Math.max(...[0, 1, 2].map((j) => Math.abs(off(j, 1))));
      expect(worst, `${segment.name}, ${days} d, km`).toBeLessThan(1e-6);
      // Double precision at the planets' distances over a record: far below 10⁻⁶ mm/s.
      const speed = Math.hypot(off(3, 86400), off(4, 86400), off(5, 86400));
      expect(speed, `${segment.name}, ${days} d, km/s`).toBeLessThan(1e-12);
    });
  });
}

describe.skipIf(!installed)(`kernels read by Debian's python3-jplephem${missing}`, () => {
  const folder = mkdtempSync(join(tmpdir(), "apsidary-"));
  afterAll(() => rmSync(folder, { recursive: true }));

  it("agree with our reader on the built-in kernel to 1 mm at 1 000 dates in each of its segments", () => {
    compare(kernel, 1000);
  });

  it("agree with our reader on a kernel in big-endian order and on segments of type 3", () => {
    const { segments } = readSpk(new Uint8Array(readFileSync(kernel)), "the built-in kernel");
    const excerpt = segments.map((segment, i) => {
      const type = i % 2 === 0 ? (2 as const) : (3 as const);
      const size = 3 * segment.coefficients;
      const records = Array.from({ length: Math.min(segment.records, 20) }, (_, r) => {
        const at = segment.start + r * segment.recordWords + 2;
        const positions = [...segment.words.subarray(at, at + size)];
        return type === 2 ? positions : [...positions, ...derivativesOf(positions, 2 / segment.recordSeconds)];
      });
      const { name, target, centre, firstStart: start, recordSeconds } = segment;
      return { name, target, centre, type, start, recordSeconds, records };
    });
    for (const byteOrder of ["big-endian", "little-endian"] as const) {
      const path = join(folder, `${byteOrder}.bsp`);
      writeFileSync(path, writeSpk(excerpt, { internalName: "an excerpt", byteOrder, comments: ["an excerpt"] }));
      compare(path, 100);
    }
  });
});

/** Coefficients of the derivative of three Chebyshev series (cₖ₋₁′ = cₖ₊₁′ + 2k cₖ), the last one zero so that the number stays. */
function derivativesOf(series: readonly number[], scale: number): number[] {
  const n = series.length / 3;
  return [0, 1, 2].flatMap((axis) => {
    const d = new Array<number>(n + 1).fill(0);
    for (let k = n - 1; k > 0; k--) d[k - 1] = (d[k + 1] ?? 0) + 2 * k * (series[axis * n + k] as number);
    d[0] = (d[0] as number) / 2;
    return d.slice(0, n).map((c) => c * scale);
  });
}
