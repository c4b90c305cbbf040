import type { Command } from "commander";
import { addAnswerOptions, addCalendarOption, addSourceOptions, type SharedOptions } from "./options.ts";
import { pairsHelp } from "./pairs.ts";

/** The options of `range`, as given. */
export interface RangeOptions extends SharedOptions {
  readonly from?: string;
  readonly to?: string;
  readonly step?: string;
  readonly calendar?: string;
}

/** Adds the command that tells distances at equal steps. */
export function addRange(program: Command): void {
  const command = program
    .command("range")
    .summary("tell the distance of a pair at equal steps of time")
    .description(
      "Tells the distance of a pair at equal steps of time, with its rate, its acceleration, and its\n" +
        "share of the way from the periapsis (0) to the apoapsis (1) on either side.",
    )
    .argument("<pair>", "the pair, such as moon-earth")
    .option("--from <when>", "first row: ISO 8601 or a bare year; UTC (before 1972 UT1) unless an offset is given")
    .option("--to <when>", "end, excluded")
    .option("--step <time>", "from row to row: a number with s, min, h or d, such as 6h, 30min, 1.5d");
  addAnswerOptions(addSourceOptions(addCalendarOption(command)))
    .addHelpText(
      "after",
      `
${pairsHelp()}

Examples:
  apsidary range moon-earth --from 2027-01-01 --to 2027-02-01 --step 6h
  apsidary range moon-earth --from 1066-09-25 --to 1066-10-15 --step 1d --calendar julian
  apsidary range earth-sun --from 2027 --to 2028 --step 1d --format csv --out sun.csv`,
    )
    .action(async (word: string, options: RangeOptions) => {
      const { runRange } = await import("./run-range.ts");
      await runRange(word, options);
    });
}
