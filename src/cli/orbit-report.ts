import { AU_KM, DAY_SECONDS } from "../bodies/constants.ts";
import { terms } from "../orbit/terms.ts";
import type { Column } from "../report/column.ts";
import { groupedNumber } from "../report/grouped-number.ts";
import { textTable } from "../report/text-table.ts";
import { wrapped } from "../report/wrapped.ts";
import type { OrbitRow } from "./orbit-row.ts";
import { version } from "./version.ts";

interface Line {
  readonly what: string;
  readonly value: number | null;
  readonly decimals: number;
  readonly unit: string;
  readonly also: string;
}

/** Significant digits that are printed, decimals permitting. */
const DIGITS = 10;

const COLUMNS: readonly Column<Line>[] = [
  { title: "", unit: "", values: ({ what }) => what, digits: 0 },
  { title: "", unit: "", values: ({ value }) => value, digits: ({ value, decimals }) => digitsOf(value, decimals) },
  { title: "", unit: "", values: ({ value, unit }) => (value === null ? "" : unit), digits: 0 },
  { title: "", unit: "", values: ({ also }) => also, digits: 0 },
];

/**
 * Writes an orbit as a report for people, line by line: its measures, each body's share, and what a reader must know of them.
 *
 * @param title what was given
 * @param row   the orbit
 */
export function* orbitReport(title: string, row: OrbitRow): Generator<string, void, undefined> {
  yield wrapped(title, 100, "  ");
  yield "\n";
  yield* table(measuresOf(row));
  if (row.shares) {
    yield "\nBoth bodies about the barycentre\n\n";
    yield* table(sharesOf(row));
  }
  yield "\n";
  for (const line of notesOf(row)) yield wrapped(line, 100, "  ");
  yield `apsidary ${version}.\n`;
}

function* table(lines: readonly Line[]): Generator<string, void, undefined> {
  let header = true;
  for (const line of textTable(COLUMNS, lines)) {
    if (!header) yield line;
    header = false; // the columns have no titles: their line is empty
  }
}

function measuresOf(row: OrbitRow): Line[] {
  const length = (what: string, km: number | null): Line => {
    const au = km === null ? 0 : Math.abs(km) / AU_KM;
    const also = km !== null && au >= 0.01 ? `${groupedNumber(km / AU_KM, digitsOf(au, 9))} au` : "";
    return { what, value: km, decimals: 3, unit: "km", also };
  };
  const speed = (what: string, value: number | null): Line => ({ what, value, decimals: 9, unit: "km/s", also: "" });
  const heights =
    row.equatorialRadiusKm === null
      ? []
      : [
          length(`height at ${row.periapsisTerm}`, row.periapsisHeightKm),
          ...(row.apoapsisKm === null ? [] : [length(`height at ${row.apoapsisTerm}`, row.apoapsisHeightKm)]),
        ];
  const far = row.apoapsisKm !== null;
  return [
    length(`${row.periapsisTerm}, distance`, row.periapsisKm),
    ...(far ? [length(`${row.apoapsisTerm}, distance`, row.apoapsisKm)] : []),
    ...heights,
    { what: "eccentricity", value: row.eccentricity, decimals: 12, unit: "", also: "" },
    length("semi-major axis", row.semiMajorAxisKm),
    length("semi-minor axis", row.semiMinorAxisKm),
    length("semi-latus rectum", row.semiLatusRectumKm),
    speed(`speed at ${row.periapsisTerm}`, row.periapsisSpeedKmS),
    ...(far ? [speed(`speed at ${row.apoapsisTerm}`, row.apoapsisSpeedKmS)] : []),
    ...(far ? [speed("speed on the circle", row.circularSpeedKmS), speed("mean speed", row.meanSpeedKmS)] : []),
    ...(row.periodSeconds === null
      ? []
      : [{ what: "period", value: row.periodSeconds, decimals: 3, unit: "s", also: inWords(row.periodSeconds) }]),
    { what: "specific energy", value: row.specificEnergyKm2S2, decimals: 9, unit: "km²/s²", also: "" },
    { what: "angular momentum", value: row.angularMomentumKm2S, decimals: 6, unit: "km²/s", also: "" },
    { what: "gravitational parameter", value: row.gravitationalParameterKm3S2, decimals: 6, unit: "km³/s²", also: "" },
  ];
}

