import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Ajv2020 } from "ajv/dist/2020.js";
import addFormats from "ajv-formats";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { edgeOf } from "../../src/cli/edge.ts";
import { printedJulian } from "../../src/cli/printed-utc.ts";
import { julianText } from "../../src/time/julian-text.ts";
import { builtInLeapSeconds } from "../../src/time/leap-seconds.ts";
import { parseJulian } from "../../src/time/parse-julian.ts";
import { tdbOf } from "../../src/time/tdb-of.ts";
import { apsidary } from "./command.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-julian-"));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function answer(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await apsidary(args, folder);
  expect(stderr).toBe("");
  expect(status).toBe(0);
  return stdout;
}

async function refusal(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await apsidary(args, folder);
  expect(stdout).toBe("");
  expect(status).toBe(2);
  return stderr;
}

function validatorOf(command: string) {
  const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true });
  addFormats.default(ajv);
  return ajv.compile(JSON.parse(readFileSync(new URL(`../../docs/schema/${command}.json`, import.meta.url), "utf8")));
}

// J. Meeus, Astronomical Algorithms (2nd ed., 1998), ch. 7, table of Julian days (from memory); those of noon are printed
// with .0 and those of midnight with .5.
const DAYS = [
  ["-1000-07-12T12:00", 1356001.0],
  ["-1000-02-29", 1355866.5],
  ["-0123-12-31", 1676496.5],
  ["-0122-01-01", 1676497.5],
  ["0333-01-27T12:00", 1842713.0],
  ["1582-10-15", 2299160.5],
  ["1600-01-01", 2305447.5],
  ["1600-12-31", 2305812.5],
  ["2000-01-01T12:00", 2451545.0],
] as const;

describe("dates given with --calendar julian", () => {
  test.each(DAYS)("read %s as Julian day %f", (text, julianDay) => {
    const { day, secondsOfDay } = parseJulian(text);
    expect(day + secondsOfDay / 86_400 + 2_400_000.5).toBe(julianDay);
  });

  test("are Julian to 1582-10-04 and Gregorian from 1582-10-15 on, the day after it", () => {
    expect(parseJulian("1582-10-04").day + 1).toBe(parseJulian("1582-10-15").day);
    expect(parseJulian("1582-10-04T24:00")).toEqual(parseJulian("1582-10-15T00:00Z"));
    expect(parseJulian("1582").day).toBe(parseJulian("1582-01-01").day);
    expect(parseJulian("1582-10").day + 14 - 10).toBe(parseJulian("1582-10-15").day);
  });

  test.each([
    "1582-10-15",
    "1582-11",
    "1583",
    "1900-03-01T12:00+05:30",
    "2026-W10-3",
    "2026-200",
    "20260703",
    "2016-12-31T23:59:60Z",
  ])("read %s as without the option", (text) => {
    const leaps = builtInLeapSeconds();
    expect(edgeOf("--from", text, leaps, "julian")).toBe(tdbOf(text, leaps));
    expect(edgeOf("--from", text, leaps)).toBe(tdbOf(text, leaps));
  });

  test("take a time of day and an offset along", () => {
    const leaps = builtInLeapSeconds();
    // common knowledge: 14 October 1066, Julian, is 20 October by the Gregorian calendar carried back
    expect(edgeOf("--from", "1066-10-14T09:00+01:00", leaps, "julian")).toBe(tdbOf("1066-10-20T08:00Z", leaps));
    expect(edgeOf("--from", "1100-02-29 23:30", leaps, "julian")).toBe(tdbOf("1100-03-07T23:30Z", leaps));
    expect(edgeOf("--from", "\u22120044-03-15", leaps, "julian")).toBe(tdbOf("-0044-03-13", leaps));
  });

  test.each([
    ["1582-10-05", "does not exist: 1582-10-04 of the Julian calendar was followed by 1582-10-15"],
    ["1582-10-14T12:00Z", "does not exist: 1582-10-04 of the Julian calendar was followed by 1582-10-15"],
    ["1066-02-29", "1066-02 has the days 01 to 28 in the Julian calendar."],
    ["1066-04-31", "1066-04 has the days 01 to 30 in the Julian calendar."],
    ["1066-04-00", "names a day that does not exist"],
    ["1066-13-01", "has no month 13"],
    ["1066-09-25T25:00", '"1066-09-25T25:00" names a time of day that does not exist'],
    ["1066-09-25+01:00", "has an offset without a time of day"],
    ["1066-W10", "is not written as year, month and day"],
    ["10660925", "is not written as year, month and day"],
    ["1066-268", "is not written as year, month and day"],
    ["999", "has a year of fewer than four digits"],
    ["-10000", "lies outside the years -9999 to 9999"],
    ["autumn", "cannot be read as a date"],
  ])("refuse %s in one line that quotes it", (text, why) => {
    const call = () => edgeOf("--from", text, builtInLeapSeconds(), "julian");
    expect(call).toThrow(expect.objectContaining({ code: "bad-date", message: expect.stringContaining(why) }));
    expect(call).toThrow(expect.objectContaining({ message: expect.stringContaining(`"${text}"`) }));
    expect(call).toThrow(expect.objectContaining({ message: expect.not.stringContaining("\n") }));
  });

  test("come back from the text that tells them", () => {
    for (let day = -850_000; day < -100_840; day += 367) {
      const iso = new Date((day - 40_587) * 86_400_000 + 12_345_678).toISOString();
      const julian = julianText(iso) ?? "";
      expect(parseJulian(julian)).toEqual({ day, secondsOfDay: 12345.678 });
    }
    expect(julianText("1582-10-14T23:59:59.999Z")).toBe("1582-10-04T23:59:59.999");
    expect(julianText("1582-10-15T00:00:00.000Z")).toBeNull();
    expect(julianText("2016-12-31T23:59:60.500Z")).toBeNull();
    expect(julianText("-000500-01-01T00:00:00.000Z")).toBe("-000500-01-07T00:00:00.000");
  });
});

