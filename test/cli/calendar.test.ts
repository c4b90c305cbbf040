import { spawnSync } from "node:child_process";
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Ajv2020 } from "ajv/dist/2020.js";
import addFormats from "ajv-formats";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { apsidary } from "./command.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-calendar-"));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function answer(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await apsidary(["calendar", ...args], folder);
  expect(stderr).toBe("");
  expect(status).toBe(0);
  return stdout;
}

function validatorOf(name: string) {
  const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true });
  addFormats.default(ajv);
  return ajv.compile(JSON.parse(readFileSync(new URL(`../../docs/schema/${name}.json`, import.meta.url), "utf8")));
}

/** The bodies that most tests are content with: quick to find. */
const SOME = ["--pairs", "earth-sun,moon-earth,mars-sun"];

const widest = (text: string) => Math.max(...text.split("\n").map((line) => [...line].length));

describe("the calendar as text", () => {
  // U.S. Naval Observatory, Earth's Seasons (from memory): 2026-01-03 17:16 and 2026-07-06 17:31.
  test("prints the office's minutes of 2026 and their UTC, a block for each body, and what must be read", async () => {
    const text = await answer("2026", "--zone", "Pacific/Auckland");
    expect(text).toMatch(/^2026-01-04 06:16 {2}\+13:00 {2}01-03 17:16 {2}perihelion /m);
    expect(text).toMatch(/^2026-07-07 05:31 {2}\+12:00 {2}07-06 17:31 {2}aphelion /m);
    for (const body of ["Earth about the Sun", "Moon about the Earth", "Mars about the Sun"]) {
      expect(text).toContain(`\n${body}, 2026\n`);
    }
    expect(text).toContain("certified solar filter");
    expect(text).toContain("raised tides are likely");
    expect(text).toContain("not for navigation");
  });

  test.each([
    ["a plain year", ["2027", "--zone", "Asia/Kathmandu", ...SOME]],
    [
      "three zones and names of months",
      ["2026", "--zone", "Pacific/Chatham,UTC,Asia/Kathmandu", "--months", "names", "--lang", "pt-BR", ...SOME],
    ],
    [
      "years that nothing knows to the minute",
      ["1700", "--zone", "Europe/Lisbon", "--source", "engine", "--pairs", "earth-sun,moon-earth"],
    ],
  ])("keeps to 100 columns: %s", async (_, args) => {
    expect(widest(await answer(...args))).toBeLessThanOrEqual(100);
  });

  test("is ASCII alone where that is asked for, names of months included", async () => {
    const text = await answer(
      "1850",
      "--zone",
      "Europe/Lisbon",
      "--ascii",
      "--months",
      "names",
      "--lang",
      "fr",
      "--pairs",
      "earth-sun",
    );
    expect(text).toMatch(/^[\n\x20-\x7e]+$/);
    expect(text).not.toContain("?");
  });

  test("prints hours with an h and cuts off where the house does", async () => {
    const text = await answer("2026", "--zone", "UTC", "--pairs", "earth-sun", "--unit", "hour", "--rounding", "cut");
    expect(text).toMatch(/^2026-01-03 17 h /m);
    expect(text).toMatch(/^2026-07-06 17 h /m);
  });
});

