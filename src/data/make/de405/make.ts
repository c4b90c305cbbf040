/**
 * Makes `src/data/de405.bsp` from JPL's DE405 as Debian packs it, and writes the table of what was made into `src/data/PROVENANCE.md`.
 *
 *     apt-get download casacore-data-jpl-de405 && dpkg -x casacore-data-jpl-de405_*.deb de405
 *     npx tsx src/data/make/de405/make.ts de405/usr/share/casacore/data/ephemerides/DE405/table.f0i
 */
import { readFileSync, writeFileSync } from "node:fs";
import { makeKernel } from "./make-kernel.ts";

const tablePath = process.argv[2];
if (!tablePath) throw new Error("Give the path of DE405's table.f0i (see the top of this script).");
const { file, report } = makeKernel(tablePath);
writeFileSync(new URL("../../de405.bsp", import.meta.url), file);

const page = new URL("../../PROVENANCE.md", import.meta.url);
const text = readFileSync(page, "utf8");
const start = text.indexOf("<!-- made -->") + "<!-- made -->".length;
const end = text.indexOf("<!-- /made -->");
writeFileSync(page, `${text.slice(0, start)}\n\n${report}\n\n${text.slice(end)}`);
process.stdout.write(`${report}\n`);
