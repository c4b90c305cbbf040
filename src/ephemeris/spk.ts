import { pointLabel } from "../bodies/point.ts";
import { ApsidaryError } from "../error.ts";
import { addChebyshev } from "../numeric/chebyshev.ts";
import { type Daf, readDaf } from "./daf.ts";

/** One segment of an SPK file: the motion of a target about a centre over a span, in Chebyshev records of equal length. */
export interface SpkSegment {
  readonly name: string;
  /** SPK ids. */
  readonly target: number;
  readonly centre: number;
  /** 2: positions; 3: positions and velocities, a series for each. */
  readonly type: 2 | 3;
  /** Span, TDB seconds past J2000. */
  readonly from: number;
  readonly to: number;
  /** Start of the first record, TDB seconds past J2000. */
  readonly firstStart: number;
  /** Length of a record, seconds. */
  readonly recordSeconds: number;
  readonly records: number;
  /** Words in a record: middle, radius, then the coefficients by component. */
  readonly recordWords: number;
  readonly coefficients: number;
  /** The words of the whole file, and the place of this segment's first record in them. */
  readonly words: Float64Array;
  readonly start: number;
}

/** An SPK file. It knows segments and Chebyshev records and nothing of files. */
export interface Spk {
  readonly name: string;
  readonly daf: Daf;
  readonly segments: readonly SpkSegment[];
}

const FRAME_J2000 = 1;

/**
 * Reads an SPK file whose segments are of types 2 and 3.
 *
 * A file with a segment of another type or frame is refused whole: left out, its body would be taken from elsewhere
 * without a word.
 *
 * @param bytes the whole file
 * @param name  what to call it in messages
 * @throws ApsidaryError `bad-kernel`
 *
 * Source: NAIF, *SPK Required Reading*, segment types 2 and 3.
 */
export function readSpk(bytes: Uint8Array, name: string): Spk {
  const daf = readDaf(bytes, name);
  if (daf.idWord !== "DAF/SPK" && daf.idWord !== "NAIF/DAF") {
    throw new ApsidaryError(
      "bad-kernel",
      `${name} is a DAF but no SPK: its kind is ${daf.idWord}. Give a file of kind DAF/SPK.`,
    );
  }
  let words = 0;
  const segments = daf.summaries.map((_, index) => {
    const segment = readSegment(daf, index, name);
    words += segment.records * segment.recordWords;
    if (words > daf.words.length) {
      throw new ApsidaryError(
        "bad-kernel",
        `${name} is damaged: its segments claim more words than the file has. Fetch it again.`,
      );
    }
    return segment;
  });
  if (segments.length === 0) throw new ApsidaryError("bad-kernel", `${name} holds no segment. Fetch the file again.`);
  return Object.freeze({ name, daf, segments: Object.freeze(segments) });
}

function readSegment(daf: Daf, index: number, file: string): SpkSegment {
  const { doubles, integers, name } = daf.summaries[index] as (typeof daf.summaries)[number];
  const [from = Number.NaN, to = Number.NaN] = doubles;
  const [target = -1, centre = -1, frame = 0, type = 0, first = 0, last = 0] = integers;
  const label = `${file}, segment ${index + 1} (${pointLabel(target)} about ${pointLabel(centre)}),`;
  const fail = (what: string) => new ApsidaryError("bad-kernel", `${label} ${what}`);
  if (doubles.length !== 2 || integers.length !== 6) throw fail("is not laid out as an SPK segment.");
  if (type !== 2 && type !== 3) throw fail(`is of type ${type}; types 2 and 3 are read. Leave it out of the file.`);
  if (frame !== FRAME_J2000) throw fail(`is in frame ${frame}; frame 1 (J2000/ICRF) is read.`);
  if (first < 1 || last < first + 4 || last > daf.words.length) {
    throw fail(
      `is cut short: it needs words ${first} to ${last}, the file has ${daf.words.length}. Fetch the file again.`,
    );
  }
  const [firstStart = Number.NaN, recordSeconds = Number.NaN, recordWords = 0, records = 0] = daf.words.subarray(
    last - 4,
    last,
  );
  const series = type === 2 ? 3 : 6;
  const coefficients = (recordWords - 2) / series;
  if (
    !(recordSeconds > 0 && recordSeconds < Infinity) ||
    !Number.isFinite(firstStart) ||
    !Number.isInteger(records) ||
    records < 1 ||
    !Number.isInteger(coefficients) ||
    coefficients < 1 ||
    records * recordWords + 4 !== last - first + 1
  ) {
    throw fail(
      `claims ${records} records of ${recordWords} words and ${recordSeconds} s, which do not fit its ${last - first + 1} words.`,
    );
  }
  const slack = 1e-3 * recordSeconds;
  if (!(from < to) || from < firstStart - slack || to > firstStart + records * recordSeconds + slack) {
    throw fail(`says that it covers ${from} to ${to} s past J2000, which its records do not.`);
  }
  for (let record = 0; record < records; record++) {
    const at = first - 1 + record * recordWords;
    const middle = daf.words[at] as number;
    const radius = daf.words[at + 1] as number;
    const start = firstStart + record * recordSeconds;
    if (!(middle - radius <= start + slack && middle + radius >= start + recordSeconds - slack && radius < Infinity)) {
      throw fail(
        `is damaged: its record ${record + 1} should cover ${recordSeconds} s from ${start}, and has its middle at ${middle}, radius ${radius}.`,
      );
    }
  }
  return Object.freeze({
    name,
    target,
    centre,
    type,
    from,
    to,
    firstStart,
    recordSeconds,
    records,
    recordWords,
    coefficients,
    words: daf.words,
    start: first - 1,
  });
}

/**
 * Adds a segment's state, or takes it away.
 *
 * @param segment the segment
 * @param tdb     TDB seconds past J2000, inside the segment's span (outside it the nearest record is extrapolated)
 * @param sign    +1 or −1
 * @param order   0: position; 1: and velocity; 2: and acceleration
 * @param out     x, y, z (km), their rates (km/s), their second derivatives (km/s²); `3·(order + 1)` places are added to
 */
export function addSegmentState(
  segment: SpkSegment,
  tdb: number,
  sign: number,
  order: number,
  out: Float64Array,
): void {
  const { words, coefficients: n } = segment;
  let record = Math.floor((tdb - segment.firstStart) / segment.recordSeconds);
  if (record < 0) record = 0;
  else if (record >= segment.records) record = segment.records - 1;
  const at = segment.start + record * segment.recordWords;
  const scale = 1 / (words[at + 1] as number);
  const s = (tdb - (words[at] as number)) * scale;
  const first = at + 2;
  if (segment.type === 2) {
    addChebyshev(words, first, n, s, scale, sign, order, out, 0);
    return;
  }
  addChebyshev(words, first, n, s, scale, sign, 0, out, 0);
  if (order > 0) addChebyshev(words, first + 3 * n, n, s, scale, sign, order - 1, out, 3);
}
