import { createHash } from "node:crypto";
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Ajv2020 } from "ajv/dist/2020.js";
import addFormats from "ajv-formats";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { elementsTrack } from "../../src/orbit/elements-track.ts";
import { asLines, asXml, DECAYING, MESSAGE, VERIFICATION } from "../orbit/satellites.ts";
import { apsidary } from "./command.ts";

const PROBE = {
  name: "probe-earth",
  about: "earth",
  semiMajorAxisKm: "42164.172km",
  eccentricity: "0.300000",
  periapsisAt: "2027-03-01T12:00:00.0",
  uncertainty: { semiMajorAxisKm: 0.005, eccentricity: 1e-6, periapsisAt: 2 },
} as const;

const PLANETOID = {
  name: "planetoid-sun",
  about: "sun",
  semiMajorAxisKm: "2.7672000au",
  eccentricity: "0.0783000",
  epoch: "JD 2461000.5",
  meanAnomalyDeg: "188.7000",
  inclinationDeg: 10.59,
  nodeDeg: 80.25,
  argumentDeg: 73.3,
} as const;
const BINARY = {
  name: "star-b-star-a",
  periastronAt: "JD 2455000.25",
  periodDays: 1000.2,
  eccentricity: 0.61,
  argumentDeg: 65.1,
  k1KmS: 20.3,
  sigma: { periastronAt: 0.8, periodDays: 0.05, eccentricity: 0.004, k1KmS: 0.2, argumentDeg: 1.1 },
};

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-tracks-"));
  const file = (name: string, text: string) => writeFileSync(join(folder, name), text);
  file(
    "probe.json",
    JSON.stringify([
      PROBE,
      {
        ...PROBE,
        name: "comet-sun",
        about: "sun",
        eccentricity: "1.2000",
        semiMajorAxisKm: "-5.0000au",
        uncertainty: null,
      },
    ]),
  );
  file(
    "probe.csv",
    "name,about,semiMajorAxisKm,eccentricity,periapsisAt,uncertainty.semiMajorAxisKm,uncertainty.eccentricity,uncertainty.periapsisAt\r\n" +
      "# a comment\r\nprobe-earth,earth,42164.172km,0.300000,2027-03-01T12:00:00.0,0.005,1e-6,2\r\n",
  );
  const track = elementsTrack(PROBE);
  const motion = track.motion(track.pair);
  const out = new Float64Array(6);
  const rows = Array.from({ length: 241 }, (_, i) => {
    const tdb = 857174400 + i * 1200;
    motion.state(tdb, out);
    return [tdb, ...out].map((value) => value.toFixed(6)).join(",");
  });
  const table = ["tdbSeconds,xKm,yKm,zKm,vxKmS,vyKmS,vzKmS", ...rows].join("\n");
  file("flight probe.csv", table);
  file(
    "broken.csv",
    table.replace(/(.*\n){100}/, (head) => `${head}857294400,1e5,0,zero,0,0,0\n`),
  );
  file("satellites.txt", VERIFICATION);
  file("one.txt", VERIFICATION.split("\n").slice(0, 2).join("\r\n"));
  file("decaying.txt", DECAYING);
  file("changed.txt", VERIFICATION.replace("34.2682", "34.2683"));
  file("probe.xml", asXml());
  file("probe.kvn", asLines());
  file("message.json", JSON.stringify([MESSAGE]));
  file("other.xml", asXml({ ...MESSAGE, CENTER_NAME: "MARS" }));
  file("binary.json", JSON.stringify(BINARY));
  file("planetoid.json", JSON.stringify(PLANETOID));
  file("empty.json", "");
  file("half.json", '[{"name": "probe-earth", ');
  file("twice.json", JSON.stringify([PROBE, PROBE]));
  file("odd.json", JSON.stringify({ ...PROBE, periapsisAd: 3 }));
  file("noise.csv", String.fromCharCode(...Array.from({ length: 3000 }, (_, i) => (i * i * 31 + i * 7) % 251)));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function answer(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await apsidary(["passages", ...args], folder);
  expect(stderr).toBe("");
  expect(status).toBe(0);
  return stdout;
}

const WITHIN = ["--from", "2027-03-01T18:00", "--to", "2027-03-03T18:00"];
const MARCH = ["--from", "2027-03-01", "--to", "2027-03-04"];

