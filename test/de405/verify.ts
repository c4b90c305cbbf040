/**
 * Holds every passage that the product finds from 1960 to 2059 against JPL's DE405, which it downloads where it is not at hand.
 *
 *     npm run verify:de405 -- [--source kernel|series|engine] [--write]
 *
 * Prints the table of errors of each source (left out: all that the package has) and ends with status 1 where a limit is broken;
 * `--write` puts the tables between their marks in docs/accuracy.md.
 */
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import { openSources } from "../../src/ephemeris/open-sources.ts";
import { checkReport } from "./check-report.ts";
import { checkSource } from "./check-source.ts";
import { openDe405 } from "./read.ts";

const KINDS = ["kernel", "series", "engine"] as const;
const page = new URL("../../docs/accuracy.md", import.meta.url);

async function main(args: readonly string[]): Promise<void> {
  const at = args.indexOf("--source");
  const asked = at < 0 ? undefined : args[at + 1];
  if (at >= 0 && !KINDS.some((kind) => kind === asked)) throw new Error(`--source takes ${KINDS.join(", ")}.`);
  const ephemeris = await openSources();
  const open = KINDS.filter((kind) => ephemeris.sources.some((source) => source.kind === kind));
  const de405 = openDe405();
  const broken: string[] = [];
  for (const kind of asked ? open.filter((it) => it === asked) : open) {
    const report = checkReport(kind, [...checkSource(ephemeris, kind, de405)]);
    process.stdout.write(`\n${kind} against DE405, 1960–2059\n\n${report.text}\n`);
    broken.push(...report.broken);
    if (args.includes("--write")) writeBetweenMarks(kind, report.text);
  }
  process.stdout.write(broken.length > 0 ? `\nLimits broken:\n${broken.join("\n")}\n` : "\nAll limits kept.\n");
  if (broken.length > 0) process.exitCode = 1;
}

function writeBetweenMarks(kind: string, text: string): void {
  const before = existsSync(page) ? readFileSync(page, "utf8") : "";
  const open = `<!-- verify:${kind} -->`;
  const close = `<!-- /verify:${kind} -->`;
  const start = before.indexOf(open);
  const end = before.indexOf(close);
  if (start < 0 || end < start) throw new Error(`docs/accuracy.md has no place marked ${open} … ${close} to write to.`);
  writeFileSync(page, `${before.slice(0, start + open.length)}\n\n${text}\n\n${before.slice(end)}`);
}

await main(process.argv.slice(2));
