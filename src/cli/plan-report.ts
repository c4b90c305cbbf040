import type { Nearness } from "../passages/near-window.ts";
import type { MatchedPair } from "../planning/matched-pairs.ts";
import type { PlanSite } from "../planning/plan-options.ts";
import type { PlanRow, WhyNoRise, WhyNoTransit, WhyNot } from "../planning/plan-row.ts";
import { groupedNumber } from "../report/grouped-number.ts";
import { printedHalfWidth } from "../report/half-width.ts";
import { printedTime } from "../report/printed-time.ts";
import { printedUnit } from "../report/printed-unit.ts";
import { wrapped } from "../report/wrapped.ts";
import { zoneOf } from "../time/zone-of.ts";
import { cautionsOf } from "./cautions.ts";
import { footOf } from "./foot.ts";
import { clockOf, printedUtc } from "./printed-utc.ts";
import type { Provenance } from "./provenance.ts";

/** What a report says besides its rows. */
export interface PlanReport {
  readonly title: string;
  readonly made: Provenance;
  readonly sites: readonly PlanSite[];
  readonly heightAssumed: boolean;
  readonly matched: readonly MatchedPair[] | null;
  readonly within: Nearness;
  readonly minAltitudeDeg: number;
  readonly darkBelowDeg: number;
  readonly refraction: boolean;
  readonly windowDays: number;
}

const REASONS: Record<WhyNot | WhyNoRise | WhyNoTransit, string> = {
  "never-up": "it is never up",
  "never-dark": "the sky never gets dark",
  "up-only-while-bright": "it is up only while the sky is bright",
  "no-data": "the sources end too near",
  "stays-up": "it stays up",
  "stays-down": "it stays down",
  pole: "a pole has no meridian",
};
/** What hangs on the Earth's turning is told by the clock that turns with it: an error of that clock moves it only as far as the body, at most the Moon, moves on. */
const SKY_SHARE = 25;
/** Windows that are written out. */
const MOST_WINDOWS = 8;

/**
 * Writes a plan as a report for people, a paragraph for each passage, and a foot that explains what stands in them.
 *
 * @param rows taken one at a time
 */
export function* planReport(rows: Iterable<PlanRow>, report: PlanReport): Generator<string, void, undefined> {
  const { made, sites, matched } = report;
  yield `${report.title}\n`;
  if (report.heightAssumed) yield "No height is given for the site; 0 m is taken.\n";
  let site = "";
  let count = 0;
  let deltaT = false;
  let zones = false;
  const cautions = new Set<string>();
  for (const row of rows) {
    count++;
    deltaT ||= row.utcBasis === "delta-t";
    zones ||= row.zone !== null;
    for (const caution of cautionsOf(row)) cautions.add(caution);
    if (row.site !== site) {
      site = row.site;
      yield `\nSite ${site}${row.zone === null ? "" : `, times in ${row.zone}`}\n`;
    }
    yield `\n${paragraph(row)}`;
  }
  yield count === 0 ? "\nNo passage in this span.\n\n" : "\n";
  if (matched) yield* matchedText(matched, sites[0]);
  if (count > 0) for (const line of explanations(report)) yield wrapped(line);
  for (const caution of cautions) yield wrapped(caution);
  yield wrapped(
    "Never point optics at or near the Sun without a certified solar filter. The observatory's own rules decide what may be observed when.",
  );
  yield footOf(made, { deltaT, zones });
}