function sharesOf({ shares, periapsisTerm, apoapsisTerm }: OrbitRow): Line[] {
  if (!shares) return [];
  return [shares.larger, shares.smaller].flatMap((body): Line[] => [
    { what: `${body.name}: part of the distance`, value: body.share, decimals: 12, unit: "", also: "" },
    { what: `  at ${periapsisTerm}`, value: body.periapsisKm, decimals: 3, unit: "km", also: "" },
    ...(body.apoapsisKm === null
      ? []
      : [{ what: `  at ${apoapsisTerm}`, value: body.apoapsisKm, decimals: 3, unit: "km", also: "" }]),
    { what: `  speed at ${periapsisTerm}`, value: body.periapsisSpeedKmS, decimals: 9, unit: "km/s", also: "" },
    ...(body.apoapsisSpeedKmS === null
      ? []
      : [{ what: `  speed at ${apoapsisTerm}`, value: body.apoapsisSpeedKmS, decimals: 9, unit: "km/s", also: "" }]),
  ]);
}

function notesOf(row: OrbitRow): string[] {
  const notes = row.remarks.map((remark) => `${remark.charAt(0).toUpperCase()}${remark.slice(1)}`);
  if (row.equatorialRadiusKm !== null)
    notes.push(
      `Heights are above ${groupedNumber(row.equatorialRadiusKm, decimalsOf(row.equatorialRadiusKm))} km (${row.radiusSource}).`,
    );
  if (row.circularSpeedKmS !== null) {
    notes.push(
      "The speed on the circle is √(μ/a), the geometric mean of the speeds at the apsides; the mean speed is circumference over period.",
    );
  } else {
    notes.push("An open orbit passes its nearest point once: it has no far apsis, no period and no mean speed.");
  }
  if (row.shares) notes.push(sharesNote(row.shares));
  const { common, rare } = terms(row.about ?? "other");
  if (common && rare.length > 0) {
    notes.push(`Also met with, rarely: ${rare.map((it) => `${it.nearest} and ${it.farthest}`).join("; ")}.`);
  }
  notes.push("Two bodies alone: no pull of others, no flattening, no air.");
  return notes;
}

function sharesNote({ massRatio, larger, barycentreInsideLarger }: NonNullable<OrbitRow["shares"]>): string {
  const ratio = `The masses are as ${Number(massRatio.toPrecision(8))} to 1`;
  const where = {
    always: `the barycentre stays inside ${larger.name}`,
    never: `the barycentre stays outside ${larger.name}`,
    "near periapsis": `the barycentre is inside ${larger.name} near periapsis only`,
  };
  return barycentreInsideLarger === null ? `${ratio}.` : `${ratio}; ${where[barycentreInsideLarger]}.`;
}

function inWords(seconds: number): string {
  if (seconds < 7200) return `${groupedNumber(seconds / 60, 4)} min`;
  if (seconds < 3 * DAY_SECONDS) return `${groupedNumber(seconds / 3600, 6)} h`;
  const years = seconds / (365.25 * DAY_SECONDS);
  return years < 2 ? `${groupedNumber(seconds / DAY_SECONDS, 6)} d` : `${groupedNumber(years, 6)} Julian years`;
}

/** Decimals that a number is written with. */
function decimalsOf(value: number): number {
  return Math.min(6, (String(value).split(".")[1] ?? "").length);
}

function digitsOf(value: number | null, decimals: number): number {
  if (value === null || value === 0) return Math.min(decimals, 3);
  return Math.max(0, Math.min(decimals, DIGITS - 1 - Math.floor(Math.log10(Math.abs(value)))));
}
