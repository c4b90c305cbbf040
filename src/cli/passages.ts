import type { Command } from "commander";
import { addAnswerOptions, addCalendarOption, addSourceOptions, type SharedOptions } from "./options.ts";
import type { TrackOptions } from "./orbit-tracks.ts";
import { pairsHelp } from "./pairs.ts";

/** The options of `passages`, as given. */
export interface PassagesOptions extends SharedOptions, TrackOptions {
  readonly from?: string;
  readonly to?: string;
  readonly next?: string;
  readonly kind?: string;
  readonly rank?: string;
  readonly calendar?: string;
}

/** Adds the command that lists passages. */
export function addPassages(program: Command): void {
  const command = program
    .command("passages")
    .summary("list the passages of one or more pairs in a span of time")
    .description(
      "Lists every passage through a least or a greatest distance in a span of time, in order, each\n" +
        "with its uncertainty and the source that supplied it.",
    )
    .argument(
      "[pairs...]",
      "one or more pairs, such as moon-earth,earth-sun; may be left out where orbits of your own are given",
    )
    .option(
      "--from <when>",
      "beginning, included: ISO 8601 or a bare year; UTC (before 1972 UT1) unless an offset is given",
    )
    .option("--to <when>", "end, excluded")
    .option("--next <n>", "instead of --to: the first N passages from --from on")
    .option("--kind <kind>", "periapsis | apoapsis | both (default: both)")
    .option(
      "--rank <rank>",
      "principal | all; principal leaves out lesser extremes beside a greater one (default: all)",
    );
  addAnswerOptions(addSourceOptions(addCalendarOption(addTrackOptions(command))))
    .addHelpText(
      "after",
      `
${pairsHelp()}

Examples:
  apsidary passages moon-earth --from 2027 --to 2028
  apsidary passages earth-sun,moon-earth --from 2027-01-01 --to 2027-02-01T00:00+13:00
  apsidary passages mars-sun --from 2027 --next 3 --kind periapsis
  apsidary passages neptune-sun --from 2040 --to 2055 --rank principal
  apsidary passages moon-earth --from 1066-09-25 --next 2 --calendar julian
  apsidary passages --elements probe.json --from 2027 --to 2028
  apsidary passages --elements comet.json --perturbed --from 2027 --to 2035
  apsidary passages --tle satellites.txt --from 2027-03-01 --next 20
  apsidary passages --table flight.csv --about earth --from 2027-03-01 --to 2027-03-04
  apsidary passages moon-earth --from 2027 --to 2047 --format csv --out moon.csv`,
    )
    .action(async (words: string[], options: PassagesOptions) => {
      const { runPassages } = await import("./run-passages.ts");
      await runPassages(words, options);
    });
}

function addTrackOptions(command: Command): Command {
  return command
    .option(
      "--elements <file>",
      "orbits of your own: osculating elements as JSON or CSV (docs/orbits.md has the layout)",
    )
    .option(
      "--omm <file>",
      "satellites: orbit mean-elements messages as XML, KEY = VALUE or JSON; needs the package satellite.js",
    )
    .option("--tle <file>", "satellites: two-line elements; needs the package satellite.js")
    .option("--perturbed", "with --elements about the sun: integrate them with the pull of the planets over the span")
    .option("--star <file>", "binary stars: the elements of their orbits as JSON")
    .option("--table <file>", "a table of states of your own, as CSV; the pair is called after the file")
    .option("--about <body>", "the body at the centre of --table: heights are above its radius");
}