function paragraph(row: PlanRow): string {
  const scaleSeconds = Math.sqrt(Math.max(0, row.utcUncertaintySeconds ** 2 - row.timeUncertaintySeconds ** 2));
  const ofDistance = (utc: string) => utc === row.nearFromUtc || utc === row.nearToUtc;
  const when = (utc: string, seconds = ofDistance(utc) ? scaleSeconds : scaleSeconds / SKY_SHARE) =>
    timeIn(row.zone, utc, seconds);
  /** Without the date where it is the passage's own. */
  const near = (utc: string | null, why: string | null) => {
    if (utc === null) return `none (${REASONS[why as keyof typeof REASONS] ?? "the sources end"})`;
    const text = when(utc);
    const day = when(row.utc).slice(0, 10);
    return text.length > 10 && text.startsWith(day) ? text.slice(11) : text;
  };
  const degrees = (value: number) => `${value.toFixed(1)}°`;
  const size = (value: number | null) => (value === null ? "" : `, ${value.toFixed(value < 1 ? 3 : 2)}′ wide`);
  const { digits } = printedHalfWidth(Math.max(row.distanceUncertaintyKm, 1));
  const km = (value: number) => `${groupedNumber(value, Math.min(digits, 0))} km`;
  const marks = row.rank === "secondary" ? ", secondary" : "";
  const state = row.up ? (row.dark === false ? "up, in a bright sky" : "up") : "down";
  const lit = row.illuminatedFraction === null ? "" : `, ${Math.round(100 * row.illuminatedFraction)} % lit`;
  const own = row.topocentricLeastUtc ?? row.topocentricGreatestUtc;
  const indent = (text: string) => wrapped(text, 100, "     ", "  ");
  const lines = [
    `${when(row.utc, row.utcUncertaintySeconds)}  ${row.term}${marks}, ${km(row.distanceKm)} from centre to centre\n`,
    indent(
      `${state}: altitude ${degrees(row.altitudeDeg)}, azimuth ${degrees(row.azimuthDeg)}, Sun ${degrees(row.sunAltitudeDeg)}; ` +
        `${km(row.topocentricDistanceKm)} from the site${size(row.diameterArcmin)}${lit}`,
    ),
  ];
  if (own !== null && row.topocentricExtremeKm !== null) {
    const which = row.topocentricLeastUtc === null ? "greatest" : "least";
    lines.push(indent(`the site's own ${which} distance: ${near(own, null)}, ${km(row.topocentricExtremeKm)}`));
  }
  lines.push(
    indent(
      `rise ${near(row.riseUtc, row.whyNoRise)}, transit ${near(row.transitUtc, row.whyNoTransit)}, set ${near(row.setUtc, row.whyNoRise)}`,
    ),
  );
  lines.push(
    indent(
      row.bestUtc === null || row.bestAltitudeDeg === null
        ? `best within a day: none (${REASONS[row.whyNoBest ?? "no-data"]})`
        : `best within a day: ${when(row.bestUtc)}, altitude ${degrees(row.bestAltitudeDeg)}${size(row.bestDiameterArcmin)}`,
    ),
  );
  const open = row.whyNoNear === "stays-near" ? "(more than ten periods)" : "(the sources end)";
  const edge = (utc: string | null) => (utc === null ? open : when(utc));
  const hours = row.windows.reduce((sum, { fromUtc, toUtc }) => sum + clockOf(toUtc) - clockOf(fromUtc), 0) / 3_600_000;
  const listed = row.windows
    .slice(0, MOST_WINDOWS)
    .map(({ fromUtc, toUtc }) => `${when(fromUtc)} to ${when(toUtc).replace(when(fromUtc).slice(0, 11), "")}`);
  const more = row.windows.length > MOST_WINDOWS ? [`and ${row.windows.length - MOST_WINDOWS} more`] : [];
  const cut = row.windowsCut ? " (not looked for over all of it)" : "";
  lines.push(
    indent(`near ${edge(row.nearFromUtc)} to ${edge(row.nearToUtc)}`),
    indent(
      row.windows.length === 0
        ? `windows: none${cut} (${REASONS[row.whyNot ?? "no-data"]})`
        : `windows${cut}, ${hours.toFixed(1)} h: ${[...listed, ...more].join("; ")}`,
    ),
  );
  return lines.join("");
}

function* matchedText(matched: readonly MatchedPair[], site: PlanSite | undefined): Generator<string, void, undefined> {
  yield "Pictures to set side by side, near and far, the greatest ratio of diameters first:\n";
  if (matched.length === 0) yield "  none: there must be a periapsis and an apoapsis that can be observed.\n";
  for (const it of matched) {
    const when = (utc: string) => timeIn(site?.zone ?? null, utc, 0);
    const phase = it.phaseDifferenceDeg === null ? "" : `, phases ${it.phaseDifferenceDeg.toFixed(1)}° apart`;
    yield wrapped(
      `${when(it.nearPictureUtc)} and ${when(it.farPictureUtc)}: ${it.diameterRatio.toFixed(3)} times as wide${phase}, ` +
        `altitudes ${it.nearAltitudeDeg.toFixed(1)}° and ${it.farAltitudeDeg.toFixed(1)}°`,
      100,
      "     ",
      "  ",
    );
  }
  yield "\n";
}

function explanations({ within, minAltitudeDeg, darkBelowDeg, refraction, windowDays, sites }: PlanReport): string[] {
  const limit = "km" in within ? `${within.km} km` : `${within.percent} %`;
  const low = sites.some(({ heightM }) => heightM < 0);
  return [
    `Near: within ${limit} of the extreme distance. Up: centre above ${minAltitudeDeg}°. Dark: Sun's centre below ${darkBelowDeg}° (of the Sun itself this does not count). ` +
      `Windows: near, up and dark, looked for within ${windowDays} d of the passage, at most one period.`,
    `Altitude and azimuth (from north through east) are of the apparent place from the site by WGS 84, ${refraction ? "lifted by standard air" : "without refraction"}; the Sun's always without. ` +
      "Rise and set: the centre through altitude 0, of the stay above the horizon at the passage or nearest to it.",
    "The passage belongs to the distance from centre to centre; distance and width from the site are topocentric.",
    ...(low ? ["A site below the sea has no dip of the horizon; its level horizon is used like any other's."] : []),
  ];
}

/** An instant in a zone (`null`: UTC), to the unit that its uncertainty defends. */
function timeIn(zone: string | null, utc: string, uncertaintySeconds: number): string {
  if (zone === null) return printedUtc(utc, uncertaintySeconds);
  const unit = printedUnit(uncertaintySeconds);
  const clock = clockOf(utc);
  return printedTime(clock + zoneOf(zone).offset(clock) * 60_000, unit) + (unit === "hour" ? "h" : "");
}
