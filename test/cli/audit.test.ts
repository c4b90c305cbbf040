import { mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Ajv2020 } from "ajv/dist/2020.js";
import addFormats from "ajv-formats";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { OFFICE } from "../audit/made-list.ts";
import { apsidary } from "./command.ts";

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-audit-"));
});
afterAll(() => rmSync(folder, { recursive: true }));

function write(name: string, text: string | Uint8Array): string {
  writeFileSync(join(folder, name), text);
  return name;
}
const read = (name: string) => readFileSync(join(folder, name));
const run = (...args: string[]) => apsidary(["audit", ...args], folder);

// Right minutes: U.S. Naval Observatory, Earth's Seasons (from memory).
const HEAD = "pair,kind,when,note\r\n";
const line = ([kind, when]: readonly [string, string]) => `earth-sun,${kind},${when},"a, ""b"""\r\n`;
const RIGHT = HEAD + OFFICE.map(line).join("");
const WRONG = RIGHT.replace("2022-07-04 07:11", "2022-07-04 12:41");

describe("apsidary audit", () => {
  test("ends with 0 where every row agrees and with 1 where one does not", async () => {
    expect((await run(write("right.csv", RIGHT))).status).toBe(0);
    const { status, stdout, stderr } = await run(write("wrong.csv", WRONG));
    expect([status, stderr]).toEqual([1, ""]);
    expect(stdout).toContain("+05:30");
    expect(stdout).toContain("print 2022-07-04 07:11");
  });

  test("keeps to its JSON Schema, with unreadable rows, distances and missing passages", async () => {
    const ajv = new Ajv2020({ allErrors: true, strict: true, allowUnionTypes: true });
    addFormats.default(ajv);
    const validate = ajv.compile(
      JSON.parse(readFileSync(new URL("../../docs/schema/audit.json", import.meta.url), "utf8")),
    );
    const more =
      "pair,kind,when,km\nearth,perihelion,2006-01-04 15,147130622\nearth,perihelion,=1+1,\nearth,perihelion,2007-01-03 19:44,\nearth,perihelion,2009-01-04,\nmoon,perigee,2026-04-01,\n";
    for (const text of [RIGHT, WRONG, more]) {
      const { stdout } = await run(write("list.csv", text), "--format", "json");
      validate(JSON.parse(stdout));
      expect(validate.errors).toBeNull();
    }
  });

  test("writes the list again with the wrong cell alone changed, to the byte", async () => {
    const odd = `\u00ef\u00bb\u00bf# caf\u00e9 \u00ff\r\n\r\n${WRONG}trailing,,,`;
    const bytes = Buffer.from(odd, "latin1");
    await run(write("odd.csv", bytes), "--corrected", "mended.csv");
    expect(read("mended.csv").toString("latin1")).toBe(odd.replace("2022-07-04 12:41", "2022-07-04 07:11"));
    expect((await run(write("right2.csv", RIGHT), "--corrected", "same.csv")).status).toBe(0);
    expect(read("same.csv").equals(read("right2.csv"))).toBe(true);
  });

  test("writes a page that holds the verdict, a chart and the rows to mend, and nothing from elsewhere", async () => {
    await run(write("page.csv", WRONG), "--format", "html", "--out", "page.html");
    const page = read("page.html").toString("utf8");
    expect(page).toContain("<svg");
    expect(page).toContain("print 2022-07-04 07:11");
    expect(page.replaceAll("http://www.w3.org/2000/svg", "")).not.toMatch(/https?:|<script|<link/);
  });

  test.each([
    ["an empty file", "", /empty/],
    ["a heading alone", HEAD, /no rows/],
    ["bytes that are no text", "a\0b", /zero bytes/],
    ["one long line", "x".repeat(3 << 20), /longer than/],
    ["no list", "1,2,3\n4,5,6\n", /name the columns/],
    ["rows that none can be read", "pair,kind,when\nearth,perihelion,soon\n", /line 2/],
  ])("ends with 2, one clear line and no answer for %s", async (_, text, message) => {
    const { status, stdout, stderr } = await run(write("bad", text), "--out", "never.txt");
    expect([status, stdout]).toEqual([2, ""]);
    expect(stderr).toMatch(message);
    expect(stderr.trim().split("\n").length).toBeLessThanOrEqual(3);
    expect(() => read("never.txt")).toThrow();
  });

  test("ends with 2 for a directory, for a file there is not, and for options that cannot be", async () => {
    for (const args of [
      ["."],
      ["none.csv"],
      ["right.csv", "--zone", "Nowhere/Land"],
      ["right.csv", "--precision", "week"],
    ]) {
      const { status, stderr } = await run(...args);
      expect(status).toBe(2);
      expect(stderr.length).toBeGreaterThan(20);
    }
  });

  // 1975 and 2044 have rows known to the hour alone, 1700 and 2200 to the day and the month as well; Chatham's hours are no whole hours of UTC
  test.each([
    ["2027", "Pacific/Auckland", ["text", "json", "ics", "html"]],
    ["1975", "Pacific/Chatham", ["csv", "ics"]],
    ["2044", "Asia/Kathmandu", ["text", "ics"]],
    ["1700", "America/St_Johns", ["html", "ics"]],
    ["2200", "Pacific/Chatham", ["csv", "ics"]],
  ] as const)(
    "agrees wholly with the calendar of %s that this program prints in %s as %j",
    async (year, zone, formats) => {
      for (const format of formats) {
        await apsidary(["calendar", year, "--zone", zone, "--format", format, "--out", "calendar"], folder);
        const { status, stdout } = await run("calendar", "--zone", zone, "--format", "json");
        const { list, rows, summary, missing, duplicates } = JSON.parse(stdout);
        expect([format, status, list.cause, summary.agrees, missing, duplicates]).toEqual([
          format,
          0,
          null,
          rows.length,
          [],
          [],
        ]);
      }
    },
  );
});
