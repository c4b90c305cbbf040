import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Ajv2020 } from "ajv/dist/2020.js";
import addFormats from "ajv-formats";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { apsidary } from "./command.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-answers-"));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function answer(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await apsidary(args, folder);
  expect(stderr).toBe("");
  expect(status).toBe(0);
  return stdout;
}

const schemaOf = (command: string) =>
  JSON.parse(readFileSync(new URL(`../../docs/schema/${command}.json`, import.meta.url), "utf8"));

function validatorOf(command: string) {
  const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true });
  addFormats.default(ajv);
  return ajv.compile(schemaOf(command));
}

describe("apsidary passages", () => {
  const validate = validatorOf("passages");

  test.each([
    ["the Moon and the Earth", ["moon-earth,earth-sun,emb-sun", "--from", "2026", "--to", "2027"]],
    ["secondary extrema past the list of leap seconds", ["neptune-sun,neptune-ssb", "--from", "2040", "--to", "2055"]],
    ["UT1 before 1972", ["moon-earth", "--from", "1971-12", "--to", "1972-02"]],
    ["years before 0, by the engine", ["earth-sun", "--from=-0500", "--next", "2"]],
    ["ranks that no source reaches", ["uranus-sun", "--from", "1960", "--to", "2060", "--source", "kernel"]],
    ["the moons of Jupiter", ["io-jupiter,europa-jupiter", "--from", "2026-01-01", "--to", "2026-01-05"]],
    ["no passage", ["moon-earth", "--from", "2026-01-02", "--to", "2026-01-03"]],
  ])("keeps to its JSON Schema for %s", async (_, args) => {
    const text = await answer("passages", ...args, "--format", "json");
    validate(JSON.parse(text));
    expect(validate.errors).toBeNull();
  });

  test("gives the same rows as json, ndjson and csv, the header of the csv being the fields of the schema", async () => {
    const args = ["passages", "moon-earth,earth-sun", "--from", "2026", "--next", "6"];
    const { rows } = JSON.parse(await answer(...args, "--format", "json"));
    const lines = (await answer(...args, "--format", "ndjson")).trimEnd().split("\n");
    expect(lines.map((line) => JSON.parse(line))).toEqual(rows);
    const [header, ...records] = (await answer(...args, "--format", "csv")).trimEnd().split("\r\n");
    expect(header?.split(",")).toEqual(Object.keys(schemaOf("passages").$defs.row.properties));
    expect(records.map((record) => record.split(","))).toEqual(
      rows.map((row: Record<string, unknown>) => Object.values(row).map((value) => (value === null ? "" : `${value}`))),
    );
    expect(rows).toHaveLength(6);
  });

  test("gives the same bytes for the same call", async () => {
    for (const format of ["text", "json", "csv"]) {
      const args = ["passages", "moon-earth,venus-sun", "--from", "2026", "--to", "2028", "--format", format];
      expect(await answer(...args)).toBe(await answer(...args));
    }
  });

  test("names in `made` only the sources that could supply or rank a row", async () => {
    const ids = async (...args: string[]) =>
      JSON.parse(await answer("passages", ...args, "--format", "json")).made.sources.map(
        ({ id }: { id: string }) => id,
      );
    expect(await ids("moon-earth", "--from", "2026", "--to", "2027")).toEqual(["de405"]);
    expect(await ids("io-jupiter", "--from", "2026", "--next", "1")).toEqual(["engine"]);
    const across = await ids("moon-earth", "--from", "2059", "--to", "2061");
    expect(across[0]).toBe("de405");
    expect(across.length).toBe(2);
  });

  test("gives the checksum of the built-in kernel as sha256sum would", async () => {
    const { createHash } = await import("node:crypto");
    const file = readFileSync(new URL("../../src/data/de405.bsp", import.meta.url));
    const { made } = JSON.parse(
      await answer("passages", "moon-earth", "--from", "2026", "--next", "1", "--format", "json"),
    );
    expect(made.sources[0].sha256).toBe(createHash("sha256").update(file).digest("hex"));
  });

  test("takes several pairs as one word or as several, and an offset in a date", async () => {
    const joined = await answer("passages", "moon-earth,earth-sun", "--from", "2026-01-01T13:00+13:00", "--to", "2027");
    const apart = await answer("passages", "moon-earth", "earth-sun", "--from", "2026", "--to", "2027");
    expect(joined.split("\n").slice(1)).toEqual(apart.split("\n").slice(1));
  });

  test("leaves out what --kind and --rank leave out", async () => {
    const rows = async (...args: string[]) =>
      JSON.parse(await answer("passages", "neptune-sun", "--from", "2040", "--to", "2055", ...args, "--format", "json"))
        .rows;
    const all = await rows();
    expect(await rows("--kind", "apoapsis")).toEqual(all.filter((row: { kind: string }) => row.kind === "apoapsis"));
    expect(await rows("--rank", "principal")).toEqual(all.filter((row: { rank: string }) => row.rank !== "secondary"));
  });

  test("says that the sources end where --next asks for more than they hold", async () => {
    const { status, stdout, stderr } = await apsidary(
      ["passages", "moon-earth", "--from", "2060", "--next", "9", "--source", "kernel", "--format", "ndjson"],
      folder,
    );
    expect(status).toBe(0);
    expect(stdout.trimEnd().split("\n")).toHaveLength(2);
    expect(stderr).toBe("apsidary: only 2 of 9 passages; the sources end there.\n");
  });

  // U.S. Naval Observatory, Earth's Seasons (from memory, as the file says).
  test("prints the minutes that the national almanac office prints for 2020 to 2026", async () => {
    const book = JSON.parse(readFileSync(new URL("../reference/handbook-values.json", import.meta.url), "utf8"));
    const office: string[] = [...book.earthOffice.perihelion, ...book.earthOffice.aphelion].sort();
    const lines = (await answer("passages", "earth-sun", "--from", "2020", "--to", "2027")).split("\n");
    expect(
      lines.filter((line) => line.includes("de405 ") || line.endsWith("de405")).map((line) => line.slice(0, 16)),
    ).toEqual(office);
  });

  test("prints a report of a year within 100 columns, with its cautions", async () => {
    const text = await answer("passages", "moon-earth,earth-sun,jupiter-sun,emb-ssb", "--from", "2029", "--to", "2030");
    for (const line of text.split("\n")) expect(line.length).toBeLessThanOrEqual(100);
    expect(text).toContain("Never look at the Sun through any optics without a certified solar filter.");
    expect(text).toContain("ssb is the barycentre of the solar system, not the Sun.");
    expect(text).toMatch(/predicted: after the leap-second list expires/);
    expect(await answer("passages", "jupiter-sun", "--from", "2023", "--to", "2024")).toContain(
      "barycentre of the planet",
    );
  });

  test("prints no finer unit than the uncertainty defends, and marks what a reader must know", async () => {
    const text = await answer("passages", "neptune-sun", "--from", "2042", "--to", "2051");
    expect(text).toMatch(/^2042-09-03 .* neptune-sun {2}perihelion /m);
    expect(text).toMatch(/^2050-06 .* local minimum .* secondary/m);
    expect(await answer("passages", "moon-earth", "--from", "1971-12", "--to", "1972")).toMatch(/^UT: before 1972/m);
    expect(await answer("passages", "moon-earth", "--from", "2026-01-02", "--to", "2026-01-03")).toContain(
      "No passage",
    );
  });

  test("marks a kernel whose accuracy is only assumed", async () => {
    const { writeFileSync } = await import("node:fs");
    const { makeKernel } = await import("../ephemeris/make-kernel.ts");
    const { fourSegments } = await import("../ephemeris/paths.ts");
    writeFileSync(join(folder, "mine.bsp"), makeKernel(fourSegments()));
    const text = await answer(
      "passages",
      "moon-earth",
      "--kernel",
      "mine.bsp",
      "--from",
      "2000-01-10",
      "--to",
      "2000-02-20",
    );
    expect(text).toMatch(/ user:mine\.bsp {2}.*assumed$/m);
    expect(text).toContain("assumed: a kernel of unknown accuracy");
    expect(text).toContain("Source user:mine.bsp: mine.bsp");
  });
});