describe("times printed with --calendar julian", () => {
  test("have the unit of the other calendar, and its rounding into the next day", () => {
    expect(printedJulian("1066-10-20T09:31:29.000Z", 1)).toBe("1066-10-14 09:31");
    expect(printedJulian("1066-10-20T23:31:29.000Z", 100)).toBe("1066-10-15 00h");
    expect(printedJulian("1066-10-20T23:31:29.000Z", 3600)).toBe("1066-10-14");
    expect(printedJulian("1066-10-03T23:31:29.000Z", 90_000)).toBe("1066-09");
    expect(printedJulian("1067-01-05T23:31:29.000Z", 9e6)).toBe("1066");
    expect(printedJulian("1100-03-07T05:00:00.000Z", 1)).toBe("1100-02-29 05:00");
  });

  test("are Gregorian where they round to 1582-10-15", () => {
    expect(printedJulian("1582-10-14T23:59:29.000Z", 1)).toBe("1582-10-04 23:59");
    expect(printedJulian("1582-10-14T23:59:31.000Z", 1)).toBeNull();
  });
});

describe("apsidary passages --calendar julian", () => {
  const args = ["passages", "moon-earth", "--from", "1582-09-10", "--to", "1582-11-01", "--calendar", "julian"];

  test("keeps utc as it is and adds utcJulian, null from 1582-10-15 on, in every form and by the schema", async () => {
    const validate = validatorOf("passages");
    const text = await answer(...args, "--format", "json");
    validate(JSON.parse(text));
    expect(validate.errors).toBeNull();
    const { rows } = JSON.parse(text) as { rows: Record<string, string | null>[] };
    const plain = JSON.parse(
      await answer("passages", "moon-earth", "--from", "1582-09-20", "--to", "1582-11-01", "--format", "json"),
    );
    expect(rows.map(({ utcJulian, ...row }) => row)).toEqual(plain.rows);
    for (const { utc, utcJulian } of rows) expect(utcJulian).toBe(julianText(utc ?? ""));
    expect(rows.map((row) => row.utcJulian === null)).toEqual([false, false, true]);
    const lines = (await answer(...args, "--format", "csv")).trimEnd().split("\r\n");
    expect(lines.map((line) => line.split(",").at(-1))).toEqual([
      "utcJulian",
      ...rows.map((row) => row.utcJulian ?? ""),
    ]);
  });

  test("marks the Julian dates of the report, and says what the mark means", async () => {
    const text = await answer(...args);
    expect(text).toMatch(/^Passages of moon-earth, 1582-09-10 to 1582-11-01 \(Julian calendar before 1582-10-15\)$/m);
    expect(text).toMatch(/^1582-10-02 04h .* UT, Julian$/m);
    expect(text).toMatch(/^1582-10-26 03h .* UT$/m);
    expect(text).toMatch(/^Julian: a date of the Julian calendar/m);
    for (const line of text.split("\n")) expect(line.length).toBeLessThanOrEqual(100);
  });

  test("changes nothing of an answer that lies after 1582 but for the title", async () => {
    const later = ["passages", "moon-earth", "--from", "2026", "--to", "2027"];
    const [, ...julian] = (await answer(...later, "--calendar", "julian")).split("\n");
    const [, ...gregorian] = (await answer(...later)).split("\n");
    expect(julian).toEqual(gregorian);
  });

  test("refuses the ten days left out and another calendar, in one line", async () => {
    expect(await refusal("passages", "moon-earth", "--from", "1582-10-10", "--next", "1", "--calendar", "julian")).toBe(
      'apsidary: --from: "1582-10-10" does not exist: 1582-10-04 of the Julian calendar was followed by 1582-10-15 of the Gregorian.\n',
    );
    expect(await refusal("passages", "moon-earth", "--from", "1582", "--next", "1", "--calendar", "mayan")).toBe(
      "apsidary: --calendar mayan is unknown. Allowed: gregorian, julian.\n",
    );
  });

  test("says of which calendar the ends of the sources are", async () => {
    expect(
      await refusal(
        "passages",
        "moon-earth",
        "--from",
        "0990",
        "--to",
        "0991",
        "--calendar",
        "julian",
        "--source",
        "series",
      ),
    ).toMatch(
      /^apsidary: 0990-01-06T.* span 0999-12-31T00:00:00 to 3001-01-02T00:00:00 \(TDB\)\..* These dates are proleptic Gregorian\.\n$/,
    );
  });
});

