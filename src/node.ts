import { readFile } from "node:fs/promises";
import { basename, resolve } from "node:path";
import {
  type SourceOptions as BytesOptions,
  type Ephemeris,
  type KernelGiven,
  openSources as openFromBytes,
} from "./ephemeris/open-sources.ts";
import type { KernelAccuracy } from "./ephemeris/user-kernel.ts";
import { ApsidaryError } from "./error.ts";

export * from "./index.ts";

/** A kernel as the core takes it, or a path, alone or with a name and an accuracy statement. */
export type KernelFile =
  | KernelGiven
  | string
  | { readonly data: string; readonly name?: string; readonly accuracy?: KernelAccuracy };

/** What to open: as in the core, and files by their paths. */
export interface SourceOptions extends Omit<BytesOptions, "kernels"> {
  /** Kernels that come before the built-in one; the last one counts most. */
  readonly kernels?: readonly KernelFile[];
  /** Path of a `leap-seconds.list`; `leapSeconds` takes its text. */
  readonly leapSecondsFile?: string;
}

/**
 * Opens the sources, as the function of the same name in the core, and takes paths as well.
 *
 * A kernel given by its path is called by its file name, or by its path where two files have the same name.
 *
 * @throws ApsidaryError as in the core; `unreadable` for a path that is no file or may not be read
 */
export async function openSources(options: SourceOptions = {}): Promise<Ephemeris> {
  const { kernels = [], leapSecondsFile, ...others } = options;
  const names = kernels.map((given) => (typeof given === "string" ? basename(given) : null));
  const opened = await Promise.all(
    kernels.map(async (given, index): Promise<KernelGiven> => {
      const file = typeof given === "string" ? { data: given } : given;
      if (!("data" in file) || typeof file.data !== "string") return file as KernelGiven;
      const alone = names.filter((name) => name === names[index]).length === 1;
      const bytes = await readWhole(file.data, "kernel");
      return { name: alone ? basename(file.data) : file.data, ...file, data: bytes };
    }),
  );
  if (leapSecondsFile === undefined) return openFromBytes({ ...others, kernels: opened });
  const text = new TextDecoder().decode(await readWhole(leapSecondsFile, "leap-second list"));
  try {
    return await openFromBytes({ ...others, kernels: opened, leapSeconds: text });
  } catch (error) {
    if (!(error instanceof ApsidaryError) || error.code !== "bad-leap-seconds") throw error;
    throw new ApsidaryError(error.code, `${leapSecondsFile}: ${error.message}`);
  }
}

async function readWhole(path: string, what: string): Promise<Uint8Array> {
  try {
    return await readFile(resolve(path));
  } catch (error) {
    throw new ApsidaryError("unreadable", whyUnreadable(path, what, error as NodeJS.ErrnoException));
  }
}

function whyUnreadable(path: string, what: string, { code, message }: NodeJS.ErrnoException): string {
  if (code === "ENOENT" || code === "ENOTDIR") return `there is no file "${path}"; give the path of a ${what}.`;
  if (code === "EISDIR") return `"${path}" is a directory; give the path of a ${what} in it.`;
  if (code === "EACCES" || code === "EPERM") return `"${path}" may not be read; ask for permission to read it.`;
  return `"${path}" cannot be read as a ${what} (${message}).`;
}
