import { ApsidaryError } from "../error.ts";
import { isoDate } from "./iso-text.ts";

/** One change of TAI − UTC. */
export interface LeapSecondStep {
  /** Modified Julian day number of the first UTC day with this offset. */
  readonly utcDay: number;
  /** Seconds. */
  readonly taiMinusUtc: number;
}

/** TAI − UTC from 1972 on, and how far it is known. */
export interface LeapSecondList {
  /** In order of time; the first is 1972-01-01 with 10 s. */
  readonly steps: readonly LeapSecondStep[];
  /** Modified Julian day number from which the list no longer speaks. */
  readonly expiresDay: number;
  /** The same as an ISO date, `2027-06-28`. */
  readonly expiresUtc: string;
  /** Where the list comes from, for the provenance of an answer. */
  readonly source: string;
}

/** Modified Julian day number of 1972-01-01, when UTC began to keep whole seconds from TAI. */
export const FIRST_LEAP_SECOND_DAY = 41_317;
const FIRST_OFFSET = 10;
/** Modified Julian day number of 1900-01-01, from which NTP counts. */
const NTP_EPOCH_DAY = 15_020;

/** Days on which TAI − UTC had grown by one more second: 11 s from the first, 37 s from the last. */
// biome-ignore format: one decade a line
const BUILT_IN_DAYS: readonly number[] = [
  41_499, 41_683, 42_048, 42_413, 42_778, 43_144, 43_509, 43_874,
  44_239, 44_786, 45_151, 45_516, 46_247, 47_161,
  47_892, 48_257, 48_804, 49_169, 49_534, 50_083, 50_630, 51_179,
  53_736, 54_832,
  56_109, 57_204, 57_754,
];
/** 2027-06-28. */
const BUILT_IN_EXPIRY = 61_584;

let builtIn: LeapSecondList | undefined;

/**
 * Gives the leap-second list that comes with the library: 10 s from 1972-01-01 to 37 s from 2017-01-01, valid to 2027-06-28.
 *
 * Source: the IERS list `leap-seconds.list` of July 2026, as the time-zone database carries it; public domain.
 */
export function builtInLeapSeconds(): LeapSecondList {
  builtIn ??= listOf(
    [FIRST_LEAP_SECOND_DAY, ...BUILT_IN_DAYS].map((utcDay, k) => ({ utcDay, taiMinusUtc: FIRST_OFFSET + k })),
    BUILT_IN_EXPIRY,
    "IERS leap-seconds.list, built in",
  );
  return builtIn;
}

/**
 * Reads a list in the form of the IERS and NIST `leap-seconds.list`.
 *
 * A line is `NTP seconds, TAI − UTC`, and `#` begins a remark; `#@` gives the expiry in NTP seconds. The checksum line `#h` is not verified.
 *
 * @param text   the file as text
 * @param source what to call the list in the provenance of an answer
 * @throws `bad-leap-seconds` where the text has no expiry, does not begin at 1972-01-01 with 10 s, has a step that is not at the beginning
 * of a day, not of one second or not later than the one before it, or a line that cannot be read
 */
export function parseLeapSeconds(text: string, source = "leap-second list of the user"): LeapSecondList {
  const steps: LeapSecondStep[] = [];
  let expiresDay: number | undefined;
  const lines = text.split(/\r\n|\n|\r/);
  for (const [index, line] of lines.entries()) {
    const expiry = /^#@\s*(\d+)\s*$/.exec(line);
    if (expiry) expiresDay = Math.floor(Number(expiry[1]) / 86_400) + NTP_EPOCH_DAY;
    const content = line.replace(/#.*/, "").trim();
    if (content === "") continue;
    const fields = /^(\d+)\s+(\d+)$/.exec(content);
    if (!fields) throw bad(`line ${index + 1} reads "${shortened(content)}"`);
    const utcDay = Number(fields[1]) / 86_400 + NTP_EPOCH_DAY;
    const taiMinusUtc = Number(fields[2]);
    const before = steps.at(-1);
    if (!Number.isInteger(utcDay)) throw bad(`line ${index + 1}: ${fields[1]} is not the beginning of a day`);
    if (!before && (utcDay !== FIRST_LEAP_SECOND_DAY || taiMinusUtc !== FIRST_OFFSET)) {
      throw bad(
        `line ${index + 1}: the first step must be 2272060800 10 (1972-01-01, 10 s), not "${shortened(content)}"`,
      );
    }
    if (before && utcDay <= before.utcDay)
      throw bad(`line ${index + 1}: ${fields[1]} is not later than the step before it`);
    if (before && Math.abs(taiMinusUtc - before.taiMinusUtc) !== 1) {
      throw bad(
        `line ${index + 1}: TAI - UTC goes from ${before.taiMinusUtc} s to ${taiMinusUtc} s; a step is one second`,
      );
    }
    steps.push({ utcDay, taiMinusUtc });
  }
  const last = steps.at(-1);
  if (!last) throw bad("there is no step in it");
  if (expiresDay === undefined) throw bad('there is no line "#@ SECONDS" with the expiry');
  if (expiresDay < last.utcDay)
    throw bad(`it expires on ${isoDate(expiresDay)}, before its own last step of ${isoDate(last.utcDay)}`);
  return listOf(steps, expiresDay, source);
}

function listOf(steps: readonly LeapSecondStep[], expiresDay: number, source: string): LeapSecondList {
  return Object.freeze({
    steps: Object.freeze(steps.map((step) => Object.freeze(step))),
    expiresDay,
    expiresUtc: isoDate(expiresDay),
    source,
  });
}

function shortened(text: string): string {
  return text.length > 40 ? `${text.slice(0, 40)}...` : text;
}

function bad(what: string): ApsidaryError {
  return new ApsidaryError(
    "bad-leap-seconds",
    `This is not a leap-second list: ${what}. Give the text of leap-seconds.list as the IERS publishes it.`,
  );
}
