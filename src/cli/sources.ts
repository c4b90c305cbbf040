import type { Command } from "commander";
import { addAnswerOptions, addDataFiles, type SharedOptions } from "./options.ts";

/** Adds the command that tells what the sources hold. */
export function addSources(program: Command): void {
  const command = program
    .command("sources")
    .summary("tell what the sources hold: spans, segments, centres, targets, comments")
    .description(
      "Tells what the sources hold, the best first: which pairs they supply and when, and of kernels the\n" +
        "segments and comments.",
    );
  addAnswerOptions(addDataFiles(command), ["text"])
    .addHelpText(
      "after",
      `
Examples:
  apsidary sources
  apsidary sources --kernel mine.bsp`,
    )
    .action(async (options: SharedOptions) => {
      const { runSources } = await import("./run-sources.ts");
      await runSources(options);
    });
}
