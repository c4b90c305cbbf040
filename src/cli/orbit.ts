import type { Command } from "commander";
import { addAnswerOptions } from "./options.ts";

/** The forms of the answer. */
export const ORBIT_FORMATS = ["text", "json", "csv"] as const;

/** The options of `orbit`, as given. */
export interface OrbitOptions {
  readonly about?: string;
  readonly companion?: string;
  readonly radius?: string;
  readonly gm?: string;
  readonly periapsis?: string;
  readonly apoapsis?: string;
  readonly periapsisHeight?: string;
  readonly apoapsisHeight?: string;
  readonly semiMajorAxis?: string;
  readonly semiMinorAxis?: string;
  readonly semiLatusRectum?: string;
  readonly eccentricity?: string;
  readonly periapsisSpeed?: string;
  readonly apoapsisSpeed?: string;
  readonly period?: string;
  readonly energy?: string;
  readonly angularMomentum?: string;
  readonly format?: string;
  readonly out?: string;
}

/** Adds the command that tells a two-body orbit from what is known of it. */
export function addOrbit(program: Command): void {
  const command = program
    .command("orbit")
    .summary("tell a whole two-body orbit from two or three of its measures")
    .description(
      "Tells all of an orbit from any sufficient set: two of its measures and the central body, or\n" +
        "three measures that fix the mass as well. Numbers take a unit: km, m, au, R (the radius of the\n" +
        "body); km/s, m/s; s, min, h, d. Without one they are km, km/s and s. A set that is too small,\n" +
        "too large or contradictory is refused, saying which.",
    )
    .option("--about <body>", "the central body: sun, mercury … pluto, moon")
    .option("--companion <body>", "the other body, where its mass counts: a name, or its GM in km3/s2")
    .option("--gm <gm>", "gravitational parameter, where no body is named (km3/s2)")
    .option("--radius <length>", "equatorial radius, where no body is named: heights are above it")
    .option("--periapsis <length>", "nearest distance, from the centre")
    .option("--apoapsis <length>", "farthest distance, from the centre")
    .option("--periapsis-height <length>", "least height above the equatorial radius")
    .option("--apoapsis-height <length>", "greatest height above the equatorial radius")
    .option("--semi-major-axis <length>", "below zero for a hyperbola: --semi-major-axis=-17000km")
    .option("--semi-minor-axis <length>")
    .option("--semi-latus-rectum <length>")
    .option("--eccentricity <e>")
    .option("--periapsis-speed <speed>")
    .option("--apoapsis-speed <speed>")
    .option("--period <time>")
    .option("--energy <energy>", "specific energy (km2/s2), below zero for a closed orbit: --energy=-8.1")
    .option("--angular-momentum <h>", "specific angular momentum (km2/s)");
  addAnswerOptions(command, ORBIT_FORMATS)
    .addHelpText(
      "after",
      `
Examples:
  apsidary orbit --about earth --periapsis-height 250km --apoapsis-height 35786km
  apsidary orbit --about earth --period 23.9344696h --eccentricity 0
  apsidary orbit --about sun --semi-major-axis 1au --eccentricity 0.0167
  apsidary orbit --about earth --companion moon --semi-major-axis 384748km --eccentricity 0.0549
  apsidary orbit --semi-major-axis 421800km --period 1.769138d --eccentricity 0.0041`,
    )
    .action(async (options: OrbitOptions) => {
      const { runOrbit } = await import("./run-orbit.ts");
      await runOrbit(options);
    });
}
