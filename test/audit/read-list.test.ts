import { describe, expect, test } from "vitest";
import { isUnreadRow, type ListRow, type UnreadRow } from "../../src/audit/list-row.ts";
import { type ListReading, readList } from "../../src/audit/read-list.ts";

async function rowsOf(text: string, reading?: ListReading, chunk = 1 << 16) {
  const rows: (ListRow | UnreadRow)[] = [];
  const chunks: string[] = [];
  for (let i = 0; i < text.length; i += chunk) chunks.push(text.slice(i, i + chunk));
  let joined = "";
  for await (const block of readList(chunks, reading)) {
    for (const record of block) {
      joined += record.text;
      rows.push(...record.rows);
    }
  }
  expect(joined).toBe(text); // what is read can be written again, to the byte
  return rows;
}

function told(row: ListRow | UnreadRow | undefined): string {
  if (!row) return "none";
  if (isUnreadRow(row)) return `unread ${row.problem}`;
  const km = row.distance ? ` ${Math.round(row.distance.km)}` : "";
  return `${row.line} ${row.pair.name} ${row.kind} ${row.when.wallSeconds / 86400 - 61043} ${row.when.unitSeconds} ${row.scale.name}${km}`;
}

const EARTH = "2 earth-sun periapsis 0.5 60 utc";

describe("readList", () => {
  test.each([
    ["commas", "pair,kind,when\nearth-sun,perihelion,2026-01-03 12:00\n"],
    ["tabs", "Event\tBody\tDate\tTime (UT)\nPerihelion\tEarth\t3 Jan 2026\t12:00\n"],
    [
      "semicolons, a byte order mark and CR LF",
      '\u00ef\u00bb\u00bfKind;When;Pair\r\nperiapsis;"2026-01-03 12:00";earth-sun\r\n',
    ],
    ["CR alone", "pair,kind,when\rearth-sun,perihelion,2026-01-03 12:00\r"],
    [
      "loose columns",
      "Date             Event       Body\n2026-01-03 12:00 perihelion  Earth\n".replace("12:00 peri", "12:00  peri"),
    ],
  ])("reads %s", async (_, text) => {
    expect((await rowsOf(text)).map(told)).toEqual([EARTH]);
    expect((await rowsOf(text, {}, 7)).map(told)).toEqual([EARTH]);
  });

  test("reads JSON, an object a line, and answers that hold their rows in an array", async () => {
    const row = '{"pair": "earth-sun", "kind": "periapsis", "when": "2026-01-03 12:00", "distance": 147099894}';
    const expected = "earth-sun periapsis 0.5 60 utc 147099894";
    expect((await rowsOf(`[${row},\n${row}]`)).map(told)).toEqual([`1 ${expected}`, `2 ${expected}`]);
    expect((await rowsOf(`${row}\n${row}\n`)).map(told)).toEqual([`1 ${expected}`, `2 ${expected}`]);
    expect(
      (await rowsOf(`{"schema": "x", "made": {"a": {}},\n"rows": [\n${row}\n], "list": {"x": {}}}\n`)).map(told),
    ).toEqual([`3 ${expected}`]);
  });

  test("reads wide lists, one line a year with both passages side by side", async () => {
    const rows = await rowsOf("Year;Perihelion;Aphelion\n2026;Jan 3 12:00;July 6 12:00\n");
    expect(rows.map(told)).toEqual([EARTH, "2 earth-sun apoapsis 184.5 60 utc"]);
  });

  test("takes the zone from a column, the heading, the text or the option, in that order of nearness", async () => {
    const rows = await rowsOf(
      "pair,kind,when,zone\nearth-sun,perihelion,2026-01-03 12:00+02:00,UTC\nearth-sun,perihelion,2026-01-03 12:00,Asia/Kolkata\nearth-sun,perihelion,2026-01-03 12:00,\n",
      { scale: "tt" },
    );
    expect(rows.map((row) => (isUnreadRow(row) ? "" : row.scale.name))).toEqual(["+02:00", "Asia/Kolkata", "tt"]);
  });

  test("tells each row that it cannot read with its line, and goes on", async () => {
    const rows = await rowsOf(
      "pair,kind,when,km\n\n# a comment\nearth,perihelion,=1+1,1\nearht,perihelion,2026-01-03,1\nearth,sideways,2026-01-03,1\nearth,perihelion,2026-01-03,far\nearth,perihelion,2026-01-03,147 099 894\n",
    );
    expect(rows.map((row) => (isUnreadRow(row) ? `unread ${row.line}` : told(row)))).toEqual([
      "unread 4",
      "unread 5",
      "unread 6",
      "unread 7",
      "8 earth-sun periapsis 0.5 86400 utc 147099894",
    ]);
  });

  test("refuses what is no list in one clear line", async () => {
    await expect(rowsOf("a\0b")).rejects.toThrow(/zero bytes/);
    await expect(rowsOf(`pair,kind,when\n${"x".repeat(3 << 20)}`)).rejects.toThrow(/longer than/);
    await expect(rowsOf("1,2,3\n4,5,6\n")).rejects.toThrow(/name the columns/);
  });
});
