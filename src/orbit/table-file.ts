import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";
import { csvRecords } from "./csv-records.ts";
import { digitHalfWidth } from "./digit-half-width.ts";
import type { StateTable } from "./table-interpolation.ts";
import { trackTime } from "./track-time.ts";

const bad = (message: string) => new ApsidaryError("bad-input", message);

const POSITION = ["xKm", "yKm", "zKm"] as const;
const VELOCITY = ["vxKmS", "vyKmS", "vzKmS"] as const;
const TIME = ["tdb", "tdbSeconds", "utc"] as const;
const KNOWN = [...TIME, ...POSITION, ...VELOCITY] as const;

/** A table of states as a file holds it. */
export interface TableFile extends StateTable {
  /** Half a unit of the last digit of the positions and velocities, the coarsest row's. */
  readonly digits: { readonly km: number; readonly kmS: number };
}

/**
 * Reads a table of states: CSV with a header.
 *
 * One column of time, `tdb` (ISO 8601 or `JD …`), `tdbSeconds` (past J2000) or `utc`; then `xKm`, `yKm`, `zKm` and, where there are velocities,
 * `vxKmS`, `vyKmS`, `vzKmS`, in axes that do not turn. Rows in order of time. Other columns, and lines that begin with `#`, are left out.
 *
 * @param text the file
 * @throws ApsidaryError `bad-input`, in one line that names the row
 */
export function parseTableFile(text: string): TableFile {
  const { fields, rows: data } = csvRecords(text, requireHeader);
  const timeName = TIME.find((name) => fields.includes(name));
  const some = VELOCITY.filter((name) => fields.includes(name));
  const times = new Float64Array(data.length);
  const positions = new Float64Array(3 * data.length);
  const velocities = some.length === 3 ? new Float64Array(3 * data.length) : null;
  let [km, kmS] = [0, 0];
  data.forEach((row, i) => {
    const number = (name: string): number => {
      const cell = (row[name] ?? "").trim();
      const value = cell === "" ? Number.NaN : Number(cell);
      if (Number.isFinite(value)) return value;
      throw bad(`row ${i + 1} of the table: ${name} is ${JSON.stringify(cell.slice(0, 40))}, no number.`);
    };
    times[i] =
      timeName === "tdbSeconds"
        ? number("tdbSeconds")
        : trackTime(
            row[timeName as string] ?? "",
            timeName === "utc" ? "utc" : "tdb",
            `row ${i + 1} of the table: ${timeName}`,
          ).tdb;
    POSITION.forEach((name, axis) => {
      positions[3 * i + axis] = number(name);
      km = Math.max(km, digitHalfWidth(row[name] ?? "", number(name)));
    });
    if (!velocities) return;
    VELOCITY.forEach((name, axis) => {
      velocities[3 * i + axis] = number(name);
      kmS = Math.max(kmS, digitHalfWidth(row[name] ?? "", number(name)));
    });
  });
  return { times, positions, velocities, digits: { km, kmS } };
}

/** Refuses a header that lacks a column. */
function requireHeader(fields: readonly string[]): void {
  const timeName = TIME.find((name) => fields.includes(name));
  const missing = [...(timeName ? [] : ["tdb"]), ...POSITION].find((name) => !fields.includes(name));
  if (missing) {
    const near = nearestName(missing, fields);
    throw bad(
      `the table has no column ${missing}${near ? ` (there is ${JSON.stringify(near.slice(0, 40))})` : ""}; ` +
        `its header must be of ${KNOWN.join(", ")}: one of the first three, the positions, and all velocities or none.`,
    );
  }
  const some = VELOCITY.filter((name) => fields.includes(name));
  if (some.length > 0 && some.length < 3)
    throw bad(`the table has ${some.join(", ")}, but not all of ${VELOCITY.join(", ")}.`);
}
