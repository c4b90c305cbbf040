import { readFileSync, writeFileSync } from "node:fs";
import { DateTime } from "luxon";
import { auditList, type GivenRow } from "../src/audit/audit-list.ts";
import type { CauseName } from "../src/audit/cause.ts";
import { CIVIL_OFFSETS, offsetText, SUMMER_ZONES } from "../src/audit/causes/civil-offsets.ts";
import { openSources } from "../src/ephemeris/open-sources.ts";
import { passages } from "../src/passages/passages.ts";
import { type TruePassage, truePassages } from "../test/de405/true-passages.ts";

// Trials of the audit with slips that are planted, from a fixed seed: `npx tsx bench/audit-trials.ts [--write]`.
// The truth is JPL's DE405 as read and searched by test/de405, which shares no code with the product; TT - UTC comes from a table of
// leap seconds of this file's own (IERS Bulletin C, from memory), and zones from luxon.

/** Mulberry32, a generator of 32 bits by T. Ettinger (public domain): the same seed gives the same lists. */
function randomFrom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
const random = randomFrom(20_260_103);
const pick = <T>(list: readonly T[]): T => list[Math.floor(random() * list.length)] as T;

type Kind = "periapsis" | "apoapsis";
type Precision = "minute" | "hour" | "day";
type Rule = "nearest" | "cut";
interface Made {
  readonly pair: string;
  readonly kind: Kind;
  readonly tdb: number;
  readonly km: number;
}

const LEAPS: readonly (readonly [string, number])[] = [
  ["1972-01-01", 10], ["1972-07-01", 11], ["1973-01-01", 12], ["1974-01-01", 13], ["1975-01-01", 14], ["1976-01-01", 15],
  ["1977-01-01", 16], ["1978-01-01", 17], ["1979-01-01", 18], ["1980-01-01", 19], ["1981-07-01", 20], ["1982-07-01", 21],
  ["1983-07-01", 22], ["1985-07-01", 23], ["1988-01-01", 24], ["1990-01-01", 25], ["1991-01-01", 26], ["1992-07-01", 27],
  ["1993-07-01", 28], ["1994-07-01", 29], ["1996-01-01", 30], ["1997-07-01", 31], ["1999-01-01", 32], ["2006-01-01", 33],
  ["2009-01-01", 34], ["2012-07-01", 35], ["2015-07-01", 36], ["2017-01-01", 37],
]; // biome-ignore format: pairs
const J2000_MS = Date.UTC(2000, 0, 1, 12);
const DAY_MS = 86_400_000;

/** Unix milliseconds of an instant; the last offset is held. */
function unixOf(tdb: number): number {
  const tt = J2000_MS + tdb * 1000;
  let offset = 10;
  for (const [day, seconds] of LEAPS) if (tt - 32_184 - seconds * 1000 >= Date.parse(`${day}T00:00Z`)) offset = seconds;
  return tt - 32_184 - offset * 1000;
}

/** The clock of a zone (or TT) as milliseconds since its own 1970-01-01. */
function clockOf(tdb: number, zone: string): number {
  if (zone === "TT") return J2000_MS + tdb * 1000;
  const unix = unixOf(tdb);
  return unix + DateTime.fromMillis(unix, { zone }).offset * 60_000;
}

function printed(clock: number, precision: Precision, rule: Rule): string {
  const step = precision === "minute" ? 60_000 : precision === "hour" ? 3_600_000 : DAY_MS;
  // a day is by either rule the one that an editor may print: that which holds the moment, or that of the nearest midnight
  const at = Math.floor(clock / step + (rule === "cut" ? 0 : 0.5)) * step;
  const text = new Date(at).toISOString();
  return precision === "day"
    ? text.slice(0, 10)
    : precision === "hour"
      ? text.slice(0, 13).replace("T", " ")
      : text.slice(0, 16).replace("T", " ");
}
/** The usual way: days hold the moment, minutes and hours are rounded. */
const usual = (clock: number, precision: Precision): string =>
  printed(clock, precision, precision === "day" ? "cut" : "nearest");

