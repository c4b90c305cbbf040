import { ApsidaryError } from "../error.ts";
import { dayOfGregorian } from "../time/civil-calendar.ts";
import { tdbOfUtc } from "../time/tdb-of-utc.ts";
import type { MeanElements } from "./mean-elements.ts";

/** Sets in a file at the most. */
const MOST = 1000;

const bad = (message: string) => new ApsidaryError("bad-input", message);

/**
 * Reads two-line element sets, with or without a name on a line before them.
 *
 * Every set is held to its layout, its checksums and the numbers' ranges. Two digits of the year count from 1957 to 2056.
 *
 * @param text the file
 * @throws ApsidaryError `bad-input`, in one line that names the line
 *
 * Layout: F. R. Hoots and R. L. Roehrich, *Models for Propagation of NORAD Element Sets*, Spacetrack Report No. 3 (1980), and D. A. Vallado et al.,
 * *Revisiting Spacetrack Report #3*, AIAA 2006-6753 (from memory).
 */
export function parseTleFile(text: string): MeanElements[] {
  const lines = text.replace(/^\uFEFF/, "").split(/\r\n|\n|\r/);
  const sets: MeanElements[] = [];
  let name: string | null = null;
  for (let i = 0; i < lines.length; i++) {
    const line = (lines[i] ?? "").trimEnd();
    if (line.trim() === "" || line.startsWith("#")) continue;
    if (!/^1 /.test(line) || line.length < 60) {
      if (/^[12] /.test(line))
        throw bad(`line ${i + 1} is no first line of a set: ${JSON.stringify(line.slice(0, 40))}.`);
      if (name !== null) throw bad(`line ${i + 1} should be the first line of a set, which begins with "1 ".`);
      name = line.replace(/^0 /, "").trim().slice(0, 40);
      continue;
    }
    sets.push(setOf(line, (lines[i + 1] ?? "").trimEnd(), i + 1, name));
    if (sets.length > MOST) throw bad(`the file holds more than ${MOST} sets.`);
    name = null;
    i++;
  }
  if (sets.length === 0) throw bad('the file holds no two-line elements: no line begins with "1 ".');
  return sets;
}

function setOf(first: string, second: string, line: number, name: string | null): MeanElements {
  if (!/^2 /.test(second)) throw bad(`line ${line + 1} should be the second line of the set, which begins with "2 ".`);
  requireChecksum(first, line);
  requireChecksum(second, line + 1);
  const id = first.slice(2, 7).trim();
  if (id !== second.slice(2, 7).trim()) throw bad(`lines ${line} and ${line + 1} are of different objects.`);
  const number = (text: string, what: string, at: number): number => {
    const plain = text.trim();
    const value = /^[+-]?(\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : Number.NaN;
    if (Number.isFinite(value)) return value;
    throw bad(`line ${at}: the ${what} is ${JSON.stringify(plain.slice(0, 20))}, no number.`);
  };
  const year = number(first.slice(18, 20), "year", line);
  const days = number(first.slice(20, 32), "day of the year", line);
  if (!(days >= 1 && days < 367)) throw bad(`line ${line}: the day of the year is ${days}; it must be 1 to 366.`);
  const whole = Math.floor(days);
  const drag = /^([ +-])(\d{5})([+-]\d)$/.exec(first.slice(53, 61));
  if (!drag)
    throw bad(`line ${line}: the drag term is ${JSON.stringify(first.slice(53, 61))}; it is written as 28098-4.`);
  const eccentricity = second.slice(26, 33);
  if (!/^\d{7}$/.test(eccentricity))
    throw bad(`line ${line + 1}: the eccentricity is ${JSON.stringify(eccentricity)}.`);
  return inRange(
    {
      objectName: name,
      objectId: id,
      epochTdb: tdbOfUtc(dayOfGregorian(year < 57 ? 2000 + year : 1900 + year, 1, whole), (days - whole) * 86_400),
      meanMotion: number(second.slice(52, 63), "mean motion", line + 1),
      eccentricity: Number(`0.${eccentricity}`),
      inclination: number(second.slice(8, 16), "inclination", line + 1),
      node: number(second.slice(17, 25), "node", line + 1),
      argument: number(second.slice(34, 42), "argument of perigee", line + 1),
      meanAnomaly: number(second.slice(43, 51), "mean anomaly", line + 1),
      bstar: Number(`${drag[1] === "-" ? "-" : ""}0.${drag[2]}e${drag[3]}`),
    },
    `lines ${line} and ${line + 1}`,
  );
}

/** Refuses elements outside what SGP4 takes. @throws ApsidaryError `bad-input` */
export function inRange(set: MeanElements, where: string): MeanElements {
  const ranges: readonly (readonly [keyof MeanElements, string, number, number])[] = [
    ["meanMotion", "mean motion (revolutions a day)", 0.01, 18],
    ["eccentricity", "eccentricity", 0, 0.999999],
    ["inclination", "inclination (degrees)", 0, 180],
    ["node", "node (degrees)", -360, 360],
    ["argument", "argument of perigee (degrees)", -360, 360],
    ["meanAnomaly", "mean anomaly (degrees)", -360, 360],
    ["bstar", "drag term", -1, 1],
  ];
  for (const [field, words, least, most] of ranges) {
    const value = set[field] as number;
    if (value >= least && value <= most) continue;
    throw bad(`${where}: the ${words} is ${value}; it must be ${least} to ${most}.`);
  }
  return Object.freeze(set);
}

/** The last digit is the sum of all others and of the minus signs, without its tens. */
function requireChecksum(text: string, line: number): void {
  if (text.length < 69) throw bad(`line ${line} has ${text.length} characters; a line of elements has 69.`);
  let sum = 0;
  for (const sign of text.slice(0, 68)) sum += sign === "-" ? 1 : /\d/.test(sign) ? Number(sign) : 0;
  if (String(sum % 10) === text[68]) return;
  throw bad(`line ${line}: its checksum is ${text[68]}, its digits make ${sum % 10}; the line has been changed.`);
}
