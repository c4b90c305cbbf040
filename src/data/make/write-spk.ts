/** A segment to be written: Chebyshev records of equal length. Times in TDB seconds past J2000, km, km/s. */
export interface SpkSegmentContent {
  /** Up to 40 characters. */
  readonly name: string;
  /** SPK ids. */
  readonly target: number;
  readonly centre: number;
  /** 2: series for x, y, z. 3: those, then series for their rates. */
  readonly type: 2 | 3;
  /** Start of the first record and length of each. */
  readonly start: number;
  readonly recordSeconds: number;
  /** The coefficients of each record: of x, then y, then z (then their rates), the same number for each. */
  readonly records: readonly ArrayLike<number>[];
}

/** What the file is called and in which byte order it is written. */
export interface SpkOptions {
  /** Up to 60 characters. */
  readonly internalName: string;
  readonly byteOrder?: "little-endian" | "big-endian";
  /** Lines of the comment area: printable ASCII, up to 1000 characters each. */
  readonly comments?: readonly string[];
}

const RECORD_BYTES = 1024;
const RECORD_WORDS = 128;
const COMMENT_BYTES = 1000;
const SUMMARY_WORDS = 5;
const SUMMARIES_PER_RECORD = 25;
/** SPK id of the frame; the ICRF is written under it. */
const J2000_FRAME = 1;
/** By these characters a reader sees whether a text-mode transfer has changed the file. */
const TRANSFER_CHECK = "FTPSTR:\r:\n:\r\n:\r\x00:\x81:\x10\xce:ENDFTP";

/**
 * Writes an SPK file (DAF/SPK) whose segments are of type 2 or 3. The same call gives the same bytes.
 *
 * @returns the whole file
 * @throws Error where a record has another number of coefficients than the first
 *
 * Source: NAIF, *DAF Required Reading* and *SPK Required Reading* (the formats as published).
 */
export function writeSpk(segments: readonly SpkSegmentContent[], options: SpkOptions): Uint8Array {
  const little = options.byteOrder !== "big-endian";
  const comments = (options.comments ?? []).map((line) => `${line}\0`).join("") + (options.comments ? "\x04" : "");
  const commentRecords = Math.ceil(comments.length / COMMENT_BYTES);
  const summaryRecords = Math.max(1, Math.ceil(segments.length / SUMMARIES_PER_RECORD));
  const firstSummaryRecord = 2 + commentRecords;
  const firstDataWord = (firstSummaryRecord - 1 + 2 * summaryRecords) * RECORD_WORDS + 1;
  const sizes = segments.map((segment) => segment.records.length * recordWords(segment) + 4);
  const endWord = firstDataWord + sizes.reduce((sum, size) => sum + size, 0); // the first free word
  const bytes = new Uint8Array(Math.ceil((endWord - 1) / RECORD_WORDS) * RECORD_BYTES);
  const view = new DataView(bytes.buffer);
  const text = (at: number, value: string, length: number): void => {
    for (let i = 0; i < length; i++) bytes[at + i] = i < value.length ? value.charCodeAt(i) & 0xff : 0x20;
  };
  const word = (number: number, value: number): void => view.setFloat64(8 * (number - 1), value, little);

  text(0, "DAF/SPK", 8);
  view.setInt32(8, 2, little);
  view.setInt32(12, 6, little);
  text(16, options.internalName, 60);
  view.setInt32(76, firstSummaryRecord, little);
  view.setInt32(80, firstSummaryRecord + 2 * (summaryRecords - 1), little);
  view.setInt32(84, endWord, little);
  text(88, little ? "LTL-IEEE" : "BIG-IEEE", 8);
  text(699, TRANSFER_CHECK, TRANSFER_CHECK.length);
  for (let i = 0; i < commentRecords; i++) {
    const part = comments.slice(i * COMMENT_BYTES, (i + 1) * COMMENT_BYTES);
    text((1 + i) * RECORD_BYTES, part, part.length);
  }

  let at = firstDataWord;
  for (let block = 0; block < summaryRecords; block++) {
    const record = firstSummaryRecord + 2 * block;
    const inBlock = segments.slice(block * SUMMARIES_PER_RECORD, (block + 1) * SUMMARIES_PER_RECORD);
    const control = (record - 1) * RECORD_WORDS + 1;
    word(control, block + 1 < summaryRecords ? record + 2 : 0);
    word(control + 1, block > 0 ? record - 2 : 0);
    word(control + 2, inBlock.length);
    text(record * RECORD_BYTES, "", RECORD_BYTES);
    inBlock.forEach((segment, i) => {
      const { start, recordSeconds, records } = segment;
      const summary = control + 3 + i * SUMMARY_WORDS;
      word(summary, start);
      word(summary + 1, start + records.length * recordSeconds);
      const size = sizes[block * SUMMARIES_PER_RECORD + i] as number;
      const integers = [segment.target, segment.centre, J2000_FRAME, segment.type, at, at + size - 1];
      integers.forEach((value, k) => {
        view.setInt32(8 * (summary + 1) + 4 * k, value, little);
      });
      text(record * RECORD_BYTES + i * 8 * SUMMARY_WORDS, segment.name, 8 * SUMMARY_WORDS);
      records.forEach((coefficients, index) => {
        if (coefficients.length + 2 !== recordWords(segment))
          throw new Error(`${segment.name}: records of unequal length`);
        word(at, start + (index + 0.5) * recordSeconds);
        word(at + 1, recordSeconds / 2);
        for (let k = 0; k < coefficients.length; k++) word(at + 2 + k, coefficients[k] as number);
        at += coefficients.length + 2;
      });
      word(at, start);
      word(at + 1, recordSeconds);
      word(at + 2, recordWords(segment));
      word(at + 3, records.length);
      at += 4;
    });
  }
  return bytes;
}

function recordWords(segment: SpkSegmentContent): number {
  return (segment.records[0]?.length ?? 0) + 2;
}
