import { ApsidaryError } from "../error.ts";
import { parseIso } from "../time/parse-iso.ts";
import { tdbOfUtc } from "../time/tdb-of-utc.ts";
import type { MeanElements } from "./mean-elements.ts";
import { inRange } from "./tle-file.ts";

/** Messages in a file at the most. */
const MOST = 1000;

const bad = (message: string) => new ApsidaryError("bad-input", message);

type Fields = ReadonlyMap<string, string>;

/**
 * Reads orbit mean-elements messages (OMM): XML, `KEY = VALUE` lines, or JSON with the same keys.
 *
 * Read are the elements that SGP4 takes; messages of another theory, centre or time system are refused.
 *
 * @param text the file, of one message or several
 * @throws ApsidaryError `bad-input`, in one line
 *
 * Layout: CCSDS 502.0-B, *Orbit Data Messages*, section 4 (from memory).
 */
export function parseOmmFile(text: string): MeanElements[] {
  const body = text.replace(/^\uFEFF/, "").trim();
  if (body === "") throw bad("the file is empty; it needs an orbit mean-elements message.");
  const messages = body.startsWith("<") ? fromXml(body) : /^[[{]/.test(body) ? fromJson(body) : fromLines(body);
  if (messages.length === 0) throw bad("the file holds no orbit mean-elements message.");
  if (messages.length > MOST) throw bad(`the file holds ${messages.length} messages; ${MOST} at the most.`);
  return messages.map((fields, i) => elementsOf(fields, messages.length > 1 ? `message ${i + 1}` : "the message"));
}

function fromXml(body: string): Fields[] {
  if (/<!(DOCTYPE|ENTITY)/i.test(body)) throw bad("the XML declares entities, which a message has no use for.");
  const bodies = [...body.matchAll(/<omm[\s>][\s\S]*?<\/omm>/g)].map(([message]) => message);
  if (bodies.length === 0) throw bad("the XML holds no <omm> … </omm>.");
  return bodies.map((message) => {
    const fields = new Map<string, string>();
    for (const [, key = "", value = ""] of message.matchAll(/<([A-Z_0-9]+)(?:\s[^<>]*)?>([^<>]*)<\/\1>/g)) {
      put(fields, key, decoded(value));
    }
    return fields;
  });
}

function decoded(text: string): string {
  const names: Record<string, string> = { amp: "&", lt: "<", gt: ">", quot: '"', apos: "'" };
  return text.replace(/&(amp|lt|gt|quot|apos);/g, (_, name: string) => names[name] ?? "").trim();
}

function fromJson(body: string): Fields[] {
  let value: unknown;
  try {
    value = JSON.parse(body);
  } catch (error) {
    throw bad(`it is no JSON (${error instanceof Error ? error.message.replace(/\s+/g, " ").slice(0, 80) : "?"}).`);
  }
  return (Array.isArray(value) ? value : [value]).map((item) => {
    if (typeof item !== "object" || item === null)
      throw bad("a message in JSON is an object with the keys of the standard.");
    const fields = new Map<string, string>();
    for (const [key, cell] of Object.entries(item)) {
      if (typeof cell === "string" || typeof cell === "number") put(fields, key, String(cell).trim());
    }
    return fields;
  });
}

function fromLines(body: string): Fields[] {
  const messages: Map<string, string>[] = [];
  body.split(/\r\n|\n|\r/).forEach((line, i) => {
    const match = /^\s*([A-Z_0-9]+)\s*=\s*(.*?)\s*(?:\[[^\]]*\])?\s*$/.exec(line);
    if (!match) {
      if (line.trim() === "" || /^\s*COMMENT\b/.test(line)) return;
      throw bad(`line ${i + 1} is no KEY = VALUE: ${JSON.stringify(line.trim().slice(0, 40))}.`);
    }
    const [, key = "", value = ""] = match;
    if (key === "CCSDS_OMM_VERS" || messages.length === 0) messages.push(new Map());
    put(messages.at(-1) as Map<string, string>, key, value);
  });
  return messages;
}

function put(fields: Map<string, string>, key: string, value: string): void {
  if (fields.has(key) && fields.get(key) !== value && READ.includes(key))
    throw bad(`${key} stands twice in a message.`);
  fields.set(key, value);
}

const READ: readonly string[] = [
  "EPOCH",
  "MEAN_MOTION",
  "ECCENTRICITY",
  "INCLINATION",
  "RA_OF_ASC_NODE",
  "ARG_OF_PERICENTER",
  "MEAN_ANOMALY",
  "BSTAR",
];

function elementsOf(fields: Fields, where: string): MeanElements {
  const only = (key: string, allowed: RegExp, words: string): void => {
    const value = fields.get(key);
    if (value === undefined || allowed.test(value)) return;
    throw bad(`${where}: ${key} is ${JSON.stringify(value.slice(0, 40))}; it must be ${words}.`);
  };
  only("MEAN_ELEMENT_THEORY", /^(SGP4|SGP\/SGP4|SGP)$/i, "SGP4 or SGP/SGP4");
  only("CENTER_NAME", /^EARTH$/i, "EARTH");
  only("TIME_SYSTEM", /^UTC$/i, "UTC");
  const text = (key: string): string => {
    const value = fields.get(key);
    if (value === undefined || value === "") throw bad(`${where}: ${key} is missing.`);
    return value;
  };
  const number = (key: string): number => {
    const value = text(key);
    const plain = /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d{1,3})?$/.test(value) ? Number(value) : Number.NaN;
    if (Number.isFinite(plain)) return plain;
    throw bad(`${where}: ${key} is ${JSON.stringify(value.slice(0, 40))}, no number.`);
  };
  return inRange(
    {
      objectName: fields.get("OBJECT_NAME") || null,
      objectId: fields.get("NORAD_CAT_ID") || fields.get("OBJECT_ID") || null,
      epochTdb: epochOf(text("EPOCH"), where),
      meanMotion: number("MEAN_MOTION"),
      eccentricity: number("ECCENTRICITY"),
      inclination: number("INCLINATION"),
      node: number("RA_OF_ASC_NODE"),
      argument: number("ARG_OF_PERICENTER"),
      meanAnomaly: number("MEAN_ANOMALY"),
      bstar: fields.has("BSTAR") ? number("BSTAR") : 0,
    },
    where,
  );
}

function epochOf(text: string, where: string): number {
  try {
    const { day, secondsOfDay } = parseIso(text);
    return tdbOfUtc(day, secondsOfDay);
  } catch (error) {
    if (!(error instanceof ApsidaryError)) throw error;
    throw bad(`${where}: EPOCH is ${JSON.stringify(text.slice(0, 40))}; write 2026-03-01T12:00:00.123456.`);
  }
}