describe("apsidary passages, of tracks", () => {
  const schema = JSON.parse(readFileSync(new URL("../../docs/schema/passages.json", import.meta.url), "utf8"));
  const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true });
  addFormats.default(ajv);
  const validate = ajv.compile(schema);

  test("keeps to the JSON Schema, beside pairs that the library knows, and names the file and its checksum", async () => {
    const text = await answer(
      "earth-sun,moon-earth",
      "--elements",
      "probe.json",
      "--from",
      "2027",
      "--to",
      "2027-04",
      "--format",
      "json",
    );
    const { made, rows } = JSON.parse(text);
    validate({ made, rows, schema: "apsidary/passages/1" });
    expect(validate.errors).toBeNull();
    expect(made.sources[0].id).toBe("user:probe.json");
    expect(made.sources[0].sha256).toBe(
      createHash("sha256")
        .update(readFileSync(join(folder, "probe.json")))
        .digest("hex"),
    );
    const names = new Set(rows.map((row: { pair: string }) => row.pair));
    expect([...names].sort()).toEqual(["comet-sun", "earth-sun", "moon-earth", "probe-earth"]);
    for (const row of rows) expect(row.heightKm === null).toBe(row.pair === "earth-sun" || row.pair === "moon-earth");
  });

  test("gives heights above the body's radius, and the terms of its centre", async () => {
    const { rows } = JSON.parse(await answer("--elements", "probe.json", ...MARCH, "--format", "json"));
    const perigee = rows.find((row: { term: string }) => row.term === "perigee");
    // a (1 − e) − 6378.1366 km
    expect(perigee.heightKm).toBeCloseTo(42164.172 * 0.7 - 6378.1366, 2);
    expect(perigee.tdb).toBe("2027-03-01T12:00:00.000");
    expect(rows.filter((row: { term: string }) => row.term === "perihelion")).toHaveLength(1);
  });

  test("reads the same elements from CSV as from JSON", async () => {
    const rowsOf = async (file: string) =>
      JSON.parse(await answer("--elements", file, ...MARCH, "--format", "json"))
        .rows.filter((row: { pair: string }) => row.pair === "probe-earth")
        .map((row: object) => ({ ...row, source: "" }));
    expect(await rowsOf("probe.csv")).toEqual(await rowsOf("probe.json"));
  });

  test("finds in a table of states the passages of the elements it was made from, within what it states", async () => {
    const table = JSON.parse(
      await answer("--table", "flight probe.csv", "--about", "earth", ...WITHIN, "--format", "json"),
    ).rows;
    const { rows } = JSON.parse(await answer("--elements", "probe.csv", ...WITHIN, "--format", "json"));
    expect(table).toHaveLength(rows.length);
    table.forEach((row: { tdbSeconds: number; timeUncertaintySeconds: number; pair: string }, i: number) => {
      expect(row.pair).toBe("flight-probe");
      expect(Math.abs(row.tdbSeconds - rows[i].tdbSeconds)).toBeLessThanOrEqual(row.timeUncertaintySeconds + 0.001);
      expect(row.timeUncertaintySeconds).toBeLessThan(1);
    });
  });

  test("lists a satellite's passages from the three forms of its message alike, two perigees a day", async () => {
    const rowsOf = async (file: string) => {
      const { rows } = JSON.parse(await answer("--omm", file, ...MARCH, "--kind", "periapsis", "--format", "json"));
      return rows.map((row: object) => ({ ...row, source: "" }));
    };
    const rows = await rowsOf("probe.xml");
    expect(rows).toHaveLength(6);
    expect(rows[0]).toMatchObject({ pair: "PROBE-ONE-earth", term: "perigee", accuracyBasis: "assumed" });
    expect(await rowsOf("probe.kvn")).toEqual(rows);
    expect(await rowsOf("message.json")).toEqual(rows);
  });

  test("lists the passages of several satellites from two-line elements", async () => {
    const span = ["--from", "2006-06-25", "--to", "2006-06-26"];
    const { status, stderr } = await apsidary(["passages", "--tle", "satellites.txt", ...span], folder);
    expect(stderr).toMatch(/not wholly covered for 00005-earth/); // its epoch is six years before the others'
    expect(status).toBe(2);
    const text = await answer("--tle", "one.txt", "--from", "2000-06-28", "--next", "2");
    expect(text).toMatch(/00005-earth {2}apogee .*user:one\.txt/);
  });

  test("integrates elements with the planets' pull when asked, and marks either answer as what it is", async () => {
    const ask = (...more: string[]) =>
      answer("--elements", "planetoid.json", ...more, "--from", "2027", "--to", "2037");
    const alone = await ask();
    const pulled = await ask("--perturbed");
    expect(alone).toContain("two bodies alone");
    expect(pulled).toContain("with the pull of the planets");
    const perihelia = async (...more: string[]) =>
      JSON.parse(await ask(...more, "--format", "json")).rows.filter(
        (row: { term: string }) => row.term === "perihelion",
      );
    const [first, second] = await Promise.all([perihelia(), perihelia("--perturbed")]);
    expect(first.length).toBe(second.length);
    const differences = first.map((row: { tdbSeconds: number }, i: number) =>
      Math.abs(row.tdbSeconds - second[i].tdbSeconds),
    );
    expect(Math.max(...differences)).toBeGreaterThan(86400); // Jupiter moves it by days
  });

  test("lists a binary star's periastra, each less sure than the one before, and no heights", async () => {
    const text = await answer("--star", "binary.json", "--from", "2027", "--to", "2040", "--format", "json");
    const { made, rows } = JSON.parse(text);
    validate({ made, rows, schema: "apsidary/passages/1" });
    expect(validate.errors).toBeNull();
    const periastra = rows.filter((row: { kind: string }) => row.kind === "periapsis");
    expect(periastra.length).toBeGreaterThan(3);
    for (const row of periastra) {
      const k = Math.round((row.tdbSeconds / 86400 - 3455.25) / 1000.2);
      expect(row.tdbSeconds).toBeCloseTo((3455.25 + k * 1000.2) * 86400, 0);
      expect(row.timeUncertaintySeconds).toBeCloseTo(1.96 * 86400 * Math.hypot(0.8, 0.05 * k), 0);
      expect(row).toMatchObject({ heightKm: null, targetPoint: null, centrePoint: null, accuracyBasis: "user" });
    }
  });

  test("prints heights, and says when the half-widths stand on digits alone", async () => {
    const text = await answer("--elements", "probe.json", ...MARCH);
    expect(text).toMatch(/probe-earth {2}perigee +29 514\.92 {2}± 0\.05 +23 136\.78 {2}user:probe\.json$/m);
    expect(text).toMatch(/^digits: the half-widths follow from the digits/m);
    expect(text).toContain("two bodies alone");
  });

  test.each([
    [
      "a file that is not there",
      ["--elements", "none.json"],
      /--elements none\.json cannot be read: there is no such file/,
    ],
    ["a folder", ["--table", "."], /--table \. cannot be read: it is a directory/],
    ["an empty file", ["--elements", "empty.json"], /empty\.json: the file is empty/],
    ["half a file", ["--elements", "half.json"], /half\.json: it is no JSON/],
    ["two orbits of one name", ["--elements", "twice.json"], /two orbits are called "probe-earth"/],
    [
      "an element that is none",
      ["--elements", "odd.json"],
      /"periapsisAd" is no element; did you mean "periapsisAt"\?/,
    ],
    ["noise for elements", ["--elements", "noise.csv"], /neither JSON nor a CSV/],
    ["noise for a table", ["--table", "noise.csv"], /has no column tdb/],
    ["a row that is broken", ["--table", "broken.csv"], /row 100 of the table: zKm is "zero", no number/],
    [
      "a satellite that has decayed",
      ["--tle", "decaying.txt"],
      /28872-earth has decayed: .* comes down on 2005-11-29T01:/,
    ],
    ["elements that were changed", ["--tle", "changed.txt"], /line 2: its checksum is 7/],
    ["noise for two-line elements", ["--tle", "noise.csv"], /noise\.csv: /],
    ["noise for a message", ["--omm", "noise.csv"], /noise\.csv: /],
    ["a message of another centre", ["--omm", "other.xml"], /CENTER_NAME is "MARS"/],
    ["the planets' pull on nothing", ["moon-earth", "--perturbed"], /--perturbed goes with --elements/],
    [
      "the planets' pull about the Earth",
      ["--elements", "probe.csv", "--perturbed"],
      /about the sun alone, not about earth/,
    ],
    ["a star that is none", ["--star", "probe.json"], /"about" is no element of a star/],
    ["noise for a star", ["--star", "noise.csv"], /noise\.csv: it is no JSON/],
    ["a body that is none", ["--table", "flight probe.csv", "--about", "erth"], /did you mean "earth"/],
    ["a body without a table", ["moon-earth", "--about", "earth"], /--about goes with --table/],
    [
      "a span outside the table",
      ["--table", "flight probe.csv", "--next", "3"],
      /is not wholly covered for flight-probe/,
    ],
  ])("refuses %s in one line with status 2", async (_, args, says) => {
    const span = args.includes("--next") ? ["--from", "2030"] : MARCH;
    const { status, stdout, stderr } = await apsidary(["passages", ...args, ...span], folder);
    expect(stdout).toBe("");
    expect(stderr).toMatch(says);
    expect(stderr.trimEnd().split("\n")).toHaveLength(1);
    expect(status).toBe(2);
  });
});
