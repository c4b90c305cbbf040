import { CommanderError } from "commander";
import { ApsidaryError } from "../error.ts";
import { shown } from "./choice-of.ts";

/** Exit status of a run that cannot use its input, or cannot read or write a file. */
const UNUSABLE = 2;
/** Exit status of a run that failed through a fault of this program's own. */
const DEFECT = 70;

/**
 * Tells a failure on standard error, and gives the exit status.
 *
 * @param error   what was thrown
 * @param command the command that was called, for the advice; empty where none was
 */
export function tellFailure(error: unknown, command: string): number {
  if (error instanceof CommanderError) {
    if (error.exitCode === 0) return 0;
    tell(`${argumentFault(error)} See: apsidary ${command ? `${command} ` : ""}--help`);
    return UNUSABLE;
  }
  if (isOurs(error)) {
    tell(error.message);
    return UNUSABLE;
  }
  const trace = error instanceof Error ? (error.stack ?? error.message) : String(error);
  process.stderr.write(
    `apsidary: this is a defect of the program, not of your input. Please report it with the command you gave and these lines:\n${trace}\n`,
  );
  return DEFECT;
}

function tell(message: string): void {
  process.stderr.write(`apsidary: ${message.replace(/\s*\n\s*/g, "\n  ")}\n`);
}

/** Told by name: the library's own build may bring another copy of the class. */
function isOurs(error: unknown): error is ApsidaryError {
  return error instanceof ApsidaryError || (error instanceof Error && error.name === "ApsidaryError");
}

/** What is wrong with the arguments, in words of our own. */
function argumentFault({ code, message }: CommanderError): string {
  const named = /'([^']*)'/.exec(message)?.[1] ?? "";
  const near = /Did you mean ([^?]*)\?/.exec(message)?.[1];
  const meant = near ? `; did you mean ${near}?` : ".";
  switch (code) {
    case "commander.unknownOption":
      return `there is no option ${shown(named)} here${meant}`;
    case "commander.optionMissingArgument":
      return `the option ${named} needs its value.`;
    case "commander.missingArgument":
      return `the argument <${named}> is missing.`;
    case "commander.excessArguments":
      return "there are more arguments than this command takes.";
    default:
      return `${message.replace(/^error: /, "").replace(/\s+/g, " ")}.`;
  }
}
