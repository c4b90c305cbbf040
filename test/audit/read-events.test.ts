import { expect, test } from "vitest";
import { isUnreadRow } from "../../src/audit/list-row.ts";
import { readList } from "../../src/audit/read-list.ts";

async function told(text: string): Promise<string[]> {
  const rows: string[] = [];
  for await (const block of readList([text])) {
    for (const { rows: found } of block) {
      for (const row of found) {
        rows.push(
          isUnreadRow(row)
            ? row.problem
            : `${row.pair.name} ${row.kind} ${row.when.text} ${row.when.unitSeconds} ${row.scale.name}`,
        );
      }
    }
  }
  return rows;
}

const event = (start: string, summary: string) => `BEGIN:VEVENT\r\n${start}\r\nSUMMARY:${summary}\r\nEND:VEVENT\r\n`;

test("a calendar file's events are rows: folded lines, dates alone and zones; events of other kinds are passed over", async () => {
  const text =
    "BEGIN:VCALENDAR\r\nVERSION:2.0\r\n" +
    event("DTSTART:20270103T023300Z", "Perihelion of the\r\n  Earth") +
    event("DTSTART;VALUE=DATE:20270107", "Apogee of the Moon\\, farthest of the year") +
    event("DTSTART;TZID=Pacific/Auckland:20270304T120000", "Mars aphelion") +
    event("DTSTART:20270101T000000Z", "New year") +
    "END:VCALENDAR\r\n";
  expect(await told(text)).toEqual([
    "earth-sun periapsis 2027-01-03T02:33Z 60 utc",
    "moon-earth apoapsis 2027-01-07 86400 utc",
    "mars-sun apoapsis 2027-03-04T12:00 60 Pacific/Auckland",
  ]);
});

test("a page's tables are rows, under the heading that names their body", async () => {
  const text =
    "<!DOCTYPE html>\n<h2>Moon about the Earth</h2>\n<table>\n<tr><th>Local time</th><th>Passage</th></tr>\n" +
    "<tr><td>Thu 2027-01-07 21:08</td><td>Apogee</td></tr>\n</table>\n";
  expect(await told(text)).toEqual(["moon-earth apoapsis Thu 2027-01-07 21:08 60 utc"]);
});
