import { createHash } from "node:crypto";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type PairName, pairOf } from "../../src/bodies/pair.ts";
import { openKernel } from "../../src/ephemeris/kernel.ts";
import { ApsidaryError } from "../../src/error.ts";
import { rangeFunction } from "../../src/passages/range-function.ts";
import { scanExtrema } from "../../src/passages/scan-extrema.ts";
import { makeKernel, type Path, type SegmentGiven } from "./make-kernel.ts";
import { circle, circleVelocity, DAY, EARTH, EMB, fourSegments, MOON, refusal, SPAN, SUN } from "./paths.ts";

const accuracy = () => ({ rangeKm: 1, rangeRateKmS: 1e-9, basis: "assumed" as const });
const open = (bytes: Uint8Array) => openKernel(bytes, { id: "user:a.bsp", title: "a.bsp", accuracy });
const openSegments = (segments: readonly SegmentGiven[]) => open(makeKernel(segments));

function stateAt(source: ReturnType<typeof open>, name: PairName, tdb: number): number[] {
  const out = new Float64Array(6);
  source.motion(pairOf(name)).state(tdb, out);
  return [...out];
}

function expectNear(actual: readonly number[], expected: readonly number[]): void {
  expect(actual.length).toBe(expected.length);
  actual.forEach((value, i) => {
    // positions of 1.5·10⁸ km and their rates: rounding
    expect(Math.abs(value - (expected[i] ?? Number.NaN))).toBeLessThan(i < 3 ? 3e-6 : 1e-9);
  });
}

const add = (...paths: readonly (readonly [Path, 1 | -1])[]): Path => {
  return (t) => {
    const sum: [number, number, number] = [0, 0, 0];
    for (const [path, sign] of paths) {
      const at = path(t);
      for (const i of [0, 1, 2] as const) sum[i] += sign * at[i];
    }
    return sum;
  };
};

