/** Where the built-in kernel lies; bundlers know this form and carry the file along as an asset. */
export const builtInKernel = new URL("../data/de405.bsp", import.meta.url);

/** Reads a file from a URL. */
export async function readBytes(url, signal) {
  const answer = await fetch(url, { signal });
  if (!answer.ok) throw new Error(`status ${answer.status}`);
  return new Uint8Array(await answer.arrayBuffer());
}
