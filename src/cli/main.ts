import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";
import { shown } from "./choice-of.ts";
import { tellFailure } from "./failure.ts";
import { makeProgram } from "./program.ts";

// A command may have set a status of its own: `audit` tells of rows that do not agree.
process.exitCode = (await main(process.argv.slice(2))) || (process.exitCode ?? 0);

/** Runs the command. @param words the arguments after its name @returns the exit status */
async function main(words: readonly string[]): Promise<number> {
  // A reader who has gone is no failure; answers learn of it, and of a full disk, from each write.
  process.stdout.on("error", () => {});
  process.stderr.on("error", () => {});
  const program = makeProgram();
  const names = program.commands.map((command) => command.name());
  // `help COMMAND` is `COMMAND --help`
  const [first, ...others] = words[0] === "help" ? [...words.slice(1, 2), "--help"] : words;
  const command = names.find((name) => name === first) ?? "";
  try {
    if (first === undefined) {
      throw new ApsidaryError("bad-input", `say what to do: ${names.join(", ")}. See: apsidary --help`);
    }
    if (!command && !first.startsWith("-")) {
      const near = nearestName(first, names);
      const meant = near ? `; did you mean ${near}?` : ".";
      throw new ApsidaryError("bad-input", `there is no command ${shown(first)}${meant} See: apsidary --help`);
    }
    await program.parseAsync([first, ...others], { from: "user" });
    return 0;
  } catch (error) {
    return tellFailure(error, command);
  }
}
