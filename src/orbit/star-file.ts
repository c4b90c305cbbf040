import { ApsidaryError } from "../error.ts";
import type { StarGiven } from "./star.ts";

/** Orbits in a file at the most. */
const MOST = 1000;

/**
 * Reads a file of binary stars: JSON, one object as `StarGiven` has it or an array of them.
 *
 * @throws ApsidaryError `bad-input`, in one line
 */
export function parseStarFile(text: string): StarGiven[] {
  let value: unknown;
  try {
    value = JSON.parse(text.replace(/^\uFEFF/, ""));
  } catch (error) {
    const why = error instanceof Error ? error.message.replace(/\s+/g, " ").slice(0, 80) : "?";
    throw new ApsidaryError("bad-input", `it is no JSON (${why}).`);
  }
  const list = Array.isArray(value) ? value : [value];
  if (list.length === 0 || list.length > MOST) {
    throw new ApsidaryError("bad-input", `the file holds ${list.length} stars; it needs 1 to ${MOST}.`);
  }
  return list as StarGiven[];
}
