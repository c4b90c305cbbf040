import { describe, expect, test } from "vitest";
import { readSeriesFile } from "../../src/ephemeris/series-file.ts";
import { seriesBytes } from "./series-opened.ts";

describe("readSeriesFile", () => {
  const { planets, moon } = seriesBytes();

  test("finds the eight planets in one file and the Moon in the other", () => {
    const names = ["mercury", "venus", "earth", "mars", "jupiter", "saturn", "uranus", "neptune"];
    expect([...readSeriesFile(planets, "planets").keys()]).toEqual(names);
    expect([...readSeriesFile(moon, "moon").keys()]).toEqual(["moon"]);
  });

  test("names earlier points alone in each sum, and points that exist in each entry", () => {
    for (const { bases, first, second, blocks } of readSeriesFile(planets, "planets").values()) {
      first.forEach((place, i) => {
        expect(Math.max(place, second[i] as number)).toBeLessThan(bases + i);
      });
      for (const { places } of blocks) expect(Math.max(...places)).toBeLessThan(bases + first.length);
    }
  });

  test("reads a view into a larger buffer like the file itself", () => {
    const larger = new Uint8Array(moon.length + 7);
    larger.set(moon, 3);
    expect(readSeriesFile(larger.subarray(3, 3 + moon.length), "moon")).toEqual(readSeriesFile(moon, "moon"));
  });

  test("refuses bytes that are no file of series, saying what they should be", () => {
    for (const bytes of [
      new Uint8Array(0),
      new Uint8Array(100),
      new TextEncoder().encode("DAF/SPK is another format altogether"),
    ]) {
      expect(() => readSeriesFile(bytes, "the series of the Moon")).toThrow(
        expect.objectContaining({ code: "bad-kernel", message: expect.stringContaining("the series of the Moon") }),
      );
    }
  });

  test("refuses a file that is cut short or too long, wherever the cut is", () => {
    for (const length of [17, 40, 64, 1000, 20_000, moon.length - 1]) {
      expect(() => readSeriesFile(moon.subarray(0, length), "moon")).toThrow(
        expect.objectContaining({ code: "bad-kernel" }),
      );
    }
    const longer = new Uint8Array(moon.length + 1);
    longer.set(moon);
    expect(() => readSeriesFile(longer, "moon")).toThrow(expect.objectContaining({ code: "bad-kernel" }));
  });

  test("refuses counts that the file cannot hold, without taking their memory, and places beyond the points", () => {
    for (const at of [36, 40, 44, 52, 56]) {
      const harmed = moon.slice();
      new DataView(harmed.buffer).setUint32(at, 0xffff_fff0, true);
      expect(() => readSeriesFile(harmed, "moon")).toThrow(expect.objectContaining({ code: "bad-kernel" }));
    }
    const harmed = moon.slice();
    harmed.fill(0x7f, harmed.length - 2);
    expect(() => readSeriesFile(harmed, "moon")).toThrow(expect.objectContaining({ code: "bad-kernel" }));
  });

  test("refuses a later version of the format by its number", () => {
    const later = moon.slice();
    later[8] = 2;
    expect(() => readSeriesFile(later, "moon")).toThrow(/version 2/);
  });
});
