import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Ajv2020 } from "ajv/dist/2020.js";
import addFormats from "ajv-formats";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { apsidary } from "./command.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-plan-"));
  const north = { name: "North Ridge", latitude: 69.6, longitude: 18.9, height: 20, zone: "Europe/Oslo" };
  const low = { name: "Low Basin", latitude: 31.5, longitude: 35.5, height: -430 };
  writeFileSync(join(folder, "sites.json"), JSON.stringify([north, low]));
  writeFileSync(join(folder, "twice.json"), JSON.stringify([low, low]));
  writeFileSync(join(folder, "zone.json"), JSON.stringify([{ ...low, zone: "Asia/Amann" }]));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function answer(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await apsidary(["plan", ...args], folder);
  expect(stderr).toBe("");
  expect(status).toBe(0);
  return stdout;
}

const schema = JSON.parse(readFileSync(new URL("../../docs/schema/plan.json", import.meta.url), "utf8"));
const SITE = ["--site", "46.5,8.0,2100"];

describe("apsidary plan", () => {
  const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true });
  addFormats.default(ajv);
  const validate = ajv.compile(schema);

  test.each([
    [
      "the Moon and a zone",
      ["moon-earth", ...SITE, "--zone", "Europe/Zurich", "--from", "2026", "--to", "2026-07", "--matched"],
    ],
    [
      "the Sun with refraction",
      ["earth-sun", ...SITE, "--from", "2026", "--to", "2028", "--refraction", "--within", "0.1%"],
    ],
    ["a planet over all sites of a file", ["mars-sun", "--sites", "sites.json", "--from", "2026", "--to", "2030"]],
    [
      "a planet whose near interval lasts for years",
      ["saturn-sun", ...SITE, "--from", "2030", "--to", "2034", "--within", "500000km"],
    ],
    ["a pole", ["moon-earth", "--site=-90,0,2835", "--from", "2026-06", "--to", "2026-08"]],
    ["moons of Jupiter", ["callisto-jupiter", ...SITE, "--from", "2026-01-01", "--to", "2026-02-01"]],
    ["UT1 before 1972", ["moon-earth", ...SITE, "--from", "1900", "--to", "1900-03"]],
    ["no passage", ["mars-sun", ...SITE, "--from", "2026-01-01", "--to", "2026-01-02"]],
  ])("keeps to its JSON Schema for %s", async (_, args) => {
    validate(JSON.parse(await answer(...args, "--format", "json")));
    expect(validate.errors).toBeNull();
  });

  test("gives the same rows as json, ndjson and csv, the header of the csv being the fields of the schema", async () => {
    const args = ["moon-earth", ...SITE, "--from", "2026", "--to", "2026-03"];
    const { rows } = JSON.parse(await answer(...args, "--format", "json"));
    const lines = (await answer(...args, "--format", "ndjson")).trimEnd().split("\n");
    expect(lines.map((line) => JSON.parse(line))).toEqual(rows);
    const [header, ...records] = (await answer(...args, "--format", "csv")).trimEnd().split("\r\n");
    const names = Object.keys(schema.$defs.row.properties);
    expect(header?.split(",")).toEqual(names);
    expect(Object.keys(rows[0])).toEqual(names);
    expect(records).toHaveLength(rows.length);
    const { fromUtc, toUtc } = rows[0].windows[0];
    expect(records[0]).toContain(`${fromUtc}/${toUtc}`);
  });

  test("gives the same bytes for the same call, in every form", async () => {
    for (const format of ["text", "json", "csv", "ics"]) {
      const args = ["moon-earth", ...SITE, "--from", "2026", "--to", "2026-03", "--format", format];
      expect(await answer(...args)).toBe(await answer(...args));
    }
  });

  test("tells local times in the site's zone, and takes one site of a file by its name", async () => {
    const args = ["moon-earth", "--sites", "sites.json", "--site", "North Ridge", "--from", "2026", "--to", "2026-02"];
    const text = await answer(...args);
    expect(text).toContain("Site North Ridge, times in Europe/Oslo");
    expect(text).not.toContain("Low Basin");
    // 2026-01-01 21:44 UTC
    expect(text).toMatch(/^2026-01-01 22:44 {2}perigee/m);
    const { rows, sites } = JSON.parse(await answer(...args, "--format", "json"));
    expect(rows[0].local).toMatch(/^2026-01-01T22:44:.*\+01:00$/);
    expect(sites).toMatchObject([{ name: "North Ridge", whyNoDip: null }]);
  });

  test("says in a report what is near, up and dark, which distance the passage belongs to, and what is dangerous", async () => {
    const text = await answer("earth-sun", "--site", "31.5,35.5", "--from", "2026", "--to", "2027");
    expect(text).toContain("No height is given for the site; 0 m is taken.");
    expect(text).toContain("certified solar filter");
    expect(text.replace(/\s+/g, " ")).toContain("The passage belongs to the distance from centre to centre");
    expect(text.replace(/\s+/g, " ")).toContain("The observatory's own rules decide");
    for (const line of text.split("\n")) expect(line.length).toBeLessThanOrEqual(100);
    expect(await answer("moon-earth", "--sites", "sites.json", "--from", "2026-06-01", "--to", "2026-06-05")).toMatch(
      /Site North Ridge[\s\S]*it is never up[\s\S]*Site Low Basin/,
    );
  });

  test.each([
    ["latitude 91", [...["--site", "91,0,0"]], /latitude 91 is not within -90 and 90/],
    ["longitude before latitude", ["--site", "139.7,35.6,40"], /did you mean 35\.6,139\.7\?/],
    ["no site", [], /--site is missing/],
    ["a site that is no place", ["--site", "home"], /--site: the site "home" is not latitude,longitude,height/],
    ["two sites of one name", ["--sites", "twice.json"], /twice\.json: two sites are called "Low Basin"/],
    [
      "a zone of a file that there is not",
      ["--sites", "zone.json"],
      /zone\.json, site 1 \("Low Basin"\): There is no zone/,
    ],
    ["a zone that there is not", ["--site", "1,2", "--zone", "Europe/Zurch"], /did you mean "Europe\/Zurich"/],
    [
      "a name that is not in the file",
      ["--sites", "sites.json", "--site", "North Rigde"],
      /did you mean (North Ridge|"North Ridge")\?/,
    ],
    ["no file", ["--sites", "none.json"], /there is no such file/],
    ["no nearness", ["--site", "1,2", "--within", "near"], /--within near is no nearness/],
    ["no darkness", ["--site", "1,2", "--dark", "dusk"], /--dark dusk is not a number/],
    ["several sites to match", ["--sites", "sites.json", "--matched"], /--matched takes one site/],
  ])("refuses %s in one line, with status 2 and nothing on standard output", async (_, args, message) => {
    const { status, stdout, stderr } = await apsidary(
      ["plan", "moon-earth", ...args, "--from", "2026", "--to", "2027"],
      folder,
    );
    expect(stderr).toMatch(message);
    expect(stderr.trimEnd().split("\n")).toHaveLength(1);
    expect(stdout).toBe("");
    expect(status).toBe(2);
  });

  test("refuses distances from the barycentre of the solar system", async () => {
    const { status, stderr } = await apsidary(["plan", "earth-ssb", ...SITE, "--from", "2026", "--to", "2027"], folder);
    expect(stderr).toMatch(/nobody sees the barycentre.*earth-sun/);
    expect(status).toBe(2);
  });
});