const made = (pair: string): Made[] =>
  truePassages(pair)
    .filter(({ tdb }) => tdb > -28 * 365.25 * 86_400 && tdb < 26 * 365.25 * 86_400)
    .map((p: TruePassage) => ({ pair, kind: p.kind, tdb: p.tdb, km: p.distanceKm }));
const PAIRS = ["earth-sun", "moon-earth", "mars-sun", "mercury-sun", "venus-sun"] as const;
const truth = new Map<string, Made[]>([...PAIRS, "emb-sun", "earth-ssb"].map((pair) => [pair, made(pair)]));
const of = (pair: string): Made[] => truth.get(pair) ?? [];
const nearest = (pair: string, kind: Kind, tdb: number): Made =>
  of(pair)
    .filter((p) => p.kind === kind)
    .reduce((a, b) => (Math.abs(b.tdb - tdb) < Math.abs(a.tdb - tdb) ? b : a));

/** Rows in a row: a stretch of a pair's passages. */
function stretch(pair: string, size: number): Made[] {
  const all = of(pair);
  const from = 4 + Math.floor(random() * Math.max(1, all.length - size - 8));
  return all.slice(from, from + size);
}

const ephemeris = await openSources();
const coarse = new Map<string, { kind: Kind; tdb: number; km: number }[]>();
for (const pair of ["earth-sun", "moon-earth", "mars-sun", "venus-sun", "mercury-sun"] as const) {
  const list = [];
  for (const p of passages(ephemeris, pair, { from: "1973", to: "2027", source: "engine" }))
    list.push({ kind: p.kind, tdb: p.tdbSeconds, km: p.distanceKm });
  coarse.set(pair, list);
}
const coarseOf = (p: Made) =>
  (coarse.get(p.pair) ?? [])
    .filter((c) => c.kind === p.kind)
    .reduce((a, b) => (Math.abs(b.tdb - p.tdb) < Math.abs(a.tdb - p.tdb) ? b : a));

interface Slip {
  readonly cause: CauseName;
  readonly detail?: string;
  /** Gives the wrong clock of a passage; `null` where the slip cannot happen or changes nothing. */
  readonly clock: (p: Made, zone: string) => number | null;
  readonly kindWord?: (kind: Kind) => Kind;
}

function fields(clock: number) {
  const d = new Date(clock);
  return { y: d.getUTCFullYear(), m: d.getUTCMonth(), d: d.getUTCDate(), ms: ((clock % DAY_MS) + DAY_MS) % DAY_MS };
}

