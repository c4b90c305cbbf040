import { execFileSync } from "node:child_process";
import { existsSync, mkdirSync, readdirSync } from "node:fs";
import { join } from "node:path";
import { fileURLToPath } from "node:url";

const PACKAGE = "casacore-data-jpl-de405";
const TABLE = "usr/share/casacore/data/ephemerides/DE405/table.f0i";
const CACHE = fileURLToPath(new URL("../../.cache/de405", import.meta.url));

/**
 * Gives the path of DE405's table where it is already on this machine, else `null`; downloads nothing.
 *
 * It looks at the environment variable APSIDARY_DE405 (the table itself), then in the project's cache, then where
 * Debian installs the package.
 *
 * @throws Error where APSIDARY_DE405 names no file
 */
export function findDe405(): string | null {
  const named = process.env.APSIDARY_DE405;
  if (named) {
    if (!existsSync(named))
      throw new Error(`APSIDARY_DE405 names ${named}, which is not there; give the path of table.f0i.`);
    return named;
  }
  return [join(CACHE, TABLE), join("/", TABLE)].find((path) => existsSync(path)) ?? null;
}

/**
 * Gives the path of DE405's table, after downloading Debian's package `casacore-data-jpl-de405` (9 MB) and unpacking it into the
 * project's cache where the table is not on this machine. Needs `apt-get` and `dpkg`; privileges only where
 * apt's lists must be fetched first.
 *
 * @throws Error where the download fails
 */
export function fetchDe405(): string {
  const found = findDe405();
  if (found) return found;
  mkdirSync(CACHE, { recursive: true });
  const apt = (...args: string[]) => execFileSync("apt-get", args, { cwd: CACHE, stdio: ["ignore", "ignore", "pipe"] });
  try {
    try {
      apt("download", PACKAGE);
    } catch {
      apt("update", "-q"); // on a fresh machine apt has no lists yet
      apt("download", PACKAGE);
    }
    const archive = readdirSync(CACHE).find((name) => name.startsWith(PACKAGE) && name.endsWith(".deb"));
    if (!archive) throw new Error("apt-get left no package behind");
    execFileSync("dpkg", ["-x", archive, "."], { cwd: CACHE, stdio: ["ignore", "ignore", "inherit"] });
  } catch (error) {
    throw new Error(
      `Debian's package ${PACKAGE} could not be had (${error instanceof Error ? error.message : String(error)}). ` +
        "Run `apt-get update` first, or set APSIDARY_DE405 to the path of its table.f0i.",
    );
  }
  return join(CACHE, TABLE);
}
