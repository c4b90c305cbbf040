import type { Command } from "commander";
import type { SourceChoice } from "../passages/timeline-for.ts";
import { choiceOf } from "./choice-of.ts";

/** The forms of an answer. */
const FORMATS = ["text", "json", "ndjson", "csv"] as const;
/** The form of an answer. */
export type Format = (typeof FORMATS)[number];

const CHOICES = ["auto", "kernel", "series", "engine"] as const satisfies readonly SourceChoice[];

const CALENDARS = ["gregorian", "julian"] as const;
/** The calendar of dates before 1582-10-15. */
export type Calendar = (typeof CALENDARS)[number];
/** What the title of a report adds where the calendar is Julian. */
export const JULIAN_TITLE = " (Julian calendar before 1582-10-15)";

/** The options that several commands share, as given. */
export interface SharedOptions {
  readonly source?: string;
  readonly kernel?: readonly string[];
  readonly leapSeconds?: string;
  readonly format?: string;
  readonly out?: string;
}

/** Adds the options that say which data are used. */
export function addSourceOptions(command: Command): Command {
  return addDataFiles(
    command.option(
      "--source <which>",
      `${CHOICES.join(" | ")}: auto takes the best at each time, a named one never falls back on another (default: auto)`,
    ),
  );
}

/** Adds the options that name files of data. */
export function addDataFiles(command: Command): Command {
  return command
    .option(
      "--kernel <file>",
      "an SPK kernel of yours, used before the built-in one; repeatable, the last one counts most",
      (file: string, before: readonly string[] | undefined) => [...(before ?? []), file],
    )
    .option("--leap-seconds <file>", "a leap-seconds.list as the IERS publishes it, instead of the built-in one");
}

/** Adds the options that say where the answer goes and, where there are several, in which form. */
export function addAnswerOptions(command: Command, formats: readonly Format[] = FORMATS): Command {
  if (formats.length > 1) command.option("--format <form>", `${formats.join(" | ")} (default: text)`);
  return command.option("--out <file>", "write the answer to this file, whole or not at all");
}

/** Adds the option that says in which calendar dates before 1582-10-15 are given and told. */
export function addCalendarOption(command: Command): Command {
  return command.option(
    "--calendar <which>",
    `${CALENDARS.join(" | ")}: of dates before 1582-10-15, given and printed; gregorian carries that calendar back, as ISO 8601 does (default: gregorian)`,
  );
}

/** Gives the calendar of dates before 1582-10-15. @throws ApsidaryError `bad-option` */
export function calendarOf({ calendar }: { readonly calendar?: string }): Calendar {
  return choiceOf("--calendar", calendar ?? "gregorian", CALENDARS);
}

/** Gives the form of the answer. @throws ApsidaryError `bad-option` */
export function formatOf(options: SharedOptions): Format {
  return choiceOf("--format", options.format ?? "text", FORMATS);
}

/** Gives the choice of sources. @throws ApsidaryError `bad-option` */
export function sourceChoiceOf(options: SharedOptions): SourceChoice {
  return choiceOf("--source", options.source ?? "auto", CHOICES);
}