describe("a kernel as a source", () => {
  test.each([2, 3])(
    "chains segments of type %i from the centre of a pair to its moving point, whichever way they are written",
    (type) => {
      const source = openSegments(fourSegments(type));
      const chains: Record<string, readonly (readonly [readonly [number, number, number], 1 | -1])[]> = {
        "emb-ssb": [[EMB, 1]],
        "emb-sun": [
          [EMB, 1],
          [SUN, -1],
        ],
        "moon-earth": [
          [MOON, 1],
          [EARTH, -1],
        ],
        "earth-sun": [
          [EMB, 1],
          [EARTH, 1],
          [SUN, -1],
        ],
      };
      for (const [name, chain] of Object.entries(chains)) {
        const position = add(...chain.map(([figures, sign]) => [circle(...figures), sign] as const));
        const velocity = add(...chain.map(([figures, sign]) => [circleVelocity(...figures), sign] as const));
        expect(source.spans(pairOf(name))).toEqual([SPAN]);
        for (const t of [0, 1e5, 2.2e6, 64 * DAY]) {
          expectNear(stateAt(source, name as PairName, t), [...position(t), ...velocity(t)]);
        }
      }
    },
  );

  test("gives accelerations that agree with differences of its velocities", () => {
    for (const type of [2, 3]) {
      const motion = openSegments(fourSegments(type)).motion(pairOf("moon-earth"));
      const [here, before, after] = [new Float64Array(9), new Float64Array(6), new Float64Array(6)];
      motion.stateAndAcceleration?.(1e6, here);
      motion.state(1e6 - 50, before);
      motion.state(1e6 + 50, after);
      for (let i = 0; i < 3; i++) {
        const difference = ((after[3 + i] as number) - (before[3 + i] as number)) / 100;
        expect(here[6 + i]).toBeCloseTo(difference, 11); // a = 2.7·10⁻⁶ km/s²
      }
    }
  });

  test("joins two segments in time at their seam, and keeps a gap a gap", () => {
    const part = (from: number, to: number) => ({
      target: 3,
      centre: 0,
      from: from * DAY,
      to: to * DAY,
      path: circle(...EMB),
    });
    const joined = openSegments([part(0, 32), part(32, 64)]);
    expect(joined.spans(pairOf("emb-ssb"))).toEqual([SPAN]);
    for (const days of [0, 31.9, 32, 32.1, 64]) {
      const t = days * DAY;
      expectNear(stateAt(joined, "emb-ssb", t), [...circle(...EMB)(t), ...circleVelocity(...EMB)(t)]);
    }
    const gap = openSegments([part(40, 64), part(0, 32)]);
    expect(gap.spans(pairOf("emb-ssb"))).toEqual([
      { from: 0, to: 32 * DAY },
      { from: 40 * DAY, to: 64 * DAY },
    ]);
    expectNear(stateAt(gap, "emb-ssb", 50 * DAY).slice(0, 3), circle(...EMB)(50 * DAY));
  });

  test("covers only what all links of a chain cover", () => {
    const source = openSegments([
      { target: 3, centre: 0, from: 0, to: 32 * DAY, path: circle(...EMB) },
      { target: 10, centre: 0, from: 8 * DAY, to: 24 * DAY, path: circle(...SUN) },
      { target: 10, centre: 0, from: 24 * DAY + 10, to: 48 * DAY + 10, path: circle(...SUN) },
    ]);
    expect(source.spans(pairOf("emb-sun"))).toEqual([
      { from: 8 * DAY, to: 24 * DAY },
      { from: 24 * DAY + 10, to: 32 * DAY },
    ]);
  });

  test("takes the segment that stands last in the file where two cover the same time (SPK Required Reading)", () => {
    const source = openSegments([
      { target: 3, centre: 0, ...SPAN, path: circle(...EMB) },
      { target: 3, centre: 0, from: 8 * DAY, to: 16 * DAY, path: circle(...SUN) },
    ]);
    expectNear(stateAt(source, "emb-ssb", 4 * DAY).slice(0, 3), circle(...EMB)(4 * DAY));
    expectNear(stateAt(source, "emb-ssb", 12 * DAY).slice(0, 3), circle(...SUN)(12 * DAY));
    expectNear(stateAt(source, "emb-ssb", 20 * DAY).slice(0, 3), circle(...EMB)(20 * DAY));
  });

  test("takes the shortest chain where several lead to the point", () => {
    const source = openSegments([...fourSegments(), { target: 399, centre: 10, ...SPAN, path: circle(...SUN) }]);
    expectNear(stateAt(source, "earth-sun", 1e6).slice(0, 3), circle(...SUN)(1e6));
  });

  test("says that it does not supply a pair to which no chain leads, with both points", () => {
    const source = openSegments(fourSegments());
    expect(source.spans(pairOf("io-jupiter"))).toEqual([]);
    const { code, message } = refusal(() => source.motion(pairOf("io-jupiter")));
    expect(code).toBe("not-supplied");
    expect(message).toBe("a.bsp has no segments that lead from jupiter's own centre to io.");
    const apart = openSegments([
      { target: 3, centre: 0, from: 0, to: 8 * DAY, path: circle(...EMB) },
      { target: 10, centre: 0, from: 8 * DAY, to: 16 * DAY, path: circle(...SUN) },
    ]);
    expect(apart.spans(pairOf("emb-sun"))).toEqual([]); // no time in common
  });

  test("describes its segments line by line, and its comments", () => {
    const bytes = makeKernel(fourSegments(), { byteOrder: "big-endian", comments: "made for checks\nfrom circles" });
    const lines = open(bytes).describe().split("\n");
    expect(lines).toEqual([
      "a.bsp: DAF/SPK, big-endian, a kernel made for checks",
      "  1: emb about ssb, type 2, TDB seconds 0 to 5529600, 8 records of 8 d, 12 coefficients",
      "  2: sun about ssb, type 2, TDB seconds 0 to 5529600, 4 records of 16 d, 8 coefficients",
      "  3: moon about emb, type 2, TDB seconds 0 to 5529600, 16 records of 4 d, 13 coefficients",
      "  4: earth about emb, type 2, TDB seconds 0 to 5529600, 16 records of 4 d, 13 coefficients",
      "comments:",
      "made for checks",
      "from circles",
    ]);
  });

  test("gives the SHA-256 of the file", async () => {
    const bytes = makeKernel(fourSegments());
    expect(await open(bytes).checksum()).toBe(createHash("sha256").update(bytes).digest("hex"));
  });

  test("answers soon where a mesh of segments offers more chains than could ever be walked", () => {
    const mesh: SegmentGiven[] = [];
    for (let a = 1000; a < 1024; a++) {
      for (let b = a + 1; b < 1024; b++)
        mesh.push({ target: a, centre: b, ...SPAN, path: circle(1, 9, 0), coefficients: 2 });
    }
    mesh.push({ target: 1000, centre: 0, ...SPAN, path: circle(1, 9, 0), coefficients: 2 });
    const source = openSegments(mesh);
    expect(source.spans(pairOf("emb-ssb"))).toEqual([]);
  });
});

