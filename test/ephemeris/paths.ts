import type { Path, SegmentGiven } from "./make-kernel.ts";

export const DAY = 86400;
export const SPAN = { from: 0, to: 64 * DAY };

/** A circle: radius (km), period (days), phase; tilted a little so that z takes part. */
export function circle(radius: number, days: number, phase: number): Path {
  return (t) => {
    const angle = (2 * Math.PI * t) / (days * DAY) + phase;
    return [radius * Math.cos(angle), radius * Math.sin(angle), 0.1 * radius * Math.sin(angle)];
  };
}

/** Its velocity, km/s. */
export function circleVelocity(radius: number, days: number, phase: number): Path {
  const rate = (2 * Math.PI) / (days * DAY);
  return (t) => {
    const angle = rate * t + phase;
    const v = radius * rate;
    return [-v * Math.sin(angle), v * Math.cos(angle), 0.1 * v * Math.cos(angle)];
  };
}

export const EMB = [1.5e8, 365.25, 0] as const;
export const SUN = [7e5, 4333, 2] as const;
export const MOON = [3.8e5, 27.3, 1] as const;
export const EARTH = [4.7e3, 27.3, 1 + Math.PI] as const;

/** Four segments as a planetary kernel chains them: EMB and Sun about the SSB, Moon and Earth about the EMB. */
export function fourSegments(type = 2): SegmentGiven[] {
  return [
    { target: 3, centre: 0, ...SPAN, path: circle(...EMB), type },
    { target: 10, centre: 0, ...SPAN, path: circle(...SUN), type, recordSeconds: 16 * DAY, coefficients: 8 },
    { target: 301, centre: 3, ...SPAN, path: circle(...MOON), type, recordSeconds: 4 * DAY, coefficients: 13 },
    { target: 399, centre: 3, ...SPAN, path: circle(...EARTH), type, recordSeconds: 4 * DAY, coefficients: 13 },
  ];
}

/** The message and code of what an action throws. */
export function refusal(action: () => unknown): { code: string; message: string } {
  try {
    action();
  } catch (error) {
    if (error instanceof Error && "code" in error) return { code: String(error.code), message: error.message };
    throw error;
  }
  throw new Error("nothing was refused");
}
