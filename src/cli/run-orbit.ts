import type { BodyName } from "../bodies/physical.ts";
import { orbitFrom } from "../orbit/orbit-from.ts";
import type { OrbitGiven } from "../orbit/orbit-given.ts";
import { jsonAnswer } from "../report/json-answer.ts";
import { choiceOf, shown } from "./choice-of.ts";
import { ORBIT_FORMATS, type OrbitOptions } from "./orbit.ts";
import { orbitReport } from "./orbit-report.ts";
import { ORBIT_NUMBERS, type OrbitRow, orbitRow } from "./orbit-row.ts";
import { version } from "./version.ts";
import { writeAnswer } from "./write-answer.ts";

/** What each option tells, in the order of the title. */
const GIVEN: readonly (readonly [keyof OrbitOptions, keyof OrbitGiven, string])[] = [
  ["about", "about", "about"],
  ["companion", "companion", "with"],
  ["radius", "equatorialRadiusKm", "equatorial radius"],
  ["gm", "gravitationalParameterKm3S2", "gravitational parameter"],
  ["periapsis", "periapsisKm", "periapsis"],
  ["apoapsis", "apoapsisKm", "apoapsis"],
  ["periapsisHeight", "periapsisHeightKm", "periapsis height"],
  ["apoapsisHeight", "apoapsisHeightKm", "apoapsis height"],
  ["semiMajorAxis", "semiMajorAxisKm", "semi-major axis"],
  ["semiMinorAxis", "semiMinorAxisKm", "semi-minor axis"],
  ["semiLatusRectum", "semiLatusRectumKm", "semi-latus rectum"],
  ["eccentricity", "eccentricity", "eccentricity"],
  ["periapsisSpeed", "periapsisSpeedKmS", "periapsis speed"],
  ["apoapsisSpeed", "apoapsisSpeedKmS", "apoapsis speed"],
  ["period", "periodSeconds", "period"],
  ["energy", "specificEnergyKm2S2", "energy"],
  ["angularMomentum", "angularMomentumKm2S", "angular momentum"],
];

/**
 * Answers `apsidary orbit`.
 *
 * @param options the options, as given
 * @throws ApsidaryError for whatever cannot be used, before anything is written
 */
export async function runOrbit(options: OrbitOptions): Promise<void> {
  const format = choiceOf("--format", options.format ?? "text", ORBIT_FORMATS);
  const row = orbitRow(orbitFrom(givenOf(options)));
  await writeAnswer(await piecesOf(format, row, options), options.out);
}

function givenOf(options: OrbitOptions): OrbitGiven {
  const given: Record<string, string> = {};
  for (const [option, field] of GIVEN) {
    const value = options[option];
    if (value !== undefined) given[field] = value;
  }
  return given as OrbitGiven & { about?: BodyName }; // `orbitFrom` refuses a body that it does not know
}

async function piecesOf(
  format: (typeof ORBIT_FORMATS)[number],
  row: OrbitRow,
  options: OrbitOptions,
): Promise<Iterable<string>> {
  switch (format) {
    case "json":
      return jsonAnswer({ schema: "apsidary/orbit/1", made: { program: "apsidary", version } }, [row]);
    case "csv": {
      const { csvLines } = await import("../report/csv-lines.ts");
      return csvLines(CSV_NAMES, [flat(row)]);
    }
    case "text":
      return orbitReport(titleOf(row, options), row);
  }
}

const SHARE_FIELDS = [
  "name",
  "share",
  "semiMajorAxisKm",
  "periapsisKm",
  "apoapsisKm",
  "periapsisSpeedKmS",
  "apoapsisSpeedKmS",
] as const;

/** The columns of the CSV: the names of the JSON, those of the shares by their path, lists joined. */
const CSV_NAMES: readonly string[] = [
  "conic",
  "about",
  "periapsisTerm",
  "apoapsisTerm",
  ...ORBIT_NUMBERS,
  "equatorialRadiusKm",
  "radiusSource",
  ...SHARE_FIELDS.map((field) => `shares.larger.${field}`),
  ...SHARE_FIELDS.map((field) => `shares.smaller.${field}`),
  "shares.massRatio",
  "shares.barycentreInsideLarger",
  "illConditioned",
  "remarks",
];

function flat(row: OrbitRow): Record<string, string | number | null> {
  const { shares, illConditioned, remarks, ...plain } = row;
  const cells: Record<string, string | number | null> = {
    ...plain,
    "shares.massRatio": shares?.massRatio ?? null,
    "shares.barycentreInsideLarger": shares?.barycentreInsideLarger ?? null,
    illConditioned: illConditioned.join(" ") || null,
    remarks: remarks.join(" ") || null,
  };
  for (const field of SHARE_FIELDS) {
    cells[`shares.larger.${field}`] = shares?.larger[field] ?? null;
    cells[`shares.smaller.${field}`] = shares?.smaller[field] ?? null;
  }
  return cells;
}

function titleOf(row: OrbitRow, options: OrbitOptions): string {
  const parts = GIVEN.flatMap(([option, , words]) => {
    const value = options[option];
    return value === undefined || option === "about" ? [] : [`${words} ${shown(value)}`];
  });
  const about = row.about === null ? "" : ` about ${row.about}`;
  const kind = row.conic.charAt(0).toUpperCase() + row.conic.slice(1);
  return `${kind}${about} from ${parts.join(", ")}`;
}
