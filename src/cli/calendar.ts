import type { Command } from "commander";
import { addAnswerOptions, addSourceOptions, type SharedOptions } from "./options.ts";

/** The options of `calendar`, as given. */
export interface CalendarOptions extends SharedOptions {
  readonly zone?: string;
}

/** Adds the command that makes a year's calendar. */
export function addCalendar(program: Command): void {
  const command = program
    .command("calendar")
    .summary("print a year's passages of the Earth, the Moon and the planets in local time")
    .description(
      "Prints the passages of the Earth, the Moon and the planets in one year of local time, each to the\n" +
        "unit (minute, hour, day …) that its uncertainty defends.",
    )
    .argument("<year>", "the local year, such as 2027, or next")
    .option(
      "--zone <zone>",
      "IANA name of the readers' zone, such as Pacific/Auckland, or an offset (default: this machine's)",
    );
  addAnswerOptions(addSourceOptions(command), ["text"])
    .addHelpText(
      "after",
      `
Examples:
  apsidary calendar 2027
  apsidary calendar 2027 --zone Pacific/Auckland --out calendar.txt
  apsidary calendar next --zone UTC`,
    )
    .action(async (year: string, options: CalendarOptions) => {
      const { runCalendar } = await import("./run-calendar.ts");
      await runCalendar(year, options);
    });
}
