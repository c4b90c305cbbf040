import { createHash } from "node:crypto";
import { gzipSync } from "node:zlib";
import { type SpkSegmentContent, writeSpk } from "../write-spk.ts";
import { fitError, makeFitter, type Path } from "./fit.ts";
import { SEGMENTS, type SegmentPlan } from "./segments.ts";
import { readTable, TABLE_SECONDS, TABLE_START, type TableReader } from "./table.ts";

/** Ratio of the masses of the Earth and the Moon in DE405. */
const EARTH_MOON_RATIO = 81.30056;

const COMMENTS = [
  "Positions of the Sun, the Moon and the planets from JPL's ephemeris DE405,",
  "refitted to longer Chebyshev records by the project Apsidary.",
  "",
  "Origin: E. M. Standish, JPL Planetary and Lunar Ephemerides, DE405/LE405,",
  "JPL Interoffice Memorandum 312.F-98-048 (1998), as given out in Debian's",
  "package casacore-data-jpl-de405 (2007.07.05+ds.1-1).",
  "Span: 1959-12-10 to 2060-01-30, JD 2436912.5 to 2473488.5 (TDB).",
  "Frame: ICRF (frame id 1). Time: TDB seconds past J2000. Unit: km.",
  "AU in DE405: 149597870.691 km. Earth/Moon mass ratio EMRAT: 81.30056.",
  "Refit: least squares on positions and velocities, both kept at record ends,",
  "within 1.4 m of DE405 (Mercury; the others within 0.8 m).",
  "Bodies 1 to 9 are the barycentres of the planets' systems.",
  "",
  "This file includes U.S. Government material: the ephemeris DE405 of the Jet",
  "Propulsion Laboratory. That material is in the public domain and is not",
  "subject to copyright protection (17 U.S.C. 403).",
];

function pathOf(table: TableReader, plan: SegmentPlan): Path {
  const { body } = plan;
  if (body !== "earth") return (from, offset, out) => table(body, from, offset, out);
  return (from, offset, out) => {
    table("moon", from, offset, out);
    for (let i = 0; i < 6; i++) out[i] = (out[i] as number) / -(1 + EARTH_MOON_RATIO);
  };
}

function makeSegment(table: TableReader, plan: SegmentPlan): { content: SpkSegmentContent; line: string } {
  const path = pathOf(table, plan);
  const seconds = TABLE_SECONDS / plan.records;
  const fitter = makeFitter(seconds, plan.coefficients);
  const unit = 2 ** plan.roundTo;
  const records: Float64Array[] = [];
  let position = 0;
  let velocity = 0;
  for (let i = 0; i < plan.records; i++) {
    const record = fitter.fit(path, i * seconds).map((c) => Math.round(c / unit) * unit);
    const [km, kmPerSecond] = fitError(path, i * seconds, seconds, record, 4 * plan.coefficients);
    position = Math.max(position, km);
    velocity = Math.max(velocity, kmPerSecond);
    records.push(record);
  }
  const bytes = plan.records * (2 + 3 * plan.coefficients) * 8;
  const cells = [
    plan.body,
    `${plan.target} about ${plan.centre}`,
    plan.records,
    String(Number((seconds / 86400).toFixed(3))),
    plan.coefficients,
    bytes,
    (position * 1000).toFixed(2),
    (velocity * 1e6).toPrecision(2),
  ];
  const content = {
    name: `DE405 refitted: ${plan.body}`,
    target: plan.target,
    centre: plan.centre,
    type: 2 as const,
    start: TABLE_START,
    recordSeconds: seconds,
    records,
  };
  return { content, line: `| ${cells.join(" | ")} |` };
}

/**
 * Makes the built-in kernel from DE405.
 *
 * @param tablePath path of `table.f0i` of Debian's package casacore-data-jpl-de405
 * @returns the SPK file, the same bytes from the same table, and the table of what was made, in Markdown
 */
export function makeKernel(tablePath: string): { file: Uint8Array; report: string } {
  const table = readTable(tablePath);
  const made = SEGMENTS.map((plan) => makeSegment(table, plan));
  const file = writeSpk(
    made.map(({ content }) => content),
    { internalName: "DE405 refitted, 1959-12-10 to 2060-01-30", comments: COMMENTS },
  );
  const digest = createHash("sha256").update(file).digest("hex");
  const report = [
    "| body | segment | records | days a record | coefficients | bytes | largest error, m | largest error, mm/s |",
    "|---|---|---|---|---|---|---|---|",
    ...made.map(({ line }) => line),
    "",
    `\`de405.bsp\`: ${file.length} bytes (${gzipSync(file, { level: 9 }).length} gzipped), SHA-256 \`${digest}\``,
  ].join("\n");
  return { file, report };
}