describe("the calendar for programs", () => {
  test.each([
    ["a year in a zone", ["2027", "--zone", "Pacific/Chatham"]],
    ["zones side by side", ["2027", "--zone", "Asia/Kathmandu,UTC", "--pairs", "earth-sun,moon-earth"]],
    ["years before 1, by the engine", ["-0499", "--zone", "UTC", "--pairs", "earth-sun"]],
    ["barycentres, for which there is no disc", ["2026-2030", "--zone", "UTC", "--pairs", "earth-ssb,mars-ssb"]],
    ["a list", ["2001-2050", "--zone", "UTC", "--nearest", "5"]],
  ])("keeps to its JSON Schema: %s", async (_, args) => {
    const given = args[0]?.startsWith("-") ? [...args.slice(1), "--", args[0]] : args;
    const validate = validatorOf("calendar");
    validate(JSON.parse(await answer("--format", "json", ...given)));
    expect(validate.errors).toBeNull();
  });

  test("gives the same bytes twice, and the same rows as ndjson and as CSV read by Python", async () => {
    const args = ["2026", "--zone", "Pacific/Auckland", ...SOME];
    const json = await answer(...args, "--format", "json");
    expect(await answer(...args, "--format", "json")).toBe(json);
    const { rows } = JSON.parse(json);
    const lines = (await answer(...args, "--format", "ndjson")).trimEnd().split("\n");
    expect(lines.map((line) => JSON.parse(line))).toEqual(rows);
    const csv = await answer(...args, "--format", "csv");
    const script =
      "import csv, json, sys, io; print(json.dumps(list(csv.DictReader(io.TextIOWrapper(sys.stdin.buffer, newline=''), strict=True))))";
    const { stdout } = spawnSync("/usr/bin/python3", ["-c", script], { input: csv, encoding: "utf8" });
    const flat = (value: unknown) => (value === null ? "" : Array.isArray(value) ? value.join(" ") : `${value}`);
    expect(JSON.parse(stdout)).toEqual(
      rows.map((row: Record<string, unknown>) => Object.fromEntries(Object.entries(row).map(([k, v]) => [k, flat(v)]))),
    );
    expect(csv.replaceAll("\r\n", "")).not.toMatch(/[\r\n]/);
  });

  const office = ["soffice", "libreoffice"].find((name) => spawnSync(name, ["--version"]).status === 0) ?? null;
  test.skipIf(office === null)("opens in LibreOffice with the same rows and numbers", async () => {
    await answer("2026", "--zone", "Asia/Kathmandu", ...SOME, "--format", "csv", "--out", "sheet.csv");
    const { rows } = JSON.parse(await answer("2026", "--zone", "Asia/Kathmandu", ...SOME, "--format", "json"));
    const profile = `-env:UserInstallation=file://${join(folder, "office")}`;
    // UTF-8, separated by commas; English, so that decimals are points
    const args = [
      profile,
      "--headless",
      "--convert-to",
      "fods",
      "--infilter=CSV:44,34,76,1,,1033",
      "--outdir",
      folder,
      join(folder, "sheet.csv"),
    ];
    expect(spawnSync(office ?? "", args, { encoding: "utf8", timeout: 50_000 }).status).toBe(0);
    const sheet = readFileSync(join(folder, "sheet.fods"), "utf8");
    const numbers = [...sheet.matchAll(/office:value-type="float" office:value="([^"]+)"/g)].map((match) =>
      Number(match[1]),
    );
    for (const row of rows) {
      expect(numbers).toContain(row.tdbSeconds);
      expect(numbers).toContain(row.distanceKm);
      expect(numbers).toContain(Number(row.printedKm));
      expect(sheet).toContain(row.utc);
    }
    expect(sheet).not.toContain("table:formula");
  });
});

describe("calendar files and pages", () => {
  test("a file made at a told time is the same to the byte; its DTSTAMP is that time", async () => {
    process.env.SOURCE_DATE_EPOCH = "1767225600"; // 2026-01-01T00:00:00Z
    try {
      const args = ["2026", "--zone", "Asia/Kathmandu", "--format", "ics", "--alarm", "30", ...SOME];
      const text = await answer(...args);
      expect(await answer(...args)).toBe(text);
      expect(text).toContain("\r\nDTSTAMP:20260101T000000Z\r\n");
      expect(text).toContain("\r\nTRIGGER:-PT30M\r\n");
      expect(text).toContain("\r\nDTSTART:20260103T171600Z\r\n");
    } finally {
      delete process.env.SOURCE_DATE_EPOCH;
    }
  });

  test("the page goes to a file of its own beside the text, and standard error says where", async () => {
    const { status, stdout, stderr } = await apsidary(
      ["calendar", "next", "--zone", "UTC", "--page", "p.html", ...SOME],
      folder,
    );
    expect(status).toBe(0);
    expect(stdout).toMatch(new RegExp(`^Apsis passages of ${new Date().getUTCFullYear() + 1}, UTC`));
    expect(stderr).toBe(`apsidary: the page of this calendar is ${join(folder, "p.html")}\n`);
    expect(readFileSync(join(folder, "p.html"), "utf8")).toMatch(/^<!DOCTYPE html>[\s\S]*<\/html>\n$/);
  });

  test("a page without a name goes among the temporary files, not into the folder", async () => {
    const before = readdirSync(folder);
    const { stderr } = await apsidary(["calendar", "2027", "--zone", "UTC", "--pairs", "earth-sun", "--page"], folder);
    const path = /calendar is (.*apsides-2027\.html)\n$/.exec(stderr)?.[1] ?? "";
    expect(readFileSync(path, "utf8")).toContain("<h1>Apsis passages of 2027, UTC</h1>");
    rmSync(join(path, ".."), { recursive: true });
    expect(readdirSync(folder)).toEqual(before);
  });
});