describe("a kernel that has come to harm", () => {
  test("lets the finder say `bad-state`, with the time, where coefficients are not numbers", () => {
    const bytes = makeKernel(fourSegments());
    const view = new DataView(bytes.buffer);
    const first = view.getInt32(1024 + 24 + 32, true); // of emb about ssb
    view.setFloat64(8 * (first + 3 * 38 + 2), Number.NaN, true); // a coefficient of record 4: days 24 to 32
    const source = open(bytes);
    const range = rangeFunction(source.motion(pairOf("emb-sun")), "emb-sun from a.bsp");
    expect(range.rate(20 * DAY)).toBeTypeOf("number");
    const { code, message } = refusal(() => {
      const next = scanExtrema(range, SPAN, { sampleSeconds: 2 * DAY }, 0);
      while (next());
    });
    expect(code).toBe("bad-state");
    expect(message).toMatch(/^emb-sun from a\.bsp gave no number for 2[0-9]+ s past J2000 \(TDB\)\.$/);
  });

  test("is read or refused in one line, whatever bytes of it are changed, added or lost", () => {
    const whole = {
      2: makeKernel(fourSegments(2)),
      3: makeKernel(fourSegments(3), { byteOrder: "big-endian", comments: "c" }),
    };
    const interesting = [0, 1, 2, 4, 8, 0x0a, 0x0d, 0x7f, 0x80, 0xf0, 0xff];
    const byte = fc.oneof(fc.constantFrom(...interesting), fc.nat(255));
    // most changes fall where the structure is: first record, summaries, directories
    const place = fc.oneof(fc.nat(100), fc.nat(3200), fc.nat(1_000_000));
    let read = 0;
    let refusals = 0;
    fc.assert(
      fc.property(
        fc.constantFrom(2 as const, 3 as const),
        fc.array(fc.tuple(place, fc.array(byte, { minLength: 1, maxLength: 8 })), { maxLength: 6 }),
        fc.option(fc.nat(1_000_000)),
        fc.nat(7),
        (type, changes, cut, shift) => {
          const original = whole[type];
          const bytes = new Uint8Array(original.length + shift).subarray(shift);
          bytes.set(original);
          for (const [at, values] of changes) {
            values.forEach((value, i) => {
              bytes[(at + i) % bytes.length] = value;
            });
          }
          const given = cut === null || cut % 3 > 0 ? bytes : bytes.slice(0, cut % bytes.length);
          try {
            const source = open(given);
            source.describe();
            for (const name of ["earth-sun", "moon-earth"] as const) {
              const spans = source.spans(pairOf(name));
              if (spans.length > 0) {
                const out = new Float64Array(9);
                const motion = source.motion(pairOf(name));
                for (const span of spans) motion.stateAndAcceleration?.(span.from, out);
              }
            }
            read++;
          } catch (error) {
            expect(error).toBeInstanceOf(ApsidaryError);
            const { code, message } = error as ApsidaryError;
            expect(code).toBe("bad-kernel");
            expect(message).not.toMatch(/\p{Cc}/u);
            expect(message.length).toBeLessThan(400);
            refusals++;
          }
        },
      ),
      { numRuns: 700 },
    );
    expect(read).toBeGreaterThan(50); // both ways are taken
    expect(refusals).toBeGreaterThan(50);
  });

  test("is refused when it is nothing but noise", () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 5000 }), fc.boolean(), (noise, looksLikeOne) => {
        const bytes = noise.slice();
        if (looksLikeOne) {
          bytes.set(new TextEncoder().encode("DAF/SPK ").subarray(0, bytes.length));
          if (bytes.length > 96) bytes.set(new TextEncoder().encode("LTL-IEEE"), 88);
        }
        expect(refusal(() => open(bytes)).code).toBe("bad-kernel");
      }),
      { numRuns: 300 },
    );
  });
});
