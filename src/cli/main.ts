import { ApsidaryError } from "../error.ts";
import { tellFailure } from "./failure.ts";
import { makeProgram } from "./program.ts";

process.exitCode = await main(process.argv.slice(2));

/** Runs the command. @param words the arguments after its name @returns the exit status */
async function main(words: string[]): Promise<number> {
  process.stderr.on("error", () => {}); // a reader of messages who has gone is no failure
  const program = makeProgram();
  const command = program.commands.find((candidate) => candidate.name() === words[0])?.name() ?? "";
  try {
    if (words.length === 0) {
      const names = program.commands.map((candidate) => candidate.name()).join(", ");
      throw new ApsidaryError("bad-input", `say what to do: ${names}. apsidary --help tells more.`);
    }
    await program.parseAsync(words, { from: "user" });
    return 0;
  } catch (error) {
    return tellFailure(error, command);
  }
}