describe("lists and changes", () => {
  // J. Meeus (from memory): the nearest perigees of 2001 to 2059 are those of 2052-12-06 and 2034-11-25.
  test("lists the nearest perigees of a span, the nearest first", async () => {
    const { rows, list } = JSON.parse(await answer("2001-2059", "--zone", "UTC", "--nearest", "2", "--format", "json"));
    expect(list).toEqual({ which: "nearest", count: 2, kind: "periapsis" });
    expect(rows.map(({ printed }: { printed: string }) => printed.slice(0, 10))).toEqual(["2052-12-06", "2034-11-25"]);
    const far = await answer("2001-2059", "--zone", "UTC", "--farthest", "3", "--kind", "periapsis");
    expect(far).toMatch(/^1 .* perigee +370 \d\d\d/m);
  });

  test("tells what changed against the calendar of another year, and that nothing did against itself", async () => {
    await answer("2026", "--zone", "UTC", ...SOME, "--format", "json", "--out", "2026.json");
    expect(await answer("2026", "--zone", "UTC", "--against", "2026.json", ...SOME)).toMatch(
      /^0 of \d+ passages differ/m,
    );
    const changes = JSON.parse(
      await answer("2027", "--zone", "UTC", "--against", "2026.json", ...SOME, "--format", "json"),
    );
    const validate = validatorOf("calendar-changes");
    validate(changes);
    expect(validate.errors).toBeNull();
    const step = changes.rows.find((row: { pair: string }) => row.pair === "earth-sun");
    // 2026-01-03 17:16 to 2027-01-03 02:33: 14.7 h earlier in the year
    expect(step.laterSeconds / 3600).toBeCloseTo(-14.7, 1);
  });
});

describe("the calendar refuses in one line, with status 2, and writes nothing", () => {
  test.each([
    ["a year of five digits", ["99999", "--zone", "UTC"], /99999 is not a year/],
    ["years in the wrong order", ["2030-2020", "--zone", "UTC"], /2020, comes before its first, 2030/],
    ["a misspelt pair", ["2027", "--pairs", "mon-earth"], /did you mean "moon-earth"/],
    [
      "an unknown zone beside the first",
      ["2027", "--zone", "UTC,Asia/Katmandu2"],
      /no zone "Asia\/Katmandu2"; did you mean/,
    ],
    ["four zones", ["2027", "--zone", "UTC,Asia/Kathmandu,Pacific/Auckland,Europe/Lisbon"], /two at most/],
    [
      "a folder that is not there",
      ["2027", "--zone", "UTC", "--out", "no/such/file.ics", "--format", "ics"],
      /no folder no\/such/,
    ],
    [
      "a page in a folder that is not there",
      ["2027", "--zone", "UTC", "--page", "no/p.html"],
      /^apsidary: --page no\/p.html cannot be written/,
    ],
    ["an unknown form", ["2027", "--format", "pdf"], /--format pdf is unknown/],
    ["an alarm without a calendar file", ["2027", "--alarm", "30"], /--alarm belongs to --format ics/],
    [
      "an alarm that is no number",
      ["2027", "--format", "ics", "--alarm", "soon"],
      /--alarm soon is no number of minutes/,
    ],
    ["a list of several pairs", ["2027", "--nearest", "3", "--pairs", "moon-earth,earth-sun"], /takes one pair/],
    ["a list of nothing", ["2027", "--nearest", "0"], /--nearest 0 is no number/],
    ["an unknown language", ["2027", "--lang", "xx-invalid-"], /no language known/],
    ["a file to hold against that is not there", ["2027", "--against", "none.json"], /there is no such file/],
  ])("%s", async (_, args, message) => {
    const before = readdirSync(folder);
    const { status, stdout, stderr } = await apsidary(["calendar", ...args], folder);
    expect(status).toBe(2);
    expect(stdout).toBe("");
    expect(stderr).toMatch(message);
    expect(stderr.trimEnd().split("\n")).toHaveLength(1);
    expect(readdirSync(folder)).toEqual(before);
  });

  test("a file that is no calendar, or one for another zone", async () => {
    writeFileSync(join(folder, "other.json"), '{"schema": "apsidary/passages/1"}');
    const other = await apsidary(["calendar", "2027", "--zone", "UTC", "--against", "other.json"], folder);
    expect([other.status, other.stderr]).toEqual([2, expect.stringContaining("is no calendar in JSON")]);
    await answer("2026", "--zone", "UTC", ...SOME, "--format", "json", "--out", "utc.json");
    const zone = await apsidary(["calendar", "2027", "--zone", "+05:45", "--against", "utc.json"], folder);
    expect([zone.status, zone.stderr]).toEqual([2, expect.stringContaining("add --zone UTC")]);
  });
});
