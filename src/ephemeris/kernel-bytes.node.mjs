import { readFile } from "node:fs/promises";

/** Where the built-in kernel lies. */
export const builtInKernel = new URL("../data/de405.bsp", import.meta.url);
/** Where the files of the series lie. */
export const planetsSeries = new URL("../data/planets.series.bin", import.meta.url);
export const moonSeries = new URL("../data/moon.series.bin", import.meta.url);

/** Reads a file from a URL: `file:` from the disk, others over the network. */
export async function readBytes(url, signal) {
  if (url.protocol === "file:") return readFile(url, { signal });
  const answer = await fetch(url, { signal });
  if (!answer.ok) throw new Error(`status ${answer.status}`);
  return new Uint8Array(await answer.arrayBuffer());
}
