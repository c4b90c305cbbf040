import { dayOfGregorian, daysInMonth } from "../time/civil-calendar.ts";
import { type AuditScale, auditScale, scaleWord } from "./audit-scale.ts";
import type { PublishedWhen, WhenPart } from "./published-when.ts";

/** What a text may leave out, because a column or the list says it. */
export interface WhenContext {
  /** The year, where the text has none. */
  readonly year?: number | null;
  /** Which number comes first in dates such as 03/04/2026. */
  readonly order?: "day-first" | "month-first";
}

/** Why a text is no time. */
export interface UnreadWhen {
  readonly problem: string;
}

const MONTHS = ["jan", "feb", "mar", "apr", "may", "jun", "jul", "aug", "sep", "oct", "nov", "dec"];
const ISO = /^(\d{4})-(\d\d)-(\d\d)(?:([T ])(\d\d):(\d\d)(?::(\d\d)(?:\.(\d{1,9}))?)?)?(Z|[+-]\d\d:\d\d)?$/;
const MONTH_WORD = "(jan|feb|mar|apr|may|jun|jul|aug|sep|oct|nov|dec)[a-z]*";
const SIGNED_YEAR = "([+-]?\\d{4,6})";
const DAY = "(\\d{1,2})(?:\\.(\\d{1,6}))?";
/** Separators between the parts of a date and before a time; kept as they stand. */
const SEP = "(\\s*[-/.,]?\\s*|\\s+)";

/** Shapes of a date, each with the order of its fields. The fields catch text and, of a day, decimals. */
const DATES: readonly { readonly pattern: RegExp; readonly order: readonly Field[] }[] = [
  {
    pattern: new RegExp(`^${SIGNED_YEAR}([-/.])(\\d{1,2})\\2${DAY}(?:st|nd|rd|th)?`, "i"),
    order: ["y", "s", "m", "d", "f"],
  },
  {
    pattern: new RegExp(`^${SIGNED_YEAR}${SEP}${MONTH_WORD}(\\.?${SEP})${DAY}`, "i"),
    order: ["y", "s", "n", "s", "-", "d", "f"],
  },
  {
    pattern: new RegExp(`^(\\d{1,2})(?:st|nd|rd|th)?${SEP}${MONTH_WORD}(\\.?${SEP})${SIGNED_YEAR}`, "i"),
    order: ["d", "s", "n", "s", "-", "y"],
  },
  {
    pattern: new RegExp(`^${MONTH_WORD}(\\.?\\s*)${DAY}(?:st|nd|rd|th)?(,?\\s+)${SIGNED_YEAR}(?![:.h\\d])`, "i"),
    order: ["n", "s", "d", "f", "s", "y"],
  },
  { pattern: new RegExp(`^${MONTH_WORD}(\\.?[\\s-]*)${DAY}(?:st|nd|rd|th)?`, "i"), order: ["n", "s", "d", "f"] },
  { pattern: new RegExp(`^(\\d{1,2})(?:st|nd|rd|th)?(\\.?[\\s-]*)${MONTH_WORD}\\.?`, "i"), order: ["d", "s", "n"] },
  { pattern: new RegExp(`^(\\d{1,2})([./-])(\\d{1,2})\\2${SIGNED_YEAR}`, "i"), order: ["a", "s", "b", "y"] },
];
type Field = "y" | "m" | "n" | "d" | "f" | "a" | "b" | "s" | "-";

