import { ApsidaryError } from "../error.ts";
import { nearestName } from "../nearest-name.ts";

/**
 * Gives the value of an option that takes one of a few words.
 *
 * @param option  as the user writes it: `--format`
 * @param given   what was given
 * @param allowed the words
 * @throws ApsidaryError `bad-option`, with the nearest word
 */
export function choiceOf<Word extends string>(option: string, given: string, allowed: readonly Word[]): Word {
  const word = allowed.find((candidate) => candidate === given);
  if (word !== undefined) return word;
  const near = nearestName(given, allowed);
  throw new ApsidaryError(
    "bad-option",
    `${option} ${shown(given)} is unknown${near ? `; did you mean ${near}?` : "."} Allowed: ${allowed.join(", ")}.`,
  );
}

/** What the user wrote, in quotes where it would not stand for itself. */
export function shown(given: string): string {
  const short = given.length > 80 ? `${given.slice(0, 80)}…` : given;
  return /^[\w.,:+/-]+$/.test(short) ? short : JSON.stringify(short);
}