describe("apsidary range", () => {
  const validate = validatorOf("range");

  test.each([
    ["the Moon", ["moon-earth", "--from", "2026", "--to", "2026-01-08", "--step", "6h"]],
    ["UT1 before 1972", ["earth-sun", "--from", "1971-12-30", "--to", "1972-01-03", "--step", "1d"]],
    [
      "distances past the last extremum of a source",
      ["uranus-sun", "--from", "2055", "--to", "2060", "--step", "100d", "--source", "kernel"],
    ],
  ])("keeps to its JSON Schema for %s", async (_, args) => {
    const answered = JSON.parse(await answer("range", ...args, "--format", "json"));
    validate(answered);
    expect(validate.errors).toBeNull();
    expect(answered.rows.length).toBeGreaterThan(3);
  });

  test("gives a row at the beginning, none at the end, and the header of its schema as csv", async () => {
    const args = ["range", "moon-earth", "--from", "2026-01-01", "--to", "2026-01-02", "--step", "6h"];
    const [header, ...records] = (await answer(...args, "--format", "csv")).trimEnd().split("\r\n");
    expect(header?.split(",")).toEqual(Object.keys(schemaOf("range").$defs.row.properties));
    expect(records.map((record) => record.slice(0, 24))).toEqual(
      ["00", "06", "12", "18"].map((hour) => `2026-01-01T${hour}:00:00.000Z`),
    );
  });

  test("prints a report within 100 columns", async () => {
    const text = await answer("range", "moon-earth", "--from", "2026-01-01", "--to", "2026-01-03", "--step", "90min");
    for (const line of text.split("\n")) expect(line.length).toBeLessThanOrEqual(100);
    expect(text).toMatch(/^2026-01-01 01:30:00 /m);
  });
});

