import type { Pair } from "../bodies/pair.ts";
import { ApsidaryError } from "../error.ts";
import { openKernel } from "./kernel.ts";
import { kernelAccuracy } from "./kernel-accuracy.ts";
import type { KernelGiven } from "./open-sources.ts";
import type { Accuracy, AccuracyBasis, Source } from "./source.ts";

/** The error that the user vouches for, the same for all pairs of the kernel: half-widths that at least 95 % of true errors keep. */
export interface KernelAccuracy {
  readonly rangeKm: number;
  readonly rangeRateKmS: number;
}

/**
 * Opens a kernel of the user's.
 *
 * Its accuracy is the user's own word where given; else the built-in kernel's figures, which are the differences between
 * DE405 and later kernels of its family: `published` where the file says that it is one (DE405 or a number above), `assumed` where it does not.
 *
 * @param given  the kernel
 * @param index  its place among the kernels given, for a name where it has none
 * @param signal ends a fetch
 * @throws ApsidaryError `unreadable`, `bad-kernel`
 */
export async function openUserKernel(given: KernelGiven, index: number, signal?: AbortSignal): Promise<Source> {
  const { data, name, accuracy } =
    given instanceof Uint8Array || given instanceof URL || given instanceof Blob ? { data: given } : given;
  const title = name ?? nameOf(data, index);
  const bytes = await bytesOf(data, title, signal);
  const basis = basisOf(bytes);
  return openKernel(bytes, {
    id: `user:${title}`,
    title,
    accuracy: (pair: Pair): Accuracy => (accuracy ? { ...accuracy, basis: "user" } : kernelAccuracy(pair, basis)),
  });
}

function nameOf(data: Uint8Array | URL | Blob, index: number): string {
  if (data instanceof URL) return decodeURIComponent(data.pathname.split("/").at(-1) || data.href);
  if (typeof File !== "undefined" && data instanceof File) return data.name;
  return `kernel-${index + 1}`;
}

async function bytesOf(data: Uint8Array | URL | Blob, title: string, signal?: AbortSignal): Promise<Uint8Array> {
  if (data instanceof Uint8Array) return data;
  if (data instanceof Blob) return new Uint8Array(await data.arrayBuffer());
  const { readBytes } = await import("#kernel-bytes");
  try {
    return await readBytes(data, signal);
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new ApsidaryError(
      "unreadable",
      `${title} cannot be read (${error instanceof Error ? error.message : String(error)}).`,
    );
  }
}

/** A kernel of the family names its number in the comments or in the names of its segments: DE-0440LE-0440, DE421. */
function basisOf(bytes: Uint8Array): AccuracyBasis {
  const head = new TextDecoder("latin1").decode(bytes.subarray(0, 32 * 1024));
  const number = /\bDE-?0*(4\d\d)(?!\d)/.exec(head)?.[1];
  return number !== undefined && Number(number) >= 405 ? "published" : "assumed";
}
