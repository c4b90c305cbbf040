import type { Command } from "commander";
import { addSourceOptions, type SharedOptions } from "./options.ts";
import { pairsHelp } from "./pairs.ts";

/** The options of `audit`, as given. */
export interface AuditCommandOptions extends SharedOptions {
  readonly zone?: string;
  readonly scale?: string;
  readonly pair?: string;
  readonly precision?: string;
  readonly corrected?: string;
}

/** The forms of an audit. */
export const AUDIT_FORMATS = ["text", "json", "ndjson", "csv", "html"] as const;

/** Adds the command that holds a published list against the sky. */
export function addAudit(program: Command): void {
  const command = program
    .command("audit")
    .summary("hold a published list against the sky: which rows are wrong, and why")
    .description(
      "Reads a list of passages that was published, says which rows are wrong and names the slip: another zone, another centre,\n" +
        "another year's line, a coarse model … What runs through the whole list is told first.",
    )
    .argument(
      "<file>",
      "the list: CSV, TSV, semicolons, JSON, a JSON object a line, or columns of text; - for standard input",
    )
    .option("--zone <zone>", "zone of times that name none: an IANA name or an offset (default: UTC)")
    .option("--scale <scale>", "scale of times that name none: utc, ut1, tt, tai, tdb (default: utc)")
    .option("--pair <pair>", "the pair of rows that name none, such as moon-earth")
    .option("--precision <unit>", "second | minute | hour | day, where it is coarser than the last digit")
    .option("--corrected <file>", "write the list again with the wrong cells mended and everything else to the byte");
  addSourceOptions(command)
    .option("--format <form>", `${AUDIT_FORMATS.join(" | ")} (default: text)`)
    .option("--out <file>", "write the answer to this file, whole or not at all")
    .addHelpText(
      "after",
      `
Columns, in any order: pair (or body), kind (or event), when (or date and time), and if there are
distance (km, au or mi), scale or zone, year. Lists with perihelion and aphelion side by side will do.

${pairsHelp()}

Exit status: 0 every row agrees or cannot be decided; 1 some row does not agree; 2 the list cannot be used.

Examples:
  apsidary audit list.csv
  apsidary audit list.csv --zone Europe/Lisbon --corrected mended.csv
  apsidary audit - --scale tt --format json < list.txt`,
    )
    .action(async (file: string, options: AuditCommandOptions) => {
      const { runAudit } = await import("./run-audit.ts");
      await runAudit(file, options);
    });
}