const SLIPS: Record<string, (pair: string) => Slip | null> = {
  zone: () => {
    const minutes = pick(CIVIL_OFFSETS);
    return { cause: "zone", detail: offsetText(minutes), clock: (p) => clockOf(p.tdb, "UTC") + minutes * 60_000 };
  },
  "summer zone": () => {
    const zone = pick(SUMMER_ZONES);
    return { cause: "zone", clock: (p) => clockOf(p.tdb, zone) };
  },
  "scale-tt": () => ({ cause: "scale-tt", clock: (p) => clockOf(p.tdb, "TT") }),
  "whole-days": () => {
    const days = pick([-3, -2, -1, -1, 1, 1, 2, 3]);
    return { cause: "whole-days", clock: (p, zone) => clockOf(p.tdb, zone) + days * DAY_MS };
  },
  "half-day": () => ({
    cause: "half-day",
    clock: (p, zone) => {
      const clock = clockOf(p.tdb, zone);
      return clock + (fields(clock).ms < DAY_MS / 2 ? DAY_MS / 2 : -DAY_MS / 2);
    },
  }),
  "emb-centre": (pair) =>
    pair !== "earth-sun"
      ? null
      : { cause: "emb-centre", clock: (p, zone) => clockOf(nearest("emb-sun", p.kind, p.tdb).tdb, zone) },
  "ssb-centre": (pair) =>
    pair !== "earth-sun"
      ? null
      : { cause: "ssb-centre", clock: (p, zone) => clockOf(nearest("earth-ssb", p.kind, p.tdb).tdb, zone) },
  "kind-swapped": () => ({
    cause: "kind-swapped",
    clock: (p, zone) => clockOf(p.tdb, zone),
    kindWord: (kind) => (kind === "periapsis" ? "apoapsis" : "periapsis"),
  }),
  "year-copied": (pair) =>
    pair === "mars-sun" || pair === "venus-sun"
      ? null
      : {
          cause: "year-copied",
          clock: (p, zone) => {
            const { y } = fields(clockOf(p.tdb, zone));
            const other = clockOf(nearest(p.pair, p.kind, p.tdb - 365.25 * 86_400).tdb, zone);
            const f = fields(other);
            if (f.y !== y - 1) return null;
            return Date.UTC(y, f.m, f.d) + f.ms;
          },
        },
  "month-day-swapped": () => ({
    cause: "month-day-swapped",
    clock: (p, zone) => {
      const f = fields(clockOf(p.tdb, zone));
      if (f.d > 12 || f.d === f.m + 1) return null;
      return Date.UTC(f.y, f.d - 1, f.m + 1) + f.ms;
    },
  }),
  "julian-calendar": () => ({ cause: "julian-calendar", clock: (p, zone) => clockOf(p.tdb, zone) - 13 * DAY_MS }),
  "light-time": (pair) =>
    pair === "moon-earth"
      ? null
      : { cause: "light-time", clock: (p, zone) => clockOf(p.tdb + p.km / 299_792.458, zone) },
  "coarse-model": () => ({ cause: "coarse-model", clock: (p, zone) => clockOf(coarseOf(p).tdb, zone) }),
};

interface Tally {
  lists: number;
  named: number;
  other: number;
  silent: number;
  alternative: number;
  invisible: number;
  accused: number;
}
const empty = (): Tally => ({ lists: 0, named: 0, other: 0, silent: 0, alternative: 0, invisible: 0, accused: 0 });
const percent = (part: number, of: number) =>
  of === 0 ? "–" : `${((100 * part) / of).toFixed(part === of || part === 0 ? 0 : 1)} %`;
const DISTRACTED: string[] = [];

/** Lists in which one slip runs through all rows. */
function wholeLists(precision: Precision, sizes: readonly number[], each: number): string[] {
  const lines: string[] = [];
  for (const [name, make] of Object.entries(SLIPS)) {
    for (const size of sizes) {
      const tally = empty();
      for (let i = 0; i < each; i++) {
        const pair = ["emb-centre", "ssb-centre"].includes(name)
          ? "earth-sun"
          : pick(
              name === "coarse-model"
                ? ["earth-sun", "moon-earth", "mars-sun"]
                : name === "year-copied"
                  ? ["earth-sun", "moon-earth"]
                  : name === "light-time"
                    ? ["earth-sun", "mars-sun"]
                    : ["earth-sun", "moon-earth"],
            );
        const slip = make(pair);
        if (!slip) continue;
        const rows: GivenRow[] = [];
        let changed = 0;
        for (const p of stretch(pair, size)) {
          const clock = slip.clock(p, "UTC");
          const when = usual(clock ?? clockOf(p.tdb, "UTC"), precision);
          if (when !== usual(clockOf(p.tdb, "UTC"), precision) || slip.kindWord) changed++;
          rows.push({ pair, kind: slip.kindWord ? slip.kindWord(p.kind) : p.kind, when });
        }
        tally.lists++;
        const { list } = auditList(ephemeris, rows);
        if (changed === 0) tally.invisible++;
        else if (list.cause === slip.cause) tally.named++;
        else if (list.cause === null || list.cause.startsWith("rounded")) {
          if (list.alternatives.some(({ cause }) => cause === slip.cause)) tally.alternative++;
          else tally.silent++;
        } else {
          tally.other++;
          DISTRACTED.push(
            `whole ${name} ${precision} ${size} ${pair}: ${list.cause} ${list.causeDetail} ${JSON.stringify(rows.slice(0, 3))}`,
          );
        }
      }
      lines.push(
        `| ${name} | ${precision} | ${size} | ${tally.lists} | ${percent(tally.named, tally.lists - tally.invisible)} | ${tally.other} | ${tally.alternative} | ${tally.silent} | ${tally.invisible} |`,
      );
    }
  }
  return lines;
}

