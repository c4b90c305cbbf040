import { Command } from "commander";
import { addAudit } from "./audit.ts";
import { addCalendar } from "./calendar.ts";
import { addDrift } from "./drift-command.ts";
import { addOrbit } from "./orbit.ts";
import { addPassages } from "./passages.ts";
import { addPlan } from "./plan.ts";
import { addRange } from "./range.ts";
import { addSources } from "./sources.ts";
import { version } from "./version.ts";

/** Gives the command with all its parts; it throws where commander would end the process. */
export function makeProgram(): Command {
  const program = new Command("apsidary")
    .description(
      "Finds apsis passages (perihelion, aphelion, perigee, apogee and their kin) from public ephemerides,\n" +
        "says how sure each one is, and which centres it refers to.",
    )
    .version(version, "--version", "print the version")
    .helpOption("--help", "print this help")
    .helpCommand(false)
    .configureOutput({ outputError: () => {}, getOutHelpWidth: () => 100, getErrHelpWidth: () => 100 })
    .exitOverride();
  program.addHelpText(
    "after",
    `
Examples:
  apsidary calendar next                               next year's passages, in this machine's zone
  apsidary passages moon-earth --from 2027 --to 2028   perigees and apogees of a year
  apsidary passages earth-sun --from 2027 --next 2     the next perihelion and aphelion
  apsidary passages --help                             all options, and which pairs there are

Answers go to standard output, everything else to standard error.
Exit status: 0 done (no rows is an answer as well); 1 audit found rows that do not agree; 2 the
input cannot be used, or a file cannot be read or written, and nothing was written; 70 a defect of
the program itself.`,
  );
  addPassages(program);
  addRange(program);
  addCalendar(program);
  addDrift(program);
  addAudit(program);
  addPlan(program);
  addOrbit(program);
  addSources(program);
  return program;
}