describe("apsidary calendar", () => {
  test("prints a year in the readers' zone, summer time counted, and nothing of the years beside it", async () => {
    const text = await answer("calendar", "2026", "--zone", "Pacific/Auckland");
    // 2026-01-03 17:16 UTC, U.S. Naval Observatory, Earth's Seasons (from memory)
    expect(text).toMatch(/^2026-01-04 06:16 {2}\+13:00 {2}01-03 17:16 {2}perihelion /m);
    // 2026-07-06 17:31 UTC, ditto
    expect(text).toMatch(/^2026-07-07 05:31 {2}\+12:00 {2}07-06 17:31 {2}aphelion /m);
    const years = [...text.matchAll(/^(\d{4})-\d\d-\d\d/gm)].map((match) => match[1]);
    expect(new Set(years)).toEqual(new Set(["2026"]));
    expect(text).toContain("Never look at the Sun");
  });

  test("knows the next year", async () => {
    const text = await answer("calendar", "next", "--zone", "UTC");
    expect(text).toMatch(new RegExp(`^Apsis passages of ${new Date().getUTCFullYear() + 1}, UTC`));
  });
});

describe("apsidary sources and help", () => {
  test("tells what the sources hold", async () => {
    const text = await answer("sources");
    expect(text).toMatch(/^de405 \(kernel\)/);
    expect(text).toMatch(/1959-12-10T00:00:00 to 2060-01-30T00:00:00 TDB: .*moon-earth/);
    expect(text).toMatch(/moon about earth, type 2/);
    expect(text).toMatch(/^engine \(engine\)/m);
  });

  test("explains commands, pairs, options and exit status in its help", async () => {
    const help = await answer("--help");
    for (const word of [
      "passages",
      "range",
      "calendar",
      "drift",
      "audit",
      "plan",
      "orbit",
      "sources",
      "Exit status",
      "Examples",
    ])
      expect(help).toContain(word);
    const passages = await answer("passages", "--help");
    for (const word of ["moon-earth", "emb", "PLANET-ssb", "--next", "--leap-seconds", "Examples"]) {
      expect(passages).toContain(word);
    }
    expect(await answer("help", "passages")).toBe(passages);
    for (const line of `${help}${passages}`.split("\n")) expect(line.length).toBeLessThanOrEqual(100);
  });

  test("prints the package's version", async () => {
    const { version } = JSON.parse(readFileSync(new URL("../../package.json", import.meta.url), "utf8"));
    expect(await answer("--version")).toBe(`${version}\n`);
  });
});
