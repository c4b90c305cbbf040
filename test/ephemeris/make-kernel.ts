/** A path: x, y, z (km) at a time (TDB seconds past J2000). */
export type Path = (tdb: number) => readonly [number, number, number];

/** A segment to be written. What is left out: type 2, frame 1, records of 8 days, 12 coefficients. */
export interface SegmentGiven {
  readonly target: number;
  readonly centre: number;
  readonly from: number;
  readonly to: number;
  readonly path: Path;
  /** 2 and 3 are written as such; any other number only stands in the summary. */
  readonly type?: number;
  readonly frame?: number;
  readonly recordSeconds?: number;
  readonly coefficients?: number;
}

/** How a file is to be written. */
export interface KernelGiven {
  readonly byteOrder?: "little-endian" | "big-endian";
  readonly idWord?: string;
  readonly format?: string;
  readonly comments?: string;
}

const RECORD_WORDS = 128;
const SUMMARY_WORDS = 5;
const SUMMARIES_A_RECORD = 25;

/**
 * Writes a small SPK file, for the checks: paths interpolated at Chebyshev nodes, the velocities of type 3 as the
 * derivative of that series.
 *
 * Source: NAIF, *DAF Required Reading* and *SPK Required Reading*, segment types 2 and 3.
 */
export function makeKernel(segments: readonly SegmentGiven[], given: KernelGiven = {}): Uint8Array {
  const { byteOrder = "little-endian", idWord = "DAF/SPK ", comments = "" } = given;
  const little = byteOrder === "little-endian";
  const commentRecords = Math.ceil((comments.length + 1) / 1000) * (comments ? 1 : 0);
  const summaryRecords = Math.max(1, Math.ceil(segments.length / SUMMARIES_A_RECORD));
  const firstSummary = 2 + commentRecords;
  const arrays = segments.map(wordsOf);
  const firstWord = (firstSummary - 1 + 2 * summaryRecords) * RECORD_WORDS + 1;
  const total = firstWord - 1 + arrays.reduce((sum, array) => sum + array.length, 0);
  const bytes = new Uint8Array(Math.ceil(total / RECORD_WORDS) * RECORD_WORDS * 8);
  const view = new DataView(bytes.buffer);
  const text = (at: number, value: string) => {
    for (let i = 0; i < value.length; i++) bytes[at + i] = value.charCodeAt(i);
  };
  text(0, idWord);
  view.setInt32(8, 2, little);
  view.setInt32(12, 6, little);
  text(16, "a kernel made for checks".padEnd(60));
  view.setInt32(76, firstSummary, little);
  view.setInt32(80, firstSummary + 2 * (summaryRecords - 1), little);
  view.setInt32(84, total + 1, little);
  text(88, given.format ?? (little ? "LTL-IEEE" : "BIG-IEEE"));
  text(699, "FTPSTR:\r:\n:\r\n:\r\x00:\x81:\x10\xce:ENDFTP");
  if (comments) text(1024, `${comments.replaceAll("\n", "\0")}\x04`); // one record of comments is enough here
  let word = firstWord;
  segments.forEach((segment, index) => {
    const record = firstSummary + 2 * Math.floor(index / SUMMARIES_A_RECORD);
    const place = index % SUMMARIES_A_RECORD;
    const start = (record - 1) * RECORD_WORDS * 8;
    view.setFloat64(start + 16, place + 1, little);
    const isFinal = record === firstSummary + 2 * (summaryRecords - 1);
    view.setFloat64(start, isFinal ? 0 : record + 2, little);
    view.setFloat64(start + 8, record === firstSummary ? 0 : record - 2, little);
    const at = start + 8 * (3 + place * SUMMARY_WORDS);
    view.setFloat64(at, segment.from, little);
    view.setFloat64(at + 8, segment.to, little);
    const array = arrays[index] ?? [];
    [segment.target, segment.centre, segment.frame ?? 1, segment.type ?? 2, word, word + array.length - 1].forEach(
      (value, i) => {
        view.setInt32(at + 16 + 4 * i, value, little);
      },
    );
    text(start + 1024 + 40 * place, `segment ${index + 1}`.padEnd(40));
    array.forEach((value, i) => {
      view.setFloat64(8 * (word - 1 + i), value, little);
    });
    word += array.length;
  });
  return bytes;
}

function wordsOf(segment: SegmentGiven): number[] {
  const { from, to, path, type = 2, recordSeconds = 8 * 86400, coefficients = 12 } = segment;
  const records = Math.ceil((to - from) / recordSeconds);
  const words: number[] = [];
  for (let record = 0; record < records; record++) {
    const radius = recordSeconds / 2;
    const middle = from + (record + 0.5) * recordSeconds;
    const series = interpolate((s) => path(middle + s * radius), coefficients);
    words.push(middle, radius, ...series.flat());
    if (type === 3) words.push(...series.flatMap((c) => derivative(c).map((x) => x / radius)));
  }
  const width = 2 + (type === 3 ? 6 : 3) * coefficients;
  words.push(from, recordSeconds, width, records);
  return words;
}

/** Chebyshev coefficients of x, y and z through the n zeros of Tₙ. */
function interpolate(f: (s: number) => readonly [number, number, number], n: number): number[][] {
  const angles = Array.from({ length: n }, (_, j) => (Math.PI * (j + 0.5)) / n);
  const values = angles.map((angle) => f(Math.cos(angle)));
  return [0, 1, 2].map((axis) =>
    angles.map((_, k) => {
      let sum = 0;
      angles.forEach((angle, j) => {
        sum += (values[j]?.[axis] ?? 0) * Math.cos(k * angle);
      });
      return ((k === 0 ? 1 : 2) * sum) / n;
    }),
  );
}

/** Coefficients of the derivative of a Chebyshev series, as many as were given: d(k−1) = d(k+1) + 2k c(k), halved for k − 1 = 0. */
function derivative(c: readonly number[]): number[] {
  const d = new Array<number>(c.length + 1).fill(0);
  for (let k = c.length - 1; k > 0; k--) d[k - 1] = (d[k + 1] ?? 0) + 2 * k * (c[k] ?? 0);
  d[0] = (d[0] ?? 0) / 2;
  return d.slice(0, c.length);
}
