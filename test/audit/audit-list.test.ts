import { beforeAll, describe, expect, test } from "vitest";
import { auditList, type GivenRow } from "../../src/audit/audit-list.ts";
import { type Ephemeris, openSources } from "../../src/ephemeris/open-sources.ts";
import { passages } from "../../src/passages/passages.ts";
import { toRow } from "../../src/passages/to-row.ts";
import { DAY, HOUR, OFFICE, office } from "./made-list.ts";

// The right minutes are those of the U.S. Naval Observatory (from memory); the slips are planted.
let ephemeris: Ephemeris;
beforeAll(async () => {
  ephemeris = await openSources();
});

const audit = (rows: readonly GivenRow[], options = {}) => auditList(ephemeris, rows, options);

/** One row is changed; every other must still agree. */
function single(at: number, change: (row: GivenRow) => GivenRow) {
  const found = audit(office(undefined, (row, i) => (i === at ? change(row) : row)));
  expect(found.rows.filter(({ verdict }, i) => i !== at && verdict !== "agrees")).toEqual([]);
  expect(found.list.cause).toBeNull();
  const row = found.rows[at];
  if (!row) throw new Error("there is no such row");
  return row;
}
const withWhen = (when: string) => (row: GivenRow) => ({ ...row, when });

describe("auditList, one row of a right list", () => {
  test("names another zone, and prints the right time", () => {
    const row = single(5, withWhen("2022-07-04 12:41"));
    expect([row.verdict, row.cause, row.causeDetail]).toEqual(["explained", "zone", "+05:30"]);
    expect(row.sentence).toContain("2022-07-04 07:11");
  });

  test("names morning and afternoon before a zone of twelve hours", () => {
    expect(single(3, withWhen("2021-07-05 10:27")).cause).toBe("half-day");
  });

  test("names a date that is whole days off", () => {
    const row = single(8, withWhen("2024-01-04 00:39"));
    expect([row.cause, row.causeDetail]).toEqual(["whole-days", "1 day late"]);
  });

  test("names day and month that changed places", () => {
    expect(single(7, withWhen("2023-06-07 20:07")).cause).toBe("month-day-swapped");
  });

  test("names the line of the year before", () => {
    const row = single(9, withWhen("2024-07-06 20:07"));
    expect([row.cause, row.causeDetail]).toEqual(["year-copied", "the year before"]);
  });

  test("names the other kind of passage", () => {
    expect(single(4, (row) => ({ ...row, kind: "aphelion" })).cause).toBe("kind-swapped");
  });

  test("names a date of the Julian calendar", () => {
    expect(single(0, withWhen("2019-12-23 07:48")).cause).toBe("julian-calendar");
  });

  test("calls one minute too much a last digit, and what no slip gives wrong", () => {
    expect(single(1, withWhen("2020-07-04 11:36")).verdict).toBe("last-digit");
    const row = single(1, withWhen("2020-07-04 15:01"));
    expect([row.verdict, row.cause]).toEqual(["disagrees", null]);
  });

  test("says which causes remain where a day and the barycentre agree to the minute: the perihelion of 2027", () => {
    const right = audit([{ pair: "earth-sun", kind: "perihelion", when: "2027-01-03" }]).rows[0]?.passage?.utc ?? "";
    const when = new Date(Math.round((Date.parse(right) + DAY) / 60_000) * 60_000).toISOString().slice(0, 16);
    const told = audit([{ pair: "earth-sun", kind: "perihelion", when }]).rows[0];
    const named = [told?.cause, ...(told?.alternatives ?? []).map(({ cause }) => cause)];
    expect(told?.cause).toBeNull();
    expect(named).toContain("whole-days");
    expect(named).toContain("emb-centre");
  });

  test("tells a time that cannot be read, a pair there is not, and a passage far from any, as unmatched with what was expected", () => {
    const { rows } = audit([
      { pair: "earth-sun", kind: "perihelion", when: "soon" },
      { pair: "earht-sun", kind: "perihelion", when: "2026-01-03" },
      { pair: "earth-sun", kind: "perihelion", when: "2026-04-24 08:13" },
    ]);
    expect(rows.map(({ verdict }) => verdict)).toEqual(["unmatched", "unmatched", "unmatched"]);
    expect(rows[1]?.sentence).toContain("earth-sun");
    expect(rows[2]?.sentence).toContain("2026-01-03");
  });
});

