import type { ApsisKind } from "../bodies/term.ts";

/** A kind of passage as a list names it, with the body that the word itself implies. */
export interface PublishedKind {
  readonly kind: ApsisKind;
  /** `sun` or `earth` where the word means an apsis about it. */
  readonly about: "sun" | "earth" | null;
}

const WORD =
  /\b(?:(perihel(?:ion|ia|ium)?)|(aphel(?:ion|ia|ium)?)|(perig(?:ee|ees|eum)?)|(apog(?:ee|ees|eum)?)|(peri(?:apsis|apse|centre|center|apses)?)|(apo(?:apsis|apse|centre|center|apses)?)|(min(?:imum)?|nearest|closest|least|local minimum of distance)|(max(?:imum)?|farthest|furthest|greatest|local maximum of distance))\b/i;

const KINDS: readonly PublishedKind[] = Object.freeze([
  { kind: "periapsis", about: "sun" },
  { kind: "apoapsis", about: "sun" },
  { kind: "periapsis", about: "earth" },
  { kind: "apoapsis", about: "earth" },
  { kind: "periapsis", about: null },
  { kind: "apoapsis", about: null },
  { kind: "periapsis", about: null },
  { kind: "apoapsis", about: null },
]);

/** Gives the kind of passage that a text names first, or `null`. */
export function readKind(given: string): PublishedKind | null {
  const found = WORD.exec(given);
  if (!found) return null;
  return KINDS[found.slice(1).findIndex((part) => part !== undefined)] ?? null;
}

/** Gives the text with the word for one kind replaced by the word for the other, in the same spelling; unchanged where it has none. */
export function otherKindWord(given: string): string {
  const found = WORD.exec(given);
  if (!found) return given;
  const word = found[0];
  const swapped = swappedWord(word.toLowerCase());
  const like =
    word === word.toUpperCase()
      ? swapped.toUpperCase()
      : /^[A-Z]/.test(word)
        ? swapped.slice(0, 1).toUpperCase() + swapped.slice(1)
        : swapped;
  return given.slice(0, found.index) + like + given.slice(found.index + word.length);
}

const STEMS: readonly (readonly [string, string])[] = [
  ["perihel", "aphel"],
  ["perig", "apog"],
  ["peri", "apo"],
  ["minimum", "maximum"],
  ["min", "max"],
  ["nearest", "farthest"],
  ["closest", "farthest"],
  ["least", "greatest"],
];

function swappedWord(word: string): string {
  for (const [near, far] of STEMS) {
    if (word.startsWith(near)) return far + word.slice(near.length);
    if (word.startsWith(far)) return near + word.slice(far.length);
  }
  return word.includes("minimum") ? word.replace("minimum", "maximum") : word.replace("maximum", "minimum");
}
