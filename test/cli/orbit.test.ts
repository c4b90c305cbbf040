import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Ajv2020 } from "ajv/dist/2020.js";
import Papa from "papaparse";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { apsidary } from "./command.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-orbit-"));
});
afterAll(() => rmSync(folder, { recursive: true }));

async function answer(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await apsidary(["orbit", ...args], folder);
  expect(stderr).toBe("");
  expect(status).toBe(0);
  return stdout;
}

async function refusal(...args: string[]): Promise<string> {
  const { status, stdout, stderr } = await apsidary(["orbit", ...args], folder);
  expect(stdout).toBe("");
  expect(status).toBe(2);
  expect(stderr.trimEnd().split("\n")).toHaveLength(1);
  return stderr;
}

const TRANSFER = ["--about", "earth", "--periapsis-height", "250km", "--apoapsis-height", "35786km"];

describe("apsidary orbit", () => {
  const schema = JSON.parse(readFileSync(new URL("../../docs/schema/orbit.json", import.meta.url), "utf8"));
  const validate = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true }).compile(schema);

  test.each([
    ["an ellipse from two heights", TRANSFER],
    ["a circle", ["--about", "moon", "--periapsis", "2R", "--eccentricity", "0"]],
    ["a parabola", ["--about", "sun", "--periapsis", "1au", "--eccentricity", "1"]],
    ["a hyperbola", ["--about", "sun", "--semi-major-axis=-5au", "--eccentricity", "1.2"]],
    ["a pair of bodies", ["--about", "pluto", "--companion", "106.1", "--period", "6.387d", "--eccentricity", "0"]],
    ["no body", ["--gm", "4e14m3/s2", "--energy=-8km2/s2", "--angular-momentum", "52500"]],
    ["a badly fixed eccentricity", ["--about", "earth", "--semi-major-axis", "7000", "--semi-minor-axis", "7000"]],
  ])("keeps to its JSON Schema for %s", async (_, args) => {
    validate(JSON.parse(await answer(...args, "--format", "json")));
    expect(validate.errors).toBeNull();
  });

  // A transfer from 250 km to the geostationary height, as textbooks of astronautics work it (from memory): 10.2 and 1.6 km/s.
  test("tells a transfer orbit between a parking orbit and the geostationary one", async () => {
    const [row] = JSON.parse(await answer(...TRANSFER, "--format", "json")).rows;
    expect(row.periapsisSpeedKmS).toBeCloseTo(10.195, 3);
    expect(row.apoapsisSpeedKmS).toBeCloseTo(1.603, 3);
    expect(row).toMatchObject({ conic: "ellipse", periapsisTerm: "perigee", apoapsisTerm: "apogee" });
    expect(row.periapsisHeightKm).toBe(250);
    expect(row.apoapsisHeightKm).toBe(35786);
  });

  test("gives the numbers of the JSON in the CSV, those of both bodies' shares by their path", async () => {
    const args = ["--about", "earth", "--companion", "moon", "--semi-major-axis", "384748", "--eccentricity", "0.0549"];
    const [row] = JSON.parse(await answer(...args, "--format", "json")).rows;
    const parsed = Papa.parse<Record<string, string>>(await answer(...args, "--format", "csv"), {
      header: true,
      skipEmptyLines: true,
    });
    const [cells = {}] = parsed.data;
    for (const [name, value] of Object.entries(row)) {
      if (typeof value === "number" || typeof value === "string") expect(cells[name]).toBe(String(value));
    }
    expect(cells["shares.larger.periapsisKm"]).toBe(String(row.shares.larger.periapsisKm));
    expect(cells["shares.barycentreInsideLarger"]).toBe("always");
  });

  test("prints a report within 100 columns that says what heights are above and what the speeds mean", async () => {
    const text = await answer(...TRANSFER);
    for (const line of text.split("\n")) expect(line.length).toBeLessThanOrEqual(100);
    expect(text).toMatch(/^Heights are above 6 378\.1366 km \(equatorial radius, IAU/m);
    expect(text).toMatch(/^perigee, distance +6 628\.137 +km$/m);
    expect(text).toContain("geometric mean of the speeds at the apsides");
    expect(text).not.toContain("null");
  });

  test("tells where the barycentre of two bodies lies, and the rarer words for the apsides", async () => {
    const pluto = ["--about", "pluto", "--companion", "106.1", "--semi-major-axis", "19600km", "--eccentricity", "0"];
    expect(await answer(...pluto)).toContain("the barycentre stays outside pluto");
    expect(await answer("--about", "moon", "--periapsis-height", "100km", "--eccentricity", "0.01")).toContain(
      "rarely: pericynthion and apocynthion; periselene and aposelene",
    );
  });

  test("says in an open orbit that there is no far apsis, and prints none", async () => {
    const text = await answer("--about", "sun", "--periapsis", "1au", "--eccentricity", "1");
    expect(text).toContain("it has no far apsis, no period and no mean speed");
    expect(text).not.toMatch(/aphelion|^period/m);
  });

  test.each([
    ["too few measures", ["--about", "earth", "--period", "2h"], /too few: only period is given/],
    ["too many", [...TRANSFER, "--eccentricity", "0.5"], /too many: .* contradict each other/],
    ["the far apsis of an open orbit", ["--about", "sun", "--apoapsis", "2au", "--eccentricity", "1.5"], /open orbit/],
    ["apsides in the wrong order", ["--about", "earth", "--periapsis", "9R", "--apoapsis", "2R"], /must not exceed/],
    ["an unknown body", ["--about", "erth", "--period", "2h"], /"erth"; did you mean "earth"\?/],
    ["an unknown unit", ["--about", "earth", "--period", "2 weeks", "--eccentricity", "0"], /unknown unit, "weeks"/],
    ["a form that it has not", [...TRANSFER, "--format", "ndjson"], /--format ndjson is unknown.*text, json, csv/],
    ["a misspelt option", ["--perigee", "7000"], /no option --perigee/],
  ])("refuses %s in one line with status 2", async (_, args, says) => {
    expect(await refusal(...args)).toMatch(says);
  });
});
