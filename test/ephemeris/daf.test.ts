import { describe, expect, test } from "vitest";
import { readDaf } from "../../src/ephemeris/daf.ts";
import { makeKernel } from "./make-kernel.ts";
import { circle, fourSegments, refusal, SPAN } from "./paths.ts";

const good = (given = {}) => makeKernel(fourSegments(), { comments: "line one\nline two", ...given });
/** The place of the first summary record: one first record and one of comments before it. */
const SUMMARY = 2048;

function changed(change: (view: DataView, bytes: Uint8Array) => void, bytes = good()): Uint8Array {
  change(new DataView(bytes.buffer), bytes);
  return bytes;
}

function refused(bytes: Uint8Array): string {
  const { code, message } = refusal(() => readDaf(bytes, "a.bsp"));
  expect(code).toBe("bad-kernel");
  expect(message).toMatch(/^a\.bsp .+\.$/);
  expect(message).not.toMatch(/\p{Cc}/u);
  return message;
}

describe("readDaf", () => {
  test.each(["little-endian", "big-endian"] as const)(
    "reads summaries, names, comments and words of a %s file",
    (byteOrder) => {
      const daf = readDaf(good({ byteOrder }), "a.bsp");
      expect(daf.idWord).toBe("DAF/SPK");
      expect(daf.byteOrder).toBe(byteOrder);
      expect(daf.internalName).toBe("a kernel made for checks");
      expect(daf.comments).toBe("line one\nline two");
      expect(daf.summaries.map((s) => [s.name, ...s.doubles, ...s.integers.slice(0, 4)])).toEqual([
        ["segment 1", SPAN.from, SPAN.to, 3, 0, 1, 2],
        ["segment 2", SPAN.from, SPAN.to, 10, 0, 1, 2],
        ["segment 3", SPAN.from, SPAN.to, 301, 3, 1, 2],
        ["segment 4", SPAN.from, SPAN.to, 399, 3, 1, 2],
      ]);
      const last = daf.summaries[0]?.integers[5] ?? 0;
      expect([...daf.words.subarray(last - 4, last)]).toEqual([0, 8 * 86400, 38, 8]); // start, length, words, records
    },
  );

  test("reads the same words from either byte order, and from bytes that do not begin on a word", () => {
    const words = (bytes: Uint8Array) => {
      const all = readDaf(bytes, "a.bsp").words;
      return all.subarray(5 * 128); // the data: after first record, comments, summaries and names
    };
    const little = good();
    const shifted = new Uint8Array(little.length + 3).subarray(3);
    shifted.set(little);
    expect(words(good({ byteOrder: "big-endian" }))).toEqual(words(little));
    expect(words(shifted)).toEqual(words(little));
  });

  test("follows summary records from one to the next, where more than 25 segments fill several", () => {
    const many = Array.from({ length: 60 }, (_, i) => ({
      target: 1000 + i,
      centre: 0,
      ...SPAN,
      path: circle(1, 9, 0),
      coefficients: 2,
    }));
    const { summaries } = readDaf(makeKernel(many), "a.bsp");
    expect(summaries.map((s) => s.integers[0])).toEqual(many.map((m) => m.target));
    expect(summaries[59]?.name).toBe("segment 60");
  });

  test("reads the older files that call themselves NAIF/DAF and do not say their byte order", () => {
    for (const byteOrder of ["little-endian", "big-endian"] as const) {
      const bytes = good({ byteOrder, idWord: "NAIF/DAF", format: "        " });
      expect(readDaf(bytes, "a.bsp").byteOrder).toBe(byteOrder);
    }
  });

  test("refuses what is no DAF, showing how it begins", () => {
    expect(refused(new TextEncoder().encode("<!DOCTYPE html><html>"))).toContain('it begins with "<!DOCTYP"');
    expect(refused(new Uint8Array(0))).toContain("is not a DAF");
    expect(refused(Uint8Array.from([0x9b, 0x1b, 10, 13, 0, 7, 8, 9]))).toContain("is not a DAF");
  });

  test("refuses a file that a text-mode transfer has changed, whichever way", () => {
    const latin = Buffer.from(good()).toString("latin1");
    expect(refused(Buffer.from(latin.replaceAll("\n", "\r\n"), "latin1"))).toContain("text-mode transfer");
    expect(refused(Buffer.from(latin.replaceAll("\r\n", "\n"), "latin1"))).toContain("text-mode transfer");
    expect(refused(Buffer.from(latin.replaceAll("\r", "\n"), "latin1"))).toContain("text-mode transfer");
    expect(refused(Buffer.from(latin, "utf8"))).toContain("text-mode transfer");
    expect(refused(Buffer.from(latin, "latin1").map((byte) => byte & 0x7f))).toContain("text-mode transfer");
  });

  test("refuses number formats that it does not read", () => {
    expect(refused(good({ format: "VAX-GFLT" }))).toContain('"VAX-GFLT"; LTL-IEEE and BIG-IEEE are');
    expect(refused(good({ format: "\x9b2J\n----" }))).toContain("number format");
  });

  test("refuses a file that is cut anywhere before the end of its summaries", () => {
    const whole = good();
    for (let length = 0; length < SUMMARY + 2048; length += 93) refused(whole.slice(0, length));
  });

  test("refuses summary records that form a ring, point nowhere or claim too much", () => {
    expect(refused(changed((v) => v.setFloat64(SUMMARY, 3, true)))).toContain("form a ring at record 3");
    for (const next of [1, -3, 2.5, 1e300, Number.NaN, Infinity]) {
      expect(refused(changed((v) => v.setFloat64(SUMMARY, next, true)))).toContain(
        `summary record ${next} lies outside`,
      );
    }
    for (const count of [26, -1, 0.5, 1e300, Number.NaN]) {
      expect(refused(changed((v) => v.setFloat64(SUMMARY + 16, count, true)))).toContain(`claims ${count} summaries`);
    }
    for (const first of [1, -1, 1e9]) {
      expect(refused(changed((v) => v.setInt32(76, first, true)))).toContain(`summary record ${first} lies outside`);
    }
    for (const [at, value] of [
      [8, -1],
      [8, 200],
      [12, 1],
      [12, 251],
    ] as const) {
      expect(refused(changed((v) => v.setInt32(at, value, true)))).toContain("damaged first record");
    }
  });

  test("lets no control character of the file through but the line ends of its comments", () => {
    const bytes = changed((_, b) => {
      b.set([0x1b, 0x9b, 10, 13], 16); // internal name
      b.set([0x1b, 0x9b, 9], 1024); // comments
      b.set([0x1b, 0x9b, 10], SUMMARY + 1024); // name of the first segment
    });
    const { internalName, comments, summaries } = readDaf(bytes, "a.bsp");
    for (const text of [internalName, comments, summaries[0]?.name]) expect(text).not.toMatch(/[^\P{Cc}\n]/u);
    expect(internalName).not.toContain("\n");
  });
});
