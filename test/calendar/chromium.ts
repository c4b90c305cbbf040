import { existsSync } from "node:fs";

/** Debian's Chromium, or the one that CHROMIUM names; `null` where there is none. */
export const CHROMIUM = [process.env.CHROMIUM, "/usr/bin/chromium"].find((path) => path && existsSync(path)) ?? null;

/** What keeps the browser to itself. */
export const QUIET = [
  "--headless",
  "--no-sandbox",
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];