/** `17:16`, `17:16:40.5`, `17:16.3`, `17`, `17h`, `17.3 h`, `17h16m`, `17 h 16 min`, `5:16 pm`. */
const TIME =
  /^(\d{1,2})(?:(:|\s(?=\d\d(?!\d)))(\d\d)(?:(:)(\d\d)(?:[.,](\d{1,9}))?|\.(\d{1,6}))?|\s*(h|hrs?|hours?)\s*(\d{1,2})(?:\.(\d{1,6}))?\s*(?:m|min|')?(?![a-z])|(?:[.,](\d{1,6}))?\s*(h|hrs?|hours?)?\b)\s*([ap])?(\.?m\.?)?/i;

/**
 * Reads a time as people print it.
 *
 * @param given   `2026-01-03 17:16`, `2026-01-03T17:16:40Z`, `3 Jan 2026 17h`, `Jan. 3.72`, `2026-01-03 17.3 h`, `January 3, 2026 5:16 PM +01:00` …
 *   the last digit sets the precision; a scale or offset may follow
 * @param context what the text may leave out
 * @returns the time, or the problem in words: what is wrong and what would be right
 */
export function readWhen(given: string, context: WhenContext = {}): PublishedWhen | UnreadWhen {
  const text = given.trim();
  const iso = ISO.exec(text);
  if (iso) return ofIso(text, iso);
  const weekday = /^(?:mon|tue|wed|thu|fri|sat|sun)[a-z]*[.,]?\s+(?=\d|[a-z])/i.exec(text)?.[0];
  if (weekday !== undefined) {
    // the day of the week would have to change with the date, so the text is not imitated
    const read = readWhen(text.slice(weekday.length), context);
    return isUnread(read) ? read : { ...read, text, style: null };
  }
  if (text.length > 80) return { problem: `"${text.slice(0, 30)}…" is too long for a time` };
  return ofLoose(text, context);
}

/** Tells whether reading failed. */
export function isUnread(when: PublishedWhen | UnreadWhen): when is UnreadWhen {
  return "problem" in when;
}

function ofIso(text: string, m: RegExpExecArray): PublishedWhen | UnreadWhen {
  const [, y = "", mo = "", d = "", sep, h, mi, s, f, zone] = m;
  const parts: WhenPart[] = [field("year", 4), { text: "-" }, field("month", 2), { text: "-" }, field("day", 2)];
  if (h === undefined) {
    if (zone !== undefined) return { problem: `"${text}" has an offset without a time of day` };
    return made(text, Number(y), Number(mo), Number(d), 0, 86_400, "day", null, parts);
  }
  parts.push({ text: sep ?? " " }, field("hour", 2), { text: ":" }, field("minute", 2));
  if (s !== undefined) parts.push({ text: ":" }, field("second", 2, f?.length ?? 0));
  if (zone !== undefined) parts.push({ text: zone });
  const seconds = clock(Number(h), Number(mi), Number(s ?? 0) + (f === undefined ? 0 : Number(`0.${f}`)));
  if (seconds === null) return noSuchTime(text);
  const unit = s === undefined ? 60 : 10 ** -(f?.length ?? 0);
  const scale = zone === undefined ? null : auditScale(zone);
  return made(text, Number(y), Number(mo), Number(d), seconds, unit, null, scale, parts);
}

function ofLoose(text: string, context: WhenContext): PublishedWhen | UnreadWhen {
  let rest = text.replace(/[\u2010-\u2015\u2212]/g, "-").replace(/[\u00a0\u2007\u2009\u202f]/g, " ");
  const plain = rest;
  let scale: AuditScale | null = null;
  // the scale or the offset at the end, in brackets or not
  const tail =
    /(\s*\(?\s*)(?:\b(utc|ut1|ut|gmt|tdt|tdb|tt|td|et|tai|z)|(?:utc|gmt)?\s?([+-]\d{1,2}(?::?\d\d)?))\s*\)?\s*$/i.exec(
      rest,
    );
  let tailText = "";
  if (tail && !(tail[3] !== undefined && !/[:h]\s*\d|\d\s*h|[ap]\.?m/i.test(rest.slice(0, tail.index)))) {
    scale = tail[2] !== undefined ? scaleWord(tail[2]) : safeScale(tail[3] ?? "");
    if (scale === null) return { problem: `"${text}" ends in "${tail[0].trim()}", which is no offset from UTC` };
    tailText = rest.slice(tail.index);
    rest = rest.slice(0, tail.index);
  }
  const month = /^([+-]?\d{4})-(\d\d)$/.exec(rest);
  if (month && scale === null) {
    const [, y = "", m = ""] = month;
    if (Number(m) < 1 || Number(m) > 12) return { problem: `"${text}" has no month ${m}` };
    const from = dayOfGregorian(Number(y), Number(m), 1);
    return span(text, from, from + daysInMonth(Number(y), Number(m)), "month", [
      field("year", 4),
      { text: "-" },
      field("month", 2),
    ]);
  }
  if (/^[+-]?\d{4}$/.test(rest) && scale === null) {
    const from = dayOfGregorian(Number(rest), 1, 1);
    return span(text, from, dayOfGregorian(Number(rest) + 1, 1, 1), "year", [field("year", 4)]);
  }
  for (const { pattern, order } of DATES) {
    const found = pattern.exec(rest);
    if (found) return withDate(text, plain, found, order, rest.slice(found[0].length), scale, tailText, context);
  }
  return {
    problem: `"${text.slice(0, 60)}" cannot be read as a time; write it as 2026-01-03 17:16, 2026-01-03 17 or 2026-01-03`,
  };
}

function safeScale(offset: string): AuditScale | null {
  try {
    return auditScale(offset);
  } catch {
    return null;
  }
}

function withDate(
  text: string,
  plain: string,
  found: RegExpExecArray,
  order: readonly Field[],
  after: string,
  scale: AuditScale | null,
  tailText: string,
  context: WhenContext,
): PublishedWhen | UnreadWhen {
  let year: number | null = null;
  let month = 0;
  let day = 0;
  let decimals = "";
  const fields: { at: number; part: WhenPart; length: number }[] = [];
  let from = 0;
  const place = (caught: string, part: WhenPart) => {
    const at = plain.indexOf(caught, from);
    fields.push({ at, part, length: caught.length });
    from = at + caught.length;
  };
  let first = 0;
  order.forEach((kind, i) => {
    const caught = found[i + 1] ?? "";
    if (kind === "y") {
      year = Number(caught);
      place(caught, field("year", caught.length));
    } else if (kind === "m") {
      month = Number(caught);
      place(caught, field("month", caught.length));
    } else if (kind === "n") {
      month = MONTHS.indexOf(caught.toLowerCase()) + 1;
      const word = /^[a-z]+/i.exec(plain.slice(plain.indexOf(caught, from)))?.[0] ?? caught;
      place(word, { field: "monthName", width: 0, decimals: 0, like: word });
    } else if (kind === "d") {
      day = Number(caught);
      const f = order[i + 1] === "f" ? (found[i + 2] ?? "") : "";
      place(f ? `${caught}.${f}` : caught, field("day", caught.length, f.length));
    } else if (kind === "f") decimals = caught;
    else if (kind === "a") {
      first = Number(caught);
      place(caught, field("day", caught.length));
    } else if (kind === "b") {
      const second = Number(caught);
      const monthFirst = first > 12 ? false : second > 12 ? true : context.order === "month-first";
      [day, month] = monthFirst ? [second, first] : [first, second];
      place(caught, field("month", caught.length));
      if (monthFirst) {
        const [one, two] = fields;
        if (one && two) {
          one.part = field("month", one.length);
          two.part = field("day", two.length);
        }
      }
    }
  });
  if (year === null) {
    if (context.year === undefined || context.year === null) {
      return { problem: `"${text}" has no year; add it to the time or in a column named year` };
    }
    year = context.year;
  }
  const gap = /^\s*,?\s*(?:at\s+|T|[-:;]\s+)?/i.exec(after)?.[0] ?? "";
  const rest = after.slice(gap.length).trimEnd();
  let seconds = 0;
  let unit = 86_400;
  let whole: "day" | null = "day";
  if (decimals) {
    seconds = Number(`0.${decimals}`) * 86_400;
    unit = 86_400 / 10 ** decimals.length;
    whole = null;
  }
  if (rest !== "") {
    const time = TIME.exec(rest);
    if (!time || decimals || time[0].trim().length !== rest.trim().length) {
      return {
        problem: `"${text.slice(0, 60)}" has "${rest.slice(0, 20)}" after its date, which is no time of day; write 17:16, 17h or 17`,
      };
    }
    const [, h = "", , m1, , s1, sf, m1f, , m2, m2f, hf, , meridiem] = time;
    let hour = Number(h);
    if (meridiem) {
      if (hour < 1 || hour > 12) return noSuchTime(text);
      hour = (hour % 12) + (meridiem.toLowerCase() === "p" ? 12 : 0);
    }
    const minuteText = m1 ?? m2;
    const minuteDecimals = m1f ?? m2f;
    const told = clock(
      hour + (hf === undefined ? 0 : Number(`0.${hf}`)),
      Number(minuteText ?? 0) + (minuteDecimals === undefined ? 0 : Number(`0.${minuteDecimals}`)),
      Number(s1 ?? 0) + (sf === undefined ? 0 : Number(`0.${sf}`)),
    );
    if (told === null) return noSuchTime(text);
    seconds = told;
    whole = null;
    if (s1 !== undefined) unit = 10 ** -(sf?.length ?? 0);
    else if (minuteText !== undefined) unit = 60 / 10 ** (minuteDecimals?.length ?? 0);
    else unit = 3600 / 10 ** (hf?.length ?? 0);
    from = plain.length - after.length - tailText.length + gap.length;
    place(h, meridiem ? field("hour12", h.length) : field("hour", h.length, hf?.length ?? 0));
    if (hf !== undefined) stretch(fields, hf.length + 1);
    if (hf !== undefined) from += hf.length + 1;
    if (minuteText !== undefined) {
      place(minuteText, field("minute", minuteText.length, minuteDecimals?.length ?? 0));
      if (minuteDecimals !== undefined) stretch(fields, minuteDecimals.length + 1);
    }
    if (s1 !== undefined) {
      place(s1, field("second", s1.length, sf?.length ?? 0));
      if (sf !== undefined) stretch(fields, sf.length + 1);
    }
    if (meridiem) place(meridiem, { field: "meridiem", width: 1, decimals: 0, like: meridiem });
  }
  const parts: WhenPart[] = [];
  let at = 0;
  for (const { at: begins, part, length } of fields) {
    if (begins < at) return made(text, year, month, day, seconds, unit, whole, scale, null);
    if (begins > at) parts.push({ text: plain.slice(at, begins) });
    parts.push(part);
    at = begins + length;
  }
  if (at < plain.length) parts.push({ text: plain.slice(at) });
  return made(text, year, month, day, seconds, unit, whole, scale, parts);
}

function stretch(fields: { length: number }[], by: number): void {
  const last = fields.at(-1);
  if (last) last.length += by;
}

function field(name: Exclude<WhenPart, { text: string }>["field"], width: number, decimals = 0): WhenPart {
  return { field: name, width, decimals };
}

/** Seconds since midnight; `null` where there is no such time. 24:00 is the end of the day. */
function clock(hour: number, minute: number, second: number): number | null {
  if (minute >= 60 || second >= 61 || hour > 24 || (hour === 24 && (minute > 0 || second > 0))) return null;
  return hour * 3600 + minute * 60 + second;
}

function noSuchTime(text: string): UnreadWhen {
  return { problem: `"${text.slice(0, 60)}" has a time of day that does not exist; times are 00:00 to 24:00` };
}

function made(
  text: string,
  year: number,
  month: number,
  day: number,
  seconds: number,
  unitSeconds: number,
  whole: "day" | null,
  scale: AuditScale | null,
  parts: WhenPart[] | null,
): PublishedWhen | UnreadWhen {
  if (Math.abs(year) > 9999) return { problem: `"${text.slice(0, 60)}" lies outside the years -9999 to 9999` };
  if (month < 1 || month > 12) return { problem: `"${text.slice(0, 60)}" has no month ${month}; months are 1 to 12` };
  if (day < 1 || day > daysInMonth(year, month)) {
    return {
      problem: `"${text.slice(0, 60)}" names a day that does not exist; that month has ${daysInMonth(year, month)} days`,
    };
  }
  const wallSeconds = dayOfGregorian(year, month, day) * 86_400 + (whole === "day" ? 43_200 : seconds);
  return { text, wallSeconds, unitSeconds, whole, scale, style: parts && { parts } };
}

function span(text: string, from: number, to: number, whole: "month" | "year", parts: WhenPart[]): PublishedWhen {
  return {
    text,
    wallSeconds: (from + to) * 43_200,
    unitSeconds: (to - from) * 86_400,
    whole,
    scale: null,
    style: { parts },
  };
}
