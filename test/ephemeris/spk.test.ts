import { describe, expect, test } from "vitest";
import { addSegmentState, readSpk, type SpkSegment } from "../../src/ephemeris/spk.ts";
import { makeKernel } from "./make-kernel.ts";
import { circle, circleVelocity, DAY, EMB, fourSegments, MOON, refusal, SPAN } from "./paths.ts";

function stateOf(segment: SpkSegment | undefined, tdb: number, order = 1, sign = 1): Float64Array {
  const out = new Float64Array(3 * (order + 1));
  if (segment) addSegmentState(segment, tdb, sign, order, out);
  return out;
}

const times = Array.from({ length: 41 }, (_, i) => (i / 40) * SPAN.to);

function refused(bytes: Uint8Array): string {
  const { code, message } = refusal(() => readSpk(bytes, "a.bsp"));
  expect(code).toBe("bad-kernel");
  expect(message).toMatch(/^a\.bsp.+\.$/);
  return message;
}

/** The first segment's directory: its last four words. */
function withDirectory(values: readonly number[]): Uint8Array {
  const bytes = makeKernel(fourSegments());
  const last = readSpk(bytes, "a.bsp").daf.summaries[0]?.integers[5] ?? 0;
  const view = new DataView(bytes.buffer);
  values.forEach((value, i) => {
    view.setFloat64(8 * (last - 4 + i), value, true);
  });
  return bytes;
}

/** A summary's word: 0, 1 the span; then target, centre, frame, type, first, last. */
function withSummary(place: number, value: number, bytes = makeKernel(fourSegments())): Uint8Array {
  const view = new DataView(bytes.buffer);
  if (place < 2) view.setFloat64(1024 + 24 + 8 * place, value, true);
  else view.setInt32(1024 + 24 + 16 + 4 * (place - 2), value, true);
  return bytes;
}