/** Lists that are right but for one row. */
function singleSlips(precision: Precision, sizes: readonly number[], each: number): string[] {
  const lines: string[] = [];
  for (const [name, make] of Object.entries(SLIPS)) {
    if (name === "summer zone" || name === "scale-tt") continue;
    for (const size of sizes) {
      const tally = empty();
      for (let i = 0; i < each; i++) {
        const pair = ["emb-centre", "ssb-centre", "coarse-model"].includes(name)
          ? "earth-sun"
          : pick(["earth-sun", "moon-earth"]);
        const slip = make(pair) ?? make("earth-sun");
        if (!slip) continue;
        const rule = pick<Rule>(["nearest", "cut"]);
        const rightText = (clock: number) =>
          precision === "day" ? usual(clock, precision) : printed(clock, precision, rule);
        const list = stretch(slip.cause === "light-time" ? "earth-sun" : pair, size);
        let at = -1;
        let wrong: number | null = null;
        for (let tries = 0; tries < 60 && wrong === null; tries++) {
          at = Math.floor(random() * size);
          const p = list[at];
          if (p) wrong = slip.clock(p, "UTC");
        }
        if (wrong === null) continue;
        const rows = list.map((p, k): GivenRow => {
          const clock = k === at ? (wrong ?? 0) : clockOf(p.tdb, "UTC");
          return {
            pair: p.pair,
            kind: k === at && slip.kindWord ? slip.kindWord(p.kind) : p.kind,
            when: rightText(clock),
          };
        });
        const p = list[at] as Made;
        tally.lists++;
        const audit = auditList(ephemeris, rows);
        const found = audit.rows[at];
        audit.rows.forEach((row, k) => {
          if (k !== at && row.verdict !== "agrees" && row.verdict !== "undecided") {
            tally.accused++;
            DISTRACTED.push(
              `ACCUSED ${name} ${precision} ${size}: ${JSON.stringify(row.published)} ${row.verdict} ${row.sentence} | planted ${JSON.stringify(rows[at])} list ${audit.list.sentence}`,
            );
          }
        });
        if (rightText(clockOf(p.tdb, "UTC")) === rightText(wrong) && !slip.kindWord) tally.invisible++;
        else if (found?.cause === slip.cause) tally.named++;
        else if (found?.verdict === "last-digit" || found?.verdict === "agrees") tally.silent++;
        else if (found?.cause) {
          tally.other++;
          DISTRACTED.push(
            `single ${name} ${precision} ${size}: ${found.cause} ${found.causeDetail} ${JSON.stringify(rows[at])} diff ${found.differenceSeconds}`,
          );
        } else if (found?.alternatives.some(({ cause }) => cause === slip.cause)) tally.alternative++;
        else {
          tally.silent++;
          DISTRACTED.push(
            `silent ${name} ${precision} ${size}: ${found?.verdict} ${JSON.stringify(rows[at])} diff ${found?.differenceSeconds} ${found?.sentence}`,
          );
        }
      }
      lines.push(
        `| ${name} | ${precision} | ${size} | ${tally.lists} | ${percent(tally.named, tally.lists - tally.invisible)} | ${tally.other} | ${tally.alternative} | ${tally.silent} | ${tally.invisible} | ${tally.accused} |`,
      );
    }
  }
  return lines;
}

