import { durationText } from "../report/duration-text.ts";
import { daysInWords, hoursInWords } from "./hours-in-words.ts";
import type { NearestSyzygy } from "./moon-phase.ts";
import { roundedParts } from "./rounded-parts.ts";

/** A source and the half-width of the instant that it gave, seconds. */
export interface SourcedInstant {
  readonly source: string;
  readonly timeUncertaintySeconds: number;
}

/** What the Earth's sentence tells. */
export interface DateStep {
  readonly dateStepHours: number;
  /** `null` where the account could not be made. */
  readonly parts: { readonly calendarHours: number; readonly planetsHours: number; readonly moonHours: number } | null;
  readonly moon: NearestSyzygy | null;
  readonly now: SourcedInstant;
  readonly before: SourcedInstant;
}

/** What another pair's sentence tells. */
export interface PlainStep {
  readonly term: string;
  readonly stepDays: number;
  readonly departureHours: number | null;
  readonly now: SourcedInstant;
  readonly before: SourcedInstant;
}

/** Half-width of a date, seconds, up to which whole hours are right (an eighth of an hour); beyond it the sentence says how well the dates are known. */
const HOUR_LIMIT = 450;
/** The same for whole days. */
const DAY_LIMIT = 10_800;

const SMALL_NUMBERS = ["", "one", "two", "three", "four", "five", "six", "seven", "eight"];

/**
 * Tells in one plain sentence how a date of the Earth moved since last year, and why: whole hours that add up, the Moon's phase at the end.
 *
 * A step whose two dates come from different sources is not explained: it holds the difference of the sources.
 */
export function dateStepSentence({ dateStepHours, parts, moon, now, before }: DateStep): string {
  const whole = Math.round(dateStepHours);
  const step =
    whole === 0 ? "within half an hour of last year" : `${hoursInWords(whole)} ${laterOrEarlier(whole)} than last year`;
  if (now.source !== before.source) return `${step}, but ${differentSources(now, before)}`;
  const known = howWellKnown(now, before);
  if (!parts) return `${step}; no source reaches the barycentre's passage, so the step is not explained${known}`;
  const hours = roundedParts([parts.calendarHours, parts.planetsHours, parts.moonHours]);
  const mixed = new Set(hours.filter((part) => part !== 0).map((part) => Math.sign(part))).size > 1 || whole === 0;
  const told = ["the calendar", "the planets", "the Moon"].map((origin, i) => {
    const part = hours[i] ?? 0;
    const way = mixed && part !== 0 ? ` ${laterOrEarlier(part)}` : "";
    return `${hoursInWords(part)}${way} from ${origin}`;
  });
  return `${step}: ${told.join(", ")}${moon ? `, now ${phaseInWords(moon)}` : ""}${known}`;
}

/** Tells in one plain sentence how long after the passage before it one came, and how far off the straight line it is. */
export function plainStepSentence({ term, stepDays, departureHours, now, before }: PlainStep): string {
  const coarse = Math.max(now.timeUncertaintySeconds, before.timeUncertaintySeconds) > DAY_LIMIT;
  const told = (hours: number) =>
    coarse ? `about ${daysInWords(Math.round(Math.abs(hours) / 24))}` : hoursInWords(hours);
  const step = `${told(stepDays * 24)} after the ${term} before it`;
  if (now.source !== before.source) return `${step}, but ${differentSources(now, before)}`;
  const known = howWellKnown(now, before);
  if (departureHours === null) return `${step}${known}`;
  const departure =
    Math.round(departureHours) === 0
      ? "on the straight line to the hour"
      : `${told(departureHours)} ${laterOrEarlier(departureHours)} than the straight line`;
  return `${step}, ${departure}${known}`;
}

function laterOrEarlier(hours: number): string {
  return hours > 0 ? "later" : "earlier";
}

function phaseInWords({ phase, daysPast }: NearestSyzygy): string {
  const days = Math.round(Math.abs(daysPast));
  if (days === 0) return `at ${phase} Moon`;
  const count = SMALL_NUMBERS[days] ?? String(days);
  return `${count} ${days === 1 ? "day" : "days"} ${daysPast > 0 ? "past" : "before"} ${phase}`;
}

function differentSources(now: SourcedInstant, before: SourcedInstant): string {
  const told = [before, now].map(
    ({ source, timeUncertaintySeconds }) => `${source}, known to ${durationText(timeUncertaintySeconds)}`,
  );
  return `the two dates come from different sources (${told.join("; ")}): the step holds their difference and is not explained`;
}

function howWellKnown(now: SourcedInstant, before: SourcedInstant): string {
  const most = Math.max(now.timeUncertaintySeconds, before.timeUncertaintySeconds);
  return most > HOUR_LIMIT ? ` (the dates are known to ${durationText(most)})` : "";
}