describe("apsidary range --calendar julian", () => {
  const args = [
    "range",
    "moon-earth",
    "--from",
    "1582-10-03",
    "--to",
    "1582-10-17",
    "--step",
    "1d",
    "--calendar",
    "julian",
  ];

  test("goes from 1582-10-04, Julian, to 1582-10-15 in one step, by the schema and in the report", async () => {
    const validate = validatorOf("range");
    const text = await answer(...args, "--format", "json");
    validate(JSON.parse(text));
    expect(validate.errors).toBeNull();
    const { rows } = JSON.parse(text) as { rows: { utc: string; utcJulian: string | null }[] };
    expect(rows.map((row) => [row.utc.slice(0, 10), row.utcJulian?.slice(0, 10) ?? null])).toEqual([
      ["1582-10-13", "1582-10-03"],
      ["1582-10-14", "1582-10-04"],
      ["1582-10-15", null],
      ["1582-10-16", null],
    ]);
    const report = await answer(...args);
    expect(report).toMatch(/^1582-10-04 00:00:00\.\d+ J /m);
    expect(report).toMatch(/^1582-10-15 00:00:00\.\d+ {3}/m);
    expect(report).toMatch(/^J: a date of the Julian calendar/m);
    for (const line of report.split("\n")) expect(line.length).toBeLessThanOrEqual(100);
  });

  test("prints no distance finer than the uncertainty of UT allows", async () => {
    // 4 810 km/d × 40 s = 2.2 km: kilometres, though the series know the distance at a TDB to 40 m
    expect(await answer(...args)).toMatch(/^1582-10-15 .* 364 217 /m);
  });
});

describe("years that the series do not reach", () => {
  test.each([
    ["0999", "1000"],
    ["3001", "3002"],
    ["0999", "3002"],
  ])("are refused from %s to %s with --source series, in one line that says what it spans", async (from, to) => {
    const line = await refusal("passages", "moon-earth", "--from", from, "--to", to, "--source", "series");
    expect(line).toMatch(
      /^apsidary: .* is not wholly covered for moon-earth: .* 0999-12-31T00:00:00 to 3001-01-02T00:00:00 \(TDB\)\. Ask inside that, or allow another source\.\n$/,
    );
  });

  test.each([
    ["0999", "1000"],
    ["3001-02", "3002"],
  ])(
    "are handed to the engine without the option, from %s to %s, which each row and the foot say",
    async (from, to) => {
      const { rows } = JSON.parse(
        await answer("passages", "moon-earth,mars-sun", "--from", from, "--to", to, "--format", "json"),
      );
      expect(rows.length).toBeGreaterThan(20);
      for (const row of rows) expect(row.source).toBe("engine");
      expect(await answer("passages", "moon-earth", "--from", from, "--to", to)).toMatch(/^Source engine: /m);
    },
  );
});

test("docs/centuries.md shows the rows that its command prints", async () => {
  const page = readFileSync(new URL("../../docs/centuries.md", import.meta.url), "utf8");
  const [, command = "", shown = ""] = /```console\n\$ apsidary ([^\n]*)\n([^`]*)```/.exec(page) ?? [];
  const rows = (text: string) => text.split("\n").filter((line) => line.startsWith("1099-"));
  expect(rows(shown).length).toBe(2);
  expect(rows(await answer(...command.split(" ")))).toEqual(rows(shown));
});
