import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Ajv2020 } from "ajv/dist/2020.js";
import addFormats from "ajv-formats";
import Papa from "papaparse";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { apsidary } from "./command.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-drift-"));
});
afterAll(() => rmSync(folder, { recursive: true }));

const run = (...args: string[]) => apsidary(["drift", ...args], folder);

async function answer(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await run(...args);
  expect(stderr).toBe("");
  expect(status).toBe(0);
  return stdout;
}

const schema = JSON.parse(readFileSync(new URL("../../docs/schema/drift.json", import.meta.url), "utf8"));
const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true });
addFormats.default(ajv);
const validate = ajv.compile(schema);

describe("apsidary drift", () => {
  test.each([
    ["the Earth", ["earth-sun", "--from", "2015", "--to", "2030"]],
    ["the Earth with all that can be added", ["earth-sun", "--from", "2020", "--to", "2022", "--centres", "--seasons"]],
    ["a step across a seam", ["earth-sun", "--from", "1960", "--to", "1961"]],
    ["other sources", ["earth-sun", "--from", "1700", "--to", "1703"]],
    ["the Moon", ["moon-earth", "--from", "2026-01", "--to", "2026-04"]],
    ["a planet and its centres", ["mars-sun", "--from", "2026", "--to", "2030", "--centres"]],
    ["a pair without a straight line", ["earth-ssb", "--from", "2026", "--to", "2028"]],
    ["no passage", ["earth-sun", "--from", "2020-02", "--to", "2020-03"]],
  ])("keeps to its JSON Schema for %s", async (_, args) => {
    validate(JSON.parse(await answer(...args, "--format", "json")));
    expect(validate.errors).toBeNull();
  });

  test("has the agreed fields, and the account adds up in what is printed", async () => {
    const { rows } = JSON.parse(await answer("earth-sun", "--from", "1961", "--to", "2060", "--format", "json"));
    expect(rows).toHaveLength(198);
    for (const row of rows) {
      expect(Object.keys(row)).toEqual(
        expect.arrayContaining([
          ...["kind", "term", "utc", "tdbSeconds", "bodyMinusBarycentreHours", "barycentreMinusMeanHours", "stepDays"],
          ...["dateStepHours", "calendarHours", "planetsHours", "moonHours", "moonElongationDeg", "firstOrderHours"],
        ]),
      );
      const sum = row.calendarHours + row.planetsHours + row.moonHours;
      expect(Math.abs(sum - row.dateStepHours) * 3600).toBeLessThan(0.01);
    }
  });

  test("gives the same rows as json, ndjson and csv", async () => {
    const args = ["earth-sun", "--from", "2020", "--to", "2023"];
    const { rows } = JSON.parse(await answer(...args, "--format", "json"));
    const lines = (await answer(...args, "--format", "ndjson")).trimEnd().split("\n");
    expect(lines.map((line) => JSON.parse(line))).toEqual(rows);
    const csv = Papa.parse<Record<string, string>>((await answer(...args, "--format", "csv")).trimEnd(), {
      header: true,
    });
    expect(csv.meta.fields).toEqual(schema.$defs.row.required);
    csv.data.forEach((record, i) => {
      for (const [name, value] of Object.entries(rows[i]))
        expect(record[name]).toBe(value === null ? "" : String(value));
    });
  });

  test("adds centres and seasons as columns of their own to csv", async () => {
    const text = await answer(..."earth-sun --from 2020 --to 2021 --centres --seasons --format csv".split(" "));
    const { data } = Papa.parse<Record<string, string>>(text.trimEnd(), { header: true });
    expect(data).toHaveLength(2);
    for (const record of data) {
      expect(record["centres.earth-sun.tdbSeconds"]).toBe(record.tdbSeconds);
      expect(Number(record["centres.earth-ssb.distanceKm"])).toBeGreaterThan(1.4e8);
      expect(record["season.solsticeUtc"]).toMatch(/^20(19-12|20-06)-/);
    }
  });

  test("ends each row of its text with a sentence", async () => {
    const text = await answer("earth-sun", "--from", "2016", "--to", "2018");
    const rows = text.split("\n").filter((line) => /^201[67]-/.test(line));
    expect(rows).toHaveLength(4);
    for (const row of rows)
      expect(row).toMatch(/ (later|earlier) than last year: .* from the Moon, now .* (new|full)( Moon)?$/);
    // the almanac office's minute (U.S. Naval Observatory, Earth's Seasons; from memory)
    expect(text).toContain("2017-01-04 14:18  perihelion");
  });

  test("shows the four dates and the seasons in its text", async () => {
    const text = await answer(
      "earth-sun",
      "--from",
      "2020",
      "--to",
      "2021",
      "--kind",
      "periapsis",
      "--centres",
      "--seasons",
    );
    for (const pair of ["earth-sun", "emb-sun", "earth-ssb", "emb-ssb"])
      expect(text).toMatch(new RegExp(`^ *(perihelion)? *${pair} +20`, "m"));
    expect(text).toMatch(/^2020-01-05 07:48 {2}perihelion {2}2019-12-22 04h +14 d 3 h +283\.283 +283\.299$/m);
  });

  test("says of another pair in one line why it has no split, in text and in json", async () => {
    const why = "mars-sun has no split into calendar, planets, Moon: its passages do not follow the year.";
    expect(await answer("mars-sun", "--from", "2026", "--to", "2028")).toContain(`\n${why}\n`);
    expect(JSON.parse(await answer("mars-sun", "--from", "2026", "--to", "2028", "--format", "json")).note).toBe(why);
  });

  test("writes the chart beside its answer, and the same one each time", async () => {
    const args = ["earth-sun", "--from", "2016", "--to", "2030", "--chart"];
    const text = await answer(...args, "one.svg");
    expect(text).toContain("Drift of earth-sun");
    await answer(...args, "two.svg", "--out", "answer.txt");
    expect(readFileSync(join(folder, "answer.txt"), "utf8")).toBe(text);
    const chart = readFileSync(join(folder, "one.svg"), "utf8");
    expect(readFileSync(join(folder, "two.svg"), "utf8")).toBe(chart);
    expect(chart).toMatch(/^<\?xml[^>]*>\n<svg [\s\S]*<\/svg>\n$/);
    expect(chart).not.toContain("<script");
  });

  test.each([
    ["a reversed span", ["earth-sun", "--from", "2021", "--to", "2020"], "--from 2021 comes after --to 2020"],
    ["an empty span", ["earth-sun", "--from", "2021", "--to", "2021"], "the same moment"],
    ["a span outside the sources", ["earth-sun", "--from", "9000", "--to", "9001"], "is not wholly covered"],
    [
      "a span outside the named source",
      "earth-sun --from 2070 --to 2072 --source kernel".split(" "),
      "is not wholly covered",
    ],
    ["no end", ["earth-sun", "--from", "2021"], "--to is missing"],
    ["two pairs", ["earth-sun,mars-sun", "--from", "2020", "--to", "2021"], "one pair at a time"],
    ["a misspelt pair", ["erth-sun", "--from", "2020", "--to", "2021"], 'did you mean "earth-sun"'],
    ["an unknown kind", "earth-sun --from 2020 --to 2021 --kind aphelion".split(" "), "periapsis, apoapsis, both"],
    [
      "a chart in a folder that is not there",
      "earth-sun --from 2020 --to 2021 --chart no/such.svg".split(" "),
      "--chart no/such.svg cannot be written",
    ],
    ["a chart that is a directory", "earth-sun --from 2020 --to 2021 --chart .".split(" "), "--chart . is a directory"],
    [
      "a chart without a name",
      ["earth-sun", "--from", "2020", "--to", "2021", "--chart", ""],
      '--chart "" names no file',
    ],
    [
      "a chart of another pair",
      "mars-sun --from 2020 --to 2022 --chart m.svg".split(" "),
      "--chart draws the split of earth-sun; mars-sun has no split",
    ],
    [
      "a chart of nothing",
      "earth-sun --from 2020-02 --to 2020-03 --chart m.svg".split(" "),
      "there is no step to draw",
    ],
    [
      "a chart over the answer",
      "earth-sun --from 2020 --to 2021 --chart m.svg --out ./m.svg".split(" "),
      "--chart and --out name the same file",
    ],
    [
      "an answer that cannot be written beside a chart that can",
      "earth-sun --from 2020 --to 2021 --chart m.svg --out no/such.txt".split(" "),
      "--out no/such.txt cannot be written",
    ],
    [
      "centres of a pair that has none",
      "moon-earth --from 2020 --to 2020-03 --centres".split(" "),
      "moon-earth has one centre only",
    ],
    ["seasons of a planet", "mars-sun --from 2020 --to 2022 --seasons".split(" "), "mars-sun has no solstice"],
  ])("refuses %s in one line with status 2, and writes nothing", async (_, args, words) => {
    const before = readdirSync(folder);
    const { status, stdout, stderr } = await run(...args);
    expect(status).toBe(2);
    expect(stdout).toBe("");
    expect(stderr).toContain(words);
    expect(stderr.trimEnd().split("\n")).toHaveLength(1);
    expect(readdirSync(folder)).toEqual(before);
    expect(existsSync(join(folder, "m.svg"))).toBe(false);
  });
});