describe("auditList, a slip through the whole list", () => {
  test("finds none in a right list, and every row agrees", () => {
    const { list, summary } = audit(office());
    expect([list.cause, summary.agrees, list.rowsJudged]).toEqual([null, 14, 14]);
  });

  test.each([
    ["zone", "+05:45", office((ms) => ms + 5.75 * HOUR)],
    ["zone", "-03:30", office((ms) => ms - 3.5 * HOUR)],
    ["zone", "Europe/Berlin", office((ms, i) => ms + (i % 2 === 0 ? 1 : 2) * HOUR)],
    ["whole-days", "1 day early", office((ms) => ms - DAY)],
    ["julian-calendar", "Julian date", office((ms) => ms - 13 * DAY)],
  ])("names %s (%s)", (cause, detail, rows) => {
    const { list, summary } = audit(rows);
    expect([list.cause, list.causeDetail, summary.explained]).toEqual([cause, detail, 14]);
  });

  test("names kinds that were swapped throughout", () => {
    const rows = office(undefined, (row) => ({ ...row, kind: row.kind === "aphelion" ? "perihelion" : "aphelion" }));
    expect(audit(rows).list.cause).toBe("kind-swapped");
  });

  test("judges single rows against the list's own habit", () => {
    const { list, rows } = audit(office((ms, i) => ms + 5.75 * HOUR + (i === 6 ? DAY : 0)));
    expect(list.cause).toBe("zone");
    expect(rows.map(({ cause }) => cause)).toEqual(OFFICE.map((_, i) => (i === 6 ? "whole-days" : "zone")));
  });

  test("reads the same instants in their own zone as right", () => {
    expect(
      audit(
        office((ms) => ms + 5.75 * HOUR),
        { scale: "Asia/Kathmandu" },
      ).summary.agrees,
    ).toBe(14);
  });

  test("tells missing passages and those told twice", () => {
    const rows = office();
    const found = audit([...rows.slice(0, 4), ...rows.slice(5), rows[0] as GivenRow]);
    expect(found.missing.map(({ utc }) => utc.slice(0, 10))).toEqual(["2022-01-04"]);
    expect(found.duplicates).toEqual([[1, 14]]);
  });
});

describe("auditList, distances", () => {
  // The right distance of the perihelion of 2006, 147 103 622 km: IMCCE (from memory).
  const distance = (text: string) =>
    audit([{ pair: "earth-sun", kind: "perihelion", when: "2006-01-04 15", distance: text }]).rows[0];

  test.each([
    ["147103622 km", "agrees", null],
    ["147 103 600 km", "agrees", null],
    ["0.983326979 au", "undecided", null],
    ["91405953 mi", "agrees", null],
    ["147103623 km", "last-digit", null],
    ["147103624 km", "disagrees", null],
    ["91405953 km", "explained", "distance-unit"],
    ["147130622 km", "explained", "distance-digits"],
    ["147097244 km", "explained", "distance-surface"],
    ["147111111 km", "disagrees", null],
  ])("judges %s: %s %s", (text, verdict, cause) => {
    const row = distance(text);
    expect([row?.distanceVerdict, row?.cause]).toEqual([verdict, cause]);
  });
});

describe("auditList, hours of a year for which UTC is only predicted", () => {
  test("names no clock for a list whose every row is right as it stands", () => {
    const rows = [...passages(ephemeris, "moon-earth", { from: "2200-01-01", to: "2201-01-01" })].map((passage) => {
      const { kind, utc } = toRow(passage, ephemeris);
      const hour = new Date(Math.round(Date.parse(utc) / 3600e3) * 3600e3).toISOString().slice(0, 13);
      return { pair: "moon-earth", kind, when: hour.replace("T", " ") };
    });
    const { list, summary } = auditList(ephemeris, rows);
    expect(summary.agrees).toBe(rows.length);
    expect([list.cause, list.alternatives]).toEqual([null, []]);
  });
});
