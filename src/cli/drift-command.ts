import type { Command } from "commander";
import { addAnswerOptions, addSourceOptions, type SharedOptions } from "./options.ts";
import { pairsHelp } from "./pairs.ts";

/** The options of `drift`, as given. */
export interface DriftOptions extends SharedOptions {
  readonly from?: string;
  readonly to?: string;
  readonly kind?: string;
  readonly centres?: boolean;
  readonly seasons?: boolean;
  readonly chart?: string;
}

/** Adds the command that says why dates move. */
export function addDrift(program: Command): void {
  const command = program
    .command("drift")
    .summary("say how far a date moved since the passage before, and why")
    .description(
      "Says how far each passage moved since the one of its kind before it. Of earth-sun the step of the date is split into\n" +
        "what the calendar, the planets and the Moon do, which add up; of other pairs the steps are given, and how far each\n" +
        "passage is off a straight line.",
    )
    .argument("<pair>", "the pair: earth-sun, or another")
    .option("--from <when>", "beginning, included: ISO 8601 or a bare year; UTC unless an offset is given")
    .option("--to <when>", "end, excluded")
    .option("--kind <kind>", "periapsis | apoapsis | both (default: both)")
    .option("--centres", "add the same passage about the other centres it might be meant for")
    .option("--seasons", "earth-sun: add the solstice before the passage, and the longitude of perihelion")
    .option("--chart <file>", "earth-sun: draw dates and parts, as an SVG file");
  addAnswerOptions(addSourceOptions(command))
    .addHelpText(
      "after",
      `
${pairsHelp()}

Examples:
  apsidary drift earth-sun --from 2020 --to 2031
  apsidary drift earth-sun --from 2027 --to 2028 --centres --seasons
  apsidary drift earth-sun --from 1961 --to 2060 --kind periapsis --chart perihelia.svg
  apsidary drift moon-earth --from 2027 --to 2028 --format csv --out moon-steps.csv`,
    )
    .action(async (word: string, options: DriftOptions) => {
      const { runDrift } = await import("./run-drift.ts");
      await runDrift(word, options);
    });
}
