// What calendars cost against the bare finder: `npm run build && node bench/calendar.mjs`. Processor time of whole runs of the command, the
// least of some, as ratios to `apsidary passages` for the same pairs and span; and the most memory that they held.
import { spawnSync } from "node:child_process";
import { fileURLToPath } from "node:url";

const command = fileURLToPath(new URL("../dist/cli.js", import.meta.url));
const PAIRS = "earth-sun,moon-earth,mercury-sun,venus-sun,mars-sun,jupiter-sun,saturn-sun,uranus-sun,neptune-sun";
const TELL =
  'process.on("exit",()=>{const u=process.resourceUsage();process.stderr.write("\\ncpu "+(u.userCPUTime+u.systemCPUTime)+" maxRSS "+u.maxRSS)})';

/** Runs the command some times; gives the least seconds and the memory in MB. */
function run(times, ...args) {
  let seconds = Number.POSITIVE_INFINITY;
  let megabytes = 0;
  for (let i = 0; i < times; i++) {
    const { status, stderr } = spawnSync(
      process.execPath,
      [`--import=data:text/javascript,${encodeURIComponent(TELL)}`, command, ...args],
      { encoding: "utf8", maxBuffer: 1e9, env: { ...process.env, SOURCE_DATE_EPOCH: "1767225600" } },
    );
    if (status !== 0) throw new Error(stderr);
    seconds = Math.min(seconds, Number(/cpu (\d+)/.exec(stderr)?.[1]) / 1e6);
    megabytes = Math.max(megabytes, Number(/maxRSS (\d+)/.exec(stderr)?.[1]) / 1024);
  }
  return { seconds, megabytes };
}

/** Prints a line. */
function tell(what, { seconds, megabytes }, bare) {
  const ratio = bare ? `${(seconds / bare.seconds).toFixed(2)} × the finder` : "";
  console.log(
    `${what.padEnd(34)} ${seconds.toFixed(2).padStart(6)} s  ${megabytes.toFixed(0).padStart(4)} MB  ${ratio}`,
  );
}

tell("starting and stopping", run(3, "--version"));
const year = run(3, "passages", PAIRS, "--from", "2027", "--to", "2028", "--format", "json");
tell("passages of a year, json", year);
for (const format of ["text", "json", "csv", "ics", "html"]) {
  tell(`calendar of a year, ${format}`, run(3, "calendar", "2027", "--zone", "UTC", "--format", format), year);
}
const century = run(2, "passages", PAIRS, "--from", "1960", "--to", "2060", "--format", "json");
tell("passages of 100 years, json", century);
tell("calendar of 100 years, json", run(2, "calendar", "1960-2059", "--zone", "UTC", "--format", "json"), century);
const moon = ["--zone", "UTC", "--pairs", "moon-earth", "--format", "json"];
tell("the Moon's calendar of 50 years", run(1, "calendar", "1980-2029", ...moon));
tell("the Moon's calendar of 200 years", run(1, "calendar", "1900-2099", ...moon));
