import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { makeKernel } from "../ephemeris/make-kernel.ts";
import { fourSegments } from "../ephemeris/paths.ts";
import { apsidary } from "./command.ts";

const BUILT_IN = fileURLToPath(new URL("../../src/data/de405.bsp", import.meta.url));

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), "apsidary-bad-"));
  const file = (name: string, bytes: Uint8Array | string) => writeFileSync(join(folder, name), bytes);
  mkdirSync(join(folder, "folder"));
  const whole = readFileSync(BUILT_IN);
  file(
    "noise.bsp",
    Uint8Array.from({ length: 5000 }, (_, i) => (i * i * 31 + i * 7) % 251),
  );
  file("cut.bsp", whole.subarray(0, 100_000));
  file("text.bsp", Buffer.from(whole.subarray(0, 50_000).toString("latin1").replaceAll("\n", "\r\n"), "latin1"));
  file("empty.bsp", "");
  file("attitude.bsp", makeKernel(fourSegments(), { idWord: "DAF/CK  " }));
  file("type13.bsp", makeKernel(fourSegments(13)));
  file("overflow.bsp", withRecordCount(2 ** 53));
  file("list.txt", "not a list\n");
});
afterAll(() => rmSync(folder, { recursive: true }));

/** A kernel whose only segment claims so many records. */
function withRecordCount(records: number): Uint8Array {
  const bytes = makeKernel(fourSegments().slice(0, 1));
  const view = new DataView(bytes.buffer);
  const summary = (view.getInt32(76, true) - 1) * 1024;
  const lastWord = view.getInt32(summary + 24 + 16 + 20, true);
  view.setFloat64((lastWord - 1) * 8, records, true);
  return bytes;
}

const YEAR = ["--from", "2026", "--to", "2027"];
const MOON = ["passages", "moon-earth", ...YEAR];

