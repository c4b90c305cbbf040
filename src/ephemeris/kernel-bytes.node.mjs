import { readFile } from "node:fs/promises";

/** Where the built-in kernel lies. */
export const builtInKernel = new URL("../data/de405.bsp", import.meta.url);

/** Reads a file from a URL: `file:` from the disk, others over the network. */
export async function readBytes(url, signal) {
  if (url.protocol === "file:") return readFile(url, { signal });
  const answer = await fetch(url, { signal });
  if (!answer.ok) throw new Error(`status ${answer.status}`);
  return new Uint8Array(await answer.arrayBuffer());
}
