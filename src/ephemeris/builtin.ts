import { ApsidaryError } from "../error.ts";
import { openKernel } from "./kernel.ts";
import { kernelAccuracy } from "./kernel-accuracy.ts";
import type { Source } from "./source.ts";

/**
 * Opens the built-in kernel, DE405 refitted, 1959-12-10 to 2060-01-30.
 *
 * @param where its bytes or URL; left out, the file that the package carries
 * @throws ApsidaryError `kernel-not-found` where the file cannot be had, `bad-kernel` where it is not what it should be
 */
export async function openBuiltInKernel(where?: Uint8Array | URL, signal?: AbortSignal): Promise<Source> {
  const bytes = where instanceof Uint8Array ? where : await fetchBytes(where, signal);
  return openKernel(bytes, {
    id: "de405",
    title: "the built-in kernel (JPL DE405, refitted)",
    accuracy: (pair) => kernelAccuracy(pair, "measured"),
  });
}

async function fetchBytes(where: URL | undefined, signal: AbortSignal | undefined): Promise<Uint8Array> {
  // Loaded here, not at the top: Node and browsers have a reader each, chosen by the package's `imports`.
  const { builtInKernel, readBytes } = await import("#kernel-bytes");
  const url = where ?? builtInKernel;
  try {
    return await readBytes(url, signal);
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new ApsidaryError(
      "kernel-not-found",
      `the built-in kernel was not found at ${url.href} (${error instanceof Error ? error.message : String(error)}). ` +
        "Give its URL or bytes as `builtIn`, or `builtIn: false` to do without.",
    );
  }
}
