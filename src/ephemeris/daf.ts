import { ApsidaryError } from "../error.ts";

/** One summary of a DAF: the description of an array and where its words lie. */
export interface DafSummary {
  readonly name: string;
  readonly doubles: readonly number[];
  readonly integers: readonly number[];
}

/** A DAF (double precision array file), read whole. It knows records and byte order and nothing of orbits. */
export interface Daf {
  /** First eight characters, such as `DAF/SPK`. */
  readonly idWord: string;
  readonly internalName: string;
  readonly byteOrder: "little-endian" | "big-endian";
  readonly comments: string;
  readonly summaries: readonly DafSummary[];
  /** All words of the file as doubles; word *k* of the format (counted from 1) is `words[k - 1]`. */
  readonly words: Float64Array;
}

const RECORD_BYTES = 1024;
const RECORD_WORDS = 128;
/** The characters by which a DAF shows that no text-mode transfer has changed it. */
const TRANSFER_CHECK = "FTPSTR:\r:\n:\r\n:\r\x00:\x81:\x10\xce:ENDFTP";

/**
 * Reads a DAF in either byte order.
 *
 * @param bytes the whole file; not changed, and kept as the memory of `words` where its byte order allows
 * @param name  what to call the file in messages
 * @throws ApsidaryError `bad-kernel`: not a DAF, truncated, changed by a text-mode transfer, or records that point nowhere
 *
 * Source: NAIF, *DAF Required Reading* (format as published with the SPK files).
 */
export function readDaf(bytes: Uint8Array, name: string): Daf {
  const fail = (what: string) => new ApsidaryError("bad-kernel", `${name} ${what}`);
  const idWord = latin(bytes, 0, 8);
  if (!idWord.startsWith("DAF/") && !idWord.startsWith("NAIF/DAF")) {
    throw fail(
      `is not a DAF: it begins with ${JSON.stringify(line(bytes, 0, 8))}, a kernel begins with "DAF/SPK". Give an SPK file.`,
    );
  }
  if (bytes.length < RECORD_BYTES) {
    throw fail(
      `is cut short: ${bytes.length} bytes, and the first record alone has ${RECORD_BYTES}. Fetch the file again.`,
    );
  }
  checkTransfer(bytes, fail);
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const little = byteOrderOf(view, bytes, fail);
  const doubles = view.getInt32(8, little);
  const integers = view.getInt32(12, little);
  const firstSummaryRecord = view.getInt32(76, little);
  if (doubles < 0 || doubles > 124 || integers < 2 || integers > 250) {
    throw fail(`has a damaged first record: summaries of ${doubles} doubles and ${integers} integers.`);
  }
  const summaries = readSummaries(bytes, view, little, firstSummaryRecord, doubles, integers, fail);
  return Object.freeze({
    idWord: line(bytes, 0, 8),
    internalName: line(bytes, 16, 60),
    byteOrder: little ? "little-endian" : "big-endian",
    comments: readComments(bytes, firstSummaryRecord),
    summaries,
    words: wordsOf(bytes, little),
  });
}

type Fail = (what: string) => ApsidaryError;

function latin(bytes: Uint8Array, start: number, length: number): string {
  let text = "";
  for (const byte of bytes.subarray(start, start + length)) text += String.fromCharCode(byte);
  return text;
}

/** The same as one line that may be shown: no character that moves a terminal's cursor. */
function line(bytes: Uint8Array, start: number, length: number): string {
  return printable(latin(bytes, start, length))
    .replaceAll("\n", " ")
    .trimEnd();
}

function printable(text: string): string {
  return text.replace(/[^\P{Cc}\n]/gu, " ");
}

function checkTransfer(bytes: Uint8Array, fail: Fail): void {
  const record = latin(bytes, 0, RECORD_BYTES);
  const start = record.indexOf("FTPSTR");
  if (start >= 0 && !record.startsWith(TRANSFER_CHECK, start)) {
    throw fail(
      "was changed by a text-mode transfer (its check characters are altered). Fetch it again in binary mode.",
    );
  }
}

function byteOrderOf(view: DataView, bytes: Uint8Array, fail: Fail): boolean {
  const format = latin(bytes, 88, 8);
  if (format === "LTL-IEEE") return true;
  if (format === "BIG-IEEE") return false;
  if (latin(bytes, 0, 8) === "NAIF/DAF") {
    // Old files do not say. The number of doubles in a summary is small in the right order and huge in the other.
    if (view.getUint32(8, true) < 256) return true;
    if (view.getUint32(8, false) < 256) return false;
  }
  throw fail(`has a number format that is not read: ${JSON.stringify(line(bytes, 88, 8))}; LTL-IEEE and BIG-IEEE are.`);
}

function wordsOf(bytes: Uint8Array, little: boolean): Float64Array {
  const count = Math.floor(bytes.length / 8);
  const hostIsLittle = new Uint8Array(new Uint16Array([1]).buffer)[0] === 1;
  if (little === hostIsLittle && bytes.byteOffset % 8 === 0) {
    return new Float64Array(bytes.buffer, bytes.byteOffset, count);
  }
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const words = new Float64Array(count);
  for (let i = 0; i < count; i++) words[i] = view.getFloat64(8 * i, little);
  return words;
}

function readComments(bytes: Uint8Array, firstSummaryRecord: number): string {
  let text = "";
  for (let record = 2; record < firstSummaryRecord && record * RECORD_BYTES <= bytes.length; record++) {
    text += latin(bytes, (record - 1) * RECORD_BYTES, 1000);
  }
  const end = text.indexOf("\x04");
  return printable((end < 0 ? text : text.slice(0, end)).replaceAll("\0", "\n")).trimEnd();
}

function readSummaries(
  bytes: Uint8Array,
  view: DataView,
  little: boolean,
  firstRecord: number,
  doubles: number,
  integers: number,
  fail: Fail,
): DafSummary[] {
  const summaries: DafSummary[] = [];
  const summaryWords = doubles + Math.floor((integers + 1) / 2);
  const seen = new Set<number>();
  for (let record = firstRecord; record !== 0; ) {
    const start = (record - 1) * RECORD_BYTES;
    if (!Number.isInteger(record) || record < 2 || start + 2 * RECORD_BYTES > bytes.length) {
      throw fail(
        `is cut short or damaged: summary record ${record} lies outside its ${bytes.length} bytes. Fetch it again.`,
      );
    }
    if (seen.has(record)) throw fail(`is damaged: its summary records form a ring at record ${record}.`);
    seen.add(record);
    const count = view.getFloat64(start + 16, little);
    if (!Number.isInteger(count) || count < 0 || 3 + count * summaryWords > RECORD_WORDS) {
      throw fail(`is damaged: summary record ${record} claims ${count} summaries.`);
    }
    for (let i = 0; i < count; i++) {
      const at = start + 8 * (3 + i * summaryWords);
      summaries.push({
        name: line(bytes, start + RECORD_BYTES + i * 8 * summaryWords, 8 * summaryWords),
        doubles: Array.from({ length: doubles }, (_, k) => view.getFloat64(at + 8 * k, little)),
        integers: Array.from({ length: integers }, (_, k) => view.getInt32(at + 8 * doubles + 4 * k, little)),
      });
    }
    record = view.getFloat64(start, little);
  }
  return summaries;
}