const CASES: readonly (readonly [what: string, args: readonly string[], says: RegExp])[] = [
  ["nothing at all", [], /say what to do: passages, range, /],
  ["an unknown command", ["passage", "moon-earth"], /no command passage; did you mean passages\?/],
  ["help for an unknown command", ["help", "passage"], /no command passage; did you mean passages\?/],
  ["an unknown option", ["passages", "moon-earth", "--fro", "2026"], /no option --fro here; did you mean --from\?/],
  ["an option without its value", ["passages", "moon-earth", "--from"], /--from <when> needs its value/],
  ["a missing argument", ["passages"], /<pairs> is missing/],
  ["too many arguments", ["calendar", "2027", "2028"], /more arguments than this command takes/],

  ["a misspelt pair", ["passages", "moon-eart", ...YEAR], /"moon-eart"; did you mean "moon-earth"\?/],
  ["an empty pair", ["passages", "moon-earth,", ...YEAR], /pair's name is empty/],
  ["two pairs for range", ["range", "moon-earth,earth-sun", ...YEAR, "--step", "1d"], /one pair at a time/],

  ["no beginning", ["passages", "moon-earth", "--to", "2027"], /--from is missing/],
  ["no end", ["passages", "moon-earth", "--from", "2026"], /--to is missing.*--next/],
  ["reversed dates", ["passages", "moon-earth", "--from", "2027", "--to", "2026"], /--from 2027 comes after --to 2026/],
  ["equal dates", ["passages", "moon-earth", "--from", "2027", "--to", "2027-01-01"], /same moment as --to 2027-01-01/],
  [
    "a day that does not exist",
    ["passages", "moon-earth", "--from", "2026-02-30", "--to", "2027"],
    /--from: "2026-02-30"/,
  ],
  ["a date in words", ["passages", "moon-earth", "--from", "soon", "--to", "2027"], /--from: "soon".*ISO 8601/],
  ["a bad end", ["range", "moon-earth", "--from", "2026", "--to", "2026-13", "--step", "1d"], /--to: "2026-13"/],
  [
    "a year beyond reckoning",
    ["passages", "moon-earth", "--from", "12026", "--to", "12027"],
    /--from: "12026" lies outside/,
  ],
  [
    "no passage to count",
    ["passages", "moon-earth", "--from", "2026", "--next", "0"],
    /--next 0 is not a number of passages/,
  ],
  [
    "a count that is no number",
    ["passages", "moon-earth", "--from", "2026", "--next", "few"],
    /--next few is not a number/,
  ],
  ["an end and a count", ["passages", "moon-earth", ...YEAR, "--next", "2"], /--next and --to exclude each other/],
  ["no step", ["range", "moon-earth", ...YEAR], /--step is missing/],
  ["a step without unit", ["range", "moon-earth", ...YEAR, "--step", "6"], /--step 6 is no step of time/],
  ["a step of nothing", ["range", "moon-earth", ...YEAR, "--step", "0h"], /--step 0h is no step of time/],
  ["a year that is none", ["calendar", "27"], /27 is not a year/],

  ["an unknown format", [...MOON, "--format", "jsn"], /--format jsn is unknown; did you mean json\?/],
  ["an unknown kind", [...MOON, "--kind", "perigee"], /--kind perigee is unknown.*periapsis, apoapsis, both/],
  ["an unknown rank", [...MOON, "--rank", "first"], /--rank first is unknown.*principal, all/],
  [
    "an unknown zone",
    ["calendar", "2027", "--zone", "Pacific/Aukland"],
    /"Pacific\/Aukland"; did you mean "Pacific\/Auckland"/,
  ],
  ["an unknown source", [...MOON, "--source", "kernal"], /--source kernal is unknown; did you mean kernel\?/],
  [
    "a span outside the source that was named",
    ["passages", "moon-earth", "--from", "1900", "--to", "1970", "--source", "kernel"],
    /not wholly covered.*1959-12-10.*2060-01-30/,
  ],
  [
    "a pair that the named source lacks",
    ["passages", "io-jupiter", ...YEAR, "--source", "kernel"],
    /does not supply io-jupiter/,
  ],
  ["a span outside all sources", ["passages", "moon-earth", "--from", "9000", "--to", "9001"], /not wholly covered/],

  ["a kernel that is not there", [...MOON, "--kernel", "none.bsp"], /no file "none\.bsp"/],
  ["a directory for a kernel", [...MOON, "--kernel", "folder"], /"folder" is a directory/],
  ["random bytes for a kernel", [...MOON, "--kernel", "noise.bsp"], /noise\.bsp is not a DAF/],
  ["an empty kernel", [...MOON, "--kernel", "empty.bsp"], /empty\.bsp is not a DAF/],
  ["a truncated kernel", [...MOON, "--kernel", "cut.bsp"], /cut\.bsp, segment 1 .* is cut short/],
  [
    "a kernel from a text-mode transfer",
    [...MOON, "--kernel", "text.bsp"],
    /text\.bsp was changed by a text-mode transfer/,
  ],
  ["a DAF that is not SPK", [...MOON, "--kernel", "attitude.bsp"], /attitude\.bsp.*DAF\/CK/],
  ["a segment of another type", [...MOON, "--kernel", "type13.bsp"], /type13\.bsp, segment 1 .*type 13/],
  ["a record count that overflows", [...MOON, "--kernel", "overflow.bsp"], /overflow\.bsp, segment 1 .*do not fit/],
  ["a bad kernel for sources", ["sources", "--kernel", "noise.bsp"], /noise\.bsp is not a DAF/],
  ["a leap-second list that is none", [...MOON, "--leap-seconds", "list.txt"], /list\.txt: .*not a leap-second list/],
  ["a leap-second list that is not there", [...MOON, "--leap-seconds", "none.txt"], /no file "none\.txt"/],

  ["a directory to write to", [...MOON, "--out", "folder"], /--out folder is a directory/],
  ["a directory to write to that is not there", [...MOON, "--out", "none/"], /--out none\/ names a directory/],
  ["a file in a folder that is not there", [...MOON, "--out", "none/moon.txt"], /no folder none/],
  ["a file under a file", [...MOON, "--out", "list.txt/moon.txt"], /--out list\.txt\/moon\.txt cannot be written/],
  ["a device to write to", [...MOON, "--out", "/dev/null"], /not a plain file/],
  ["no name to write to", [...MOON, "--out", ""], /names no file/],
];

describe("bad input ends with status 2, one to three clear lines, no stack, an empty answer and nothing written", () => {
  test.each(CASES)("%s", async (_, args, says) => {
    const before = listing();
    const { status, stdout, stderr } = await apsidary(args, folder);
    expect(stderr).toMatch(says);
    expect(stderr).toMatch(/^apsidary: /);
    expect(stderr).not.toMatch(/\n\s+at |Error:|node:internal/);
    expect(stderr.trimEnd().split("\n").length).toBeLessThanOrEqual(3);
    expect(stderr.length).toBeLessThan(320); // four lines of a terminal at the very most
    expect(stdout).toBe("");
    expect(status).toBe(2);
    expect(listing()).toEqual(before);
  });
});

/** Names and contents' lengths of all that stands in the folder. */
function listing(): string[] {
  return readdirSync(folder, { recursive: true, encoding: "utf8" }).sort();
}
