import type { Command } from "commander";
import { addSourceOptions, type SharedOptions } from "./options.ts";
import { pairsHelp } from "./pairs.ts";

/** The options of `calendar`, as given. */
export interface CalendarOptions extends SharedOptions {
  readonly zone?: string;
  readonly pairs?: string;
  readonly rank?: string;
  readonly unit?: string;
  readonly rounding?: string;
  readonly months?: string;
  readonly lang?: string;
  readonly ascii?: boolean;
  readonly alarm?: string;
  readonly page?: string | true;
  readonly nearest?: string;
  readonly farthest?: string;
  readonly kind?: string;
  readonly against?: string;
}

/** The forms of a calendar. */
export const CALENDAR_FORMATS = ["text", "json", "ndjson", "csv", "ics", "html"] as const;

/** Adds the command that makes the calendar of one year or of several. */
export function addCalendar(program: Command): void {
  const command = program
    .command("calendar")
    .summary("make a year's calendar of passages in anyone's zone: text, CSV, JSON, calendar file, page")
    .description(
      "Makes the calendar of the passages of the Earth, the Moon and the planets in the years of a zone: times and distances rounded to\n" +
        "what their uncertainty defends, how the body looks, and what is worth a note.",
    )
    .argument("<year>", "a year such as 2027, several such as 2027-2030, or next")
    .option(
      "--zone <zone>",
      "IANA name of the readers' zone, such as Pacific/Auckland, or an offset (default: this machine's); up to two more stand beside it: Asia/Kathmandu,UTC",
    )
    .option("--pairs <pairs>", "which passages (default: Earth and planets about the Sun, Moon about the Earth)")
    .option("--rank <rank>", "principal | all: principal leaves out what is no apsis of the orbit (default: all)");
  addSourceOptions(command)
    .option("--unit <unit>", "minute | hour | day: the finest unit that is printed (default: minute)")
    .option("--rounding <how>", "nearest | cut: times go to the nearest unit or are cut off (default: nearest)")
    .option("--months <how>", "numbers | names, in text, page and calendar file (default: numbers)")
    .option("--lang <tag>", "language of month names, weekdays and numbers, such as de or pt-BR")
    .option(
      "--nearest <n>",
      "instead of the calendar, the n nearest passages of its years (perigees, unless --kind says otherwise)",
    )
    .option("--farthest <n>", "the n farthest passages")
    .option("--kind <kind>", "periapsis | apoapsis, with --nearest or --farthest")
    .option("--against <file>", "tell what changed against an earlier answer in JSON, of the same years or of others")
    .option("--ascii", "write text in ASCII alone")
    .option("--alarm <minutes>", "let each event of a calendar file ring so many minutes before")
    .option("--page [file]", "write the page as well, to this file or else to a new folder among the temporary files")
    .option("--format <form>", `${CALENDAR_FORMATS.join(" | ")} (default: text)`)
    .option("--out <file>", "write the answer to this file, whole or not at all")
    .addHelpText(
      "after",
      `
${pairsHelp()}

Examples:
  apsidary calendar 2027 --zone Pacific/Auckland
  apsidary calendar 2027 --zone Asia/Kathmandu --format ics --out apsides.ics
  apsidary calendar 2027 --zone Europe/Lisbon --months names --lang pt --format html --out 2027.html
  apsidary calendar 2001-2100 --zone UTC --pairs moon-earth --nearest 10
  apsidary calendar 2028 --zone UTC --against 2027.json`,
    )
    .action(async (year: string, options: CalendarOptions) => {
      const { runCalendar } = await import("./run-calendar.ts");
      await runCalendar(year, options);
    });
}