describe("readSpk", () => {
  test.each([
    ["little-endian", 2],
    ["little-endian", 3],
    ["big-endian", 2],
    ["big-endian", 3],
  ] as const)("gives position and velocity of the path that was written, %s, type %i", (byteOrder, type) => {
    const { segments } = readSpk(makeKernel(fourSegments(type), { byteOrder }), "a.bsp");
    for (const [segment, figures] of [
      [segments[0], EMB],
      [segments[2], MOON],
    ] as [SpkSegment | undefined, readonly [number, number, number]][]) {
      for (const t of times) {
        const state = stateOf(segment, t);
        const expected = [...circle(...figures)(t), ...circleVelocity(...figures)(t)];
        expected.forEach((value, i) => {
          // rounding of 1.5·10⁸ km, and of the twelve coefficients: the interpolation is exact to that
          expect(Math.abs((state[i] as number) - value)).toBeLessThan(i < 3 ? 2e-6 : 1e-9);
        });
      }
    }
  });

  test("reads types 2 and 3 of the same path alike, accelerations too", () => {
    const [two, three] = [2, 3].map((type) => readSpk(makeKernel(fourSegments(type)), "a.bsp").segments[2]);
    for (const t of times) {
      const a = stateOf(two, t, 2);
      const b = stateOf(three, t, 2);
      a.forEach((value, i) => {
        expect(Math.abs(value - (b[i] as number))).toBeLessThan([1e-9, 1e-13, 1e-17][Math.floor(i / 3)] as number);
      });
    }
  });

  test("joins neighbouring records without a step larger than their rounding", () => {
    const moon = readSpk(makeKernel(fourSegments()), "a.bsp").segments[2];
    for (let day = 4; day < 64; day += 4) {
      const before = stateOf(moon, day * DAY - 1e-6);
      const after = stateOf(moon, day * DAY);
      for (let i = 0; i < 3; i++) expect(Math.abs((before[i] as number) - (after[i] as number))).toBeLessThan(1e-5);
    }
  });

  test("takes a state away as exactly as it adds it", () => {
    const moon = readSpk(makeKernel(fourSegments()), "a.bsp").segments[2] as SpkSegment;
    const out = stateOf(moon, 1e6, 2);
    addSegmentState(moon, 1e6, -1, 2, out);
    expect([...out]).toEqual(Array(9).fill(0));
  });

  test("refuses a DAF that holds no SPK, and an SPK that holds no segment", () => {
    expect(refused(makeKernel(fourSegments(), { idWord: "DAF/CK  " }))).toContain("its kind is DAF/CK");
    expect(refused(makeKernel(fourSegments(), { idWord: "DAF/\n\x1b[2" }))).toContain("is a DAF but no SPK");
    expect(refused(makeKernel([]))).toContain("holds no segment");
  });

  test.each([1, 5, 13, 21, 0, -2])("refuses a segment of type %i, naming segment, bodies and type", (type) => {
    const message = refused(
      makeKernel([...fourSegments(), { target: 301, centre: 0, ...SPAN, path: circle(...MOON), type }]),
    );
    expect(message).toContain(`segment 5 (moon about ssb), is of type ${type}; types 2 and 3 are read`);
  });

  test.each([17, 0, -1, 13000])("refuses a segment in frame %i", (frame) => {
    const message = refused(makeKernel([{ target: 301, centre: 3, ...SPAN, path: circle(...MOON), frame }]));
    expect(message).toContain(`(moon about emb), is in frame ${frame}; frame 1 (J2000/ICRF) is read`);
  });

  test("refuses record counts and lengths that do not fit, however large", () => {
    for (const records of [0, -8, 7, 9, 0.5, 2 ** 31, 2 ** 53, 1e300, Infinity, Number.NaN]) {
      expect(refused(withDirectory([0, 8 * DAY, 38, records]))).toContain("which do not fit");
    }
    for (const words of [0, 2, 1, 37, -38, 1e300, Number.NaN]) {
      expect(refused(withDirectory([0, 8 * DAY, words, 8]))).toContain("which do not fit");
    }
    for (const seconds of [0, -1, Infinity, Number.NaN]) {
      expect(refused(withDirectory([0, seconds, 38, 8]))).toContain("which do not fit");
    }
    for (const start of [Infinity, -Infinity, Number.NaN]) {
      expect(refused(withDirectory([start, 8 * DAY, 38, 8]))).toContain("which do not fit");
    }
  });

  test("refuses a span that the records do not cover, or that is none", () => {
    for (const [place, value] of [
      [0, -DAY],
      [0, SPAN.to],
      [0, Number.NaN],
      [0, -Infinity],
      [1, SPAN.to + DAY],
      [1, 0],
      [1, Infinity],
      [1, Number.NaN],
    ] as const) {
      expect(refused(withSummary(place, value))).toContain("says that it covers");
    }
    expect(refused(withDirectory([DAY, 8 * DAY, 38, 8]))).toContain("says that it covers");
    expect(refused(withDirectory([0, 7 * DAY, 38, 8]))).toContain("says that it covers");
  });

  test("refuses a record whose own middle and radius are not those of its place", () => {
    const first = (readSpk(makeKernel(fourSegments()), "a.bsp").daf.summaries[0]?.integers[4] ?? 0) + 38; // record 2
    for (const [offset, value] of [
      [0, 4 * DAY],
      [0, Number.NaN],
      [1, 0],
      [1, -4 * DAY],
      [1, Infinity],
      [1, Number.NaN],
    ] as const) {
      const bytes = makeKernel(fourSegments());
      new DataView(bytes.buffer).setFloat64(8 * (first - 1 + offset), value, true);
      expect(refused(bytes)).toContain("its record 2 should cover");
    }
  });

  test("refuses words that lie outside the file", () => {
    for (const [place, value] of [
      [6, 0],
      [6, -5],
      [7, 2 ** 31 - 1],
      [7, 1],
      [7, -1],
    ] as const) {
      expect(refused(withSummary(place, value))).toContain("is cut short");
    }
  });

  test("refuses a file cut at any length, in one line", () => {
    const whole = makeKernel(fourSegments());
    const used = 8 * (readSpk(whole, "a.bsp").daf.summaries.at(-1)?.integers[5] ?? 0);
    for (let length = 0; length < used; length += 389) refused(whole.slice(0, length));
    refused(whole.slice(0, used - 1));
    expect(readSpk(whole.slice(0, used), "a.bsp").segments.length).toBe(4);
  });

  test("refuses segments that together claim more words than the file has", () => {
    const bytes = makeKernel(
      Array.from({ length: 4 }, () => ({ target: 3, centre: 0, ...SPAN, path: circle(...EMB) })),
    );
    const view = new DataView(bytes.buffer);
    const first = view.getInt32(1024 + 24 + 32, true);
    const last = view.getInt32(1024 + 24 + 36, true);
    for (let i = 0; i < 4; i++) {
      view.setInt32(1024 + 24 + 40 * i + 32, first, true);
      view.setInt32(1024 + 24 + 40 * i + 36, last, true);
    }
    const cut = bytes.slice(0, 8 * (last + 100)); // one array, four summaries that point at it
    expect(refused(cut)).toContain("claim more words");
  });
});