/** Right rows by both rules, at three precisions, in five zones. */
function rightRows(): { lines: string[]; rows: number; accused: number } {
  const zones = ["UTC", "America/New_York", "Asia/Kolkata", "Pacific/Auckland", "Pacific/Marquesas"];
  const lines: string[] = [];
  let rows = 0;
  let accused = 0;
  for (const precision of ["minute", "hour", "day"] as const) {
    for (const rule of ["nearest", "cut"] as const) {
      let here = 0;
      let wrong = 0;
      let findings = 0;
      let lists = 0;
      for (const zone of zones) {
        for (const size of [1, 1, 1, 1, 1, 2, 2, 3, 5, 5, 5, 10, 26, 26, 26, 100, 100, 26]) {
          const list = stretch(pick(PAIRS), size);
          const given = list.map(
            (p): GivenRow => ({
              pair: p.pair,
              kind: p.kind,
              when: printed(clockOf(p.tdb, zone), precision, rule),
              zone,
            }),
          );
          const audit = auditList(ephemeris, given);
          lists++;
          if (audit.list.cause !== null && audit.list.cause !== "rounded-down") {
            findings++;
            DISTRACTED.push(`right list ${precision} ${rule} ${zone} ${size}: ${audit.list.sentence}`);
          }
          for (const row of audit.rows) {
            here++;
            if (row.verdict === "agrees" || row.verdict === "undecided") continue;
            wrong++;
            DISTRACTED.push(
              `RIGHT ${precision} ${rule} ${zone} ${size}: ${JSON.stringify(row.published)} ${row.verdict} ${row.differenceSeconds} ${row.sentence}`,
            );
          }
        }
      }
      rows += here;
      accused += wrong;
      lines.push(
        `| ${precision} | ${rule === "nearest" ? "rounded" : "cut off"} | ${lists} | ${here} | ${wrong} | ${findings} |`,
      );
    }
  }
  return { lines, rows, accused };
}

const quick = process.argv.includes("--quick");
const started = performance.now();
const right = [rightRows(), ...(quick ? [] : [rightRows()])];
const whole = [
  ...wholeLists("minute", quick ? [5, 10] : [5, 10, 26], quick ? 8 : 14),
  ...(quick ? [] : wholeLists("minute", [100], 4)),
  ...(quick ? [] : wholeLists("hour", [26], 6)),
  ...(quick ? [] : wholeLists("day", [26], 4)),
];
const single = [
  ...singleSlips("minute", quick ? [1, 26] : [1, 5, 26], quick ? 12 : 30),
  ...(quick ? [] : singleSlips("minute", [100], 4)),
  ...(quick ? [] : singleSlips("hour", [26], 8)),
  ...(quick ? [] : singleSlips("day", [26], 6)),
];
const text = `<!-- trials -->

Right rows: ${right.reduce((sum, { rows }) => sum + rows, 0)}, of which ${right.reduce((sum, { accused }) => sum + accused, 0)} were accused.

| precision | rule | lists | rows | accused | slips named for the list |
|---|---|---|---|---|---|
${right.flatMap(({ lines }) => lines).join("\n")}

One slip through the whole list:

| slip | precision | rows | lists | named | another named | told among alternatives | not named | invisible |
|---|---|---|---|---|---|---|---|---|
${whole.join("\n")}

One row in a list that is right otherwise:

| slip | precision | rows | lists | named | another named | told among alternatives | not named | invisible | neighbours accused |
|---|---|---|---|---|---|---|---|---|---|
${single.join("\n")}

<!-- /trials -->`;
process.stdout.write(`${text}\n`);
process.stderr.write(
  `${DISTRACTED.slice(0, 400).join("\n")}\n${((performance.now() - started) / 1000).toFixed(0)} s\n`,
);
if (process.argv.includes("--write")) {
  const file = new URL("../docs/audit.md", import.meta.url);
  const page = readFileSync(file, "utf8");
  writeFileSync(
    file,
    page.replace(/<!-- trials -->[\s\S]*<!-- \/trials -->/, () => text),
  );
}
