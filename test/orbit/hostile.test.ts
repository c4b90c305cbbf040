import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { ApsidaryError } from "../../src/error.ts";
import { parseElementsFile } from "../../src/orbit/elements-file.ts";
import { elementsTrack } from "../../src/orbit/elements-track.ts";
import { parseStarFile } from "../../src/orbit/star-file.ts";
import { starTrack } from "../../src/orbit/star-track.ts";
import { parseTableFile } from "../../src/orbit/table-file.ts";
import { tableTrack } from "../../src/orbit/table-track.ts";
import type { Track } from "../../src/orbit/track.ts";
import { messageOf } from "./bare.ts";

const ELEMENTS = JSON.stringify({
  name: "probe-earth",
  about: "earth",
  semiMajorAxisKm: "42164.172km",
  eccentricity: 0.3,
  periapsisAt: "2027-03-01T12:00:00.0",
  uncertainty: { semiMajorAxisKm: 0.005, periapsisAt: 2 },
});
const ELEMENTS_CSV =
  "name,about,periapsisHeightKm,apoapsisHeightKm,epoch,meanAnomalyDeg,uncertainty.meanAnomalyDeg\nprobe-moon,moon,100,3000,JD 2461500.5,12.5,0.1\n";
const TABLE = [
  "tdb,xKm,yKm,zKm,vxKmS,vyKmS,vzKmS",
  ...Array.from({ length: 8 }, (_, i) => {
    const u = i / 10;
    const [x, y] = [7000 * Math.cos(u), 7000 * Math.sin(u)];
    return `2027-03-01T00:0${i}:00,${x},${y},0,${(-y / 600).toFixed(9)},${(x / 600).toFixed(9)},0`;
  }),
].join("\n");
const STAR = JSON.stringify({
  name: "star-b-star-a",
  periastronAt: "JD 2455000.25",
  periodDays: 1000,
  eccentricity: 0.6,
  k1KmS: 20,
  argumentDeg: 65,
  sigma: { periodDays: 0.1 },
});

const READERS: readonly (readonly [what: string, text: string, read: (text: string) => readonly Track[]])[] = [
  ["elements as JSON", ELEMENTS, (text) => parseElementsFile(text).map((given) => elementsTrack(given))],
  ["elements as CSV", ELEMENTS_CSV, (text) => parseElementsFile(text).map((given) => elementsTrack(given))],
  ["a table", TABLE, (text) => [tableTrack({ name: "probe-x", ...parseTableFile(text) })]],
  ["a star", STAR, (text) => parseStarFile(text).map((given) => starTrack(given))],
];

describe("files of tracks", () => {
  test.each(READERS)("are read as they should be: %s", (_, text, read) => {
    expect(read(text)).toHaveLength(1);
  });

  test.each(READERS)(
    "are read, with finite numbers, or refused in one line, whatever is changed, added or lost in them: %s",
    (_, text, read) => {
      const word = fc.oneof(
        fc.string({ maxLength: 10 }),
        fc.constantFrom(
          "0",
          "-",
          "e",
          "1e300",
          "1e-300",
          "null",
          "[]",
          "{}",
          '"',
          ",",
          "\n",
          "NaN",
          "__proto__",
          "\u0000",
        ),
      );
      fc.assert(
        fc.property(fc.nat(1000), fc.nat(20), word, (at, lost, added) => {
          const place = at % text.length;
          try {
            for (const track of read(text.slice(0, place) + added + text.slice(place + lost))) {
              const out = new Float64Array(6);
              const at = Math.max(track.spans(track.pair)[0]?.from ?? 0, 8e8);
              const inside = Math.min(at, track.spans(track.pair)[0]?.to ?? at);
              track.motion(track.pair).state(inside, out);
              const accuracy = track.accuracy(track.pair, inside);
              expect([...out, accuracy.rangeKm, accuracy.rangeRateKmS].every(Number.isFinite)).toBe(true);
            }
          } catch (error) {
            if (!(error instanceof ApsidaryError) || error.message.includes("\n")) throw error;
          }
        }),
        { numRuns: 600 },
      );
    },
  );

  test("of orbits quicker than two seconds are refused as a slip of units", () => {
    expect(messageOf(() => starTrack({ ...JSON.parse(STAR), periodDays: 1e-6 }))).toMatch(
      /goes round in .*Check the units/,
    );
  });
});

describe("the CSV of a track", () => {
  test.each([
    ["a name twice in its header", TABLE.replace("zKm", "xKm"), /the header has "xKm" twice/],
    ["a row that is cut", TABLE.replace(/,0$/, ""), /row 8 has 6 cells, the header 7/],
    ["a quote that does not end", `${TABLE}\n"2027`, /cannot be read/],
  ])("is refused for %s, in one line", (_, text, says) => {
    expect(messageOf(() => parseTableFile(text))).toMatch(says);
  });
});
