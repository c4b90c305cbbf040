import { randomBytes } from "node:crypto";
import { unlinkSync } from "node:fs";
import { access, chmod, constants, type FileHandle, open, realpath, rename, stat } from "node:fs/promises";
import { basename, dirname, join, resolve } from "node:path";
import { ApsidaryError } from "../error.ts";
import { shown } from "./choice-of.ts";

/** Where an answer goes. */
export interface Destination {
  /** Writes a piece, and waits where the reader is slower. */
  write(text: string | Uint8Array): Promise<void>;
  /** Ends the answer; a file appears under its name only now. */
  finish(): Promise<void>;
  /** Gives the answer up; nothing of a file remains. */
  abandon(): Promise<void>;
}

/** The reader of standard output has gone; what is left need not be written. */
export class ReaderGone extends Error {}

/**
 * Opens the place where the answer goes: standard output, or a file.
 *
 * A file is written under another name in the same folder and renamed when it is whole; an interrupt or a failure removes it.
 *
 * @param path the file, as given with `--out`
 * @throws ApsidaryError `unwritable`
 */
export async function openDestination(path: string | undefined): Promise<Destination> {
  return path === undefined ? standardOutput() : wholeFile(path);
}

function standardOutput(): Destination {
  return {
    write: (text) =>
      new Promise((done, failed) => {
        process.stdout.write(text, (error) => {
          if (!error) done();
          else failed((error as NodeJS.ErrnoException).code === "EPIPE" ? new ReaderGone() : outputFailed(error));
        });
      }),
    finish: async () => {},
    abandon: async () => {},
  };
}

function outputFailed(error: Error): ApsidaryError {
  return new ApsidaryError("unwritable", `standard output cannot be written (${error.message}).`);
}

async function wholeFile(given: string): Promise<Destination> {
  const { path, mode } = await writable(given);
  const temporary = join(dirname(path), `.${basename(path)}.${randomBytes(6).toString("hex")}.part`);
  const remove = () => {
    try {
      unlinkSync(temporary);
    } catch {
      // it is gone already, or was never there
    }
  };
  const forget = onInterrupt(remove); // before there is a file, so that no moment is left between
  const handle = await refusing(given, () => open(temporary, "wx")).catch((error: unknown) => {
    forget();
    throw error;
  });
  return {
    write: (text) => refusing(given, () => handle.writeFile(text)),
    finish: () =>
      refusing(given, async () => {
        await handle.sync();
        await handle.close();
        if (mode !== null) await chmod(temporary, mode);
        await rename(temporary, path);
        forget();
      }),
    abandon: async () => {
      await closed(handle);
      remove();
      forget();
    },
  };
}

/** The file behind the name (links are followed) and, where it exists, its permissions. */
async function writable(given: string): Promise<{ path: string; mode: number | null }> {
  if (given === "")
    throw new ApsidaryError("unwritable", '--out "" names no file; leave --out away for standard output.');
  if (/[/\\]$/.test(given)) {
    throw new ApsidaryError("unwritable", `--out ${shown(given)} names a directory; name a file in it.`);
  }
  const path = resolve(given);
  const found = await stat(path).catch(() => null);
  if (!found) return { path, mode: null };
  if (found.isDirectory()) {
    throw new ApsidaryError("unwritable", `--out ${shown(given)} is a directory; name a file in it.`);
  }
  if (!found.isFile()) {
    throw new ApsidaryError(
      "unwritable",
      `--out ${shown(given)} is not a plain file; leave --out away and redirect standard output there.`,
    );
  }
  return refusing(given, async () => {
    await access(path, constants.W_OK);
    return { path: await realpath(path), mode: found.mode & 0o7777 };
  });
}

async function refusing<T>(given: string, act: () => Promise<T>): Promise<T> {
  try {
    return await act();
  } catch (error) {
    const { code, message } = error as NodeJS.ErrnoException;
    const why =
      code === "ENOENT" || code === "ENOTDIR"
        ? `there is no folder ${shown(dirname(given))}`
        : code === "EACCES" || code === "EPERM" || code === "EROFS"
          ? "there is no permission to write there"
          : code === "ENOSPC"
            ? "the disk is full"
            : message;
    throw new ApsidaryError("unwritable", `--out ${shown(given)} cannot be written: ${why}.`);
  }
}

async function closed(handle: FileHandle): Promise<void> {
  await handle.close().catch(() => {});
}

/** Runs `clean` before an interrupt ends the process; gives a function that takes this back. */
function onInterrupt(clean: () => void): () => void {
  const signals = ["SIGINT", "SIGTERM", "SIGHUP"] as const;
  const handler = (signal: NodeJS.Signals) => {
    clean();
    forget();
    process.kill(process.pid, signal);
  };
  const forget = () => {
    for (const signal of signals) process.off(signal, handler);
  };
  for (const signal of signals) process.on(signal, handler);
  return forget;
}
