import { ApsidaryError } from "../error.ts";
import { csvRecords } from "./csv-records.ts";
import type { ElementsGiven } from "./elements.ts";

const bad = (message: string) => new ApsidaryError("bad-input", message);
/** Orbits in a file at the most. */
const MOST = 1000;
/** What stands before the name of a field in a column of half-widths. */
const WIDTH = "uncertainty.";

/**
 * Reads a file of osculating elements.
 *
 * JSON: one object as `ElementsGiven` has it, or an array of them. CSV: a header with the same names, a row for each orbit; half-widths stand in
 * columns such as `uncertainty.eccentricity`; an empty cell is not given. Lines that begin with `#` are left out.
 *
 * @param text the file
 * @returns the elements, unread as yet
 * @throws ApsidaryError `bad-input`, in one line
 */
export function parseElementsFile(text: string): ElementsGiven[] {
  const body = text.replace(/^\uFEFF/, "").trim();
  if (body === "") throw bad("the file is empty; it needs elements as JSON, or as CSV with a header.");
  const given = /^[[{]/.test(body) ? fromJson(body) : fromCsv(body);
  if (given.length === 0) throw bad("the file holds no elements.");
  if (given.length > MOST) throw bad(`the file holds ${given.length} orbits; ${MOST} at the most.`);
  const names = new Set<unknown>();
  for (const { name } of given) {
    if (names.has(name)) throw bad(`two orbits are called ${JSON.stringify(name)}; give each a name of its own.`);
    names.add(name);
  }
  return given;
}

function fromJson(body: string): ElementsGiven[] {
  let value: unknown;
  try {
    value = JSON.parse(body);
  } catch (error) {
    throw bad(`it is no JSON (${error instanceof Error ? error.message.replace(/\s+/g, " ").slice(0, 80) : "?"}).`);
  }
  const list = Array.isArray(value) ? value : [value];
  for (const item of list) {
    if (typeof item === "object" && item !== null && !Array.isArray(item)) continue;
    throw bad(`elements are an object such as { "name": "probe-earth", … }, not ${JSON.stringify(item).slice(0, 40)}.`);
  }
  return list as ElementsGiven[];
}

function fromCsv(body: string): ElementsGiven[] {
  const { rows } = csvRecords(body, (fields) => {
    if (!fields.includes("name")) throw bad("it is neither JSON nor a CSV with a header that has a column `name`.");
  });
  return rows.map((row) => {
    const given: Record<string, unknown> = {};
    const uncertainty: Record<string, string> = {};
    for (const [name, value] of Object.entries(row)) {
      if (value === "") continue;
      if (name.startsWith(WIDTH)) uncertainty[name.slice(WIDTH.length)] = value;
      else given[name] = value;
    }
    return { ...given, uncertainty } as unknown as ElementsGiven;
  });
}
