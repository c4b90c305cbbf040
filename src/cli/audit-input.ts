import { createReadStream } from "node:fs";
import { stat } from "node:fs/promises";
import { ApsidaryError } from "../error.ts";
import { shown } from "./choice-of.ts";

const CHUNK = 1 << 18;

/**
 * Opens a list as text whose characters are bytes, piece by piece.
 *
 * @param file a path, or `-` for standard input
 * @throws ApsidaryError `unreadable`, at the call for a path that is none, else while reading
 */
export async function auditInput(file: string): Promise<AsyncIterable<string>> {
  if (file === "-") return pieces(process.stdin.setEncoding("latin1"), "standard input");
  const found = await stat(file).catch((error: NodeJS.ErrnoException) => {
    throw new ApsidaryError("unreadable", whyUnreadable(file, error));
  });
  if (found.isDirectory()) {
    throw new ApsidaryError("unreadable", `${shown(file)} is a directory; give the path of a list in it.`);
  }
  return pieces(createReadStream(file, { encoding: "latin1", highWaterMark: CHUNK }), file);
}

async function* pieces(stream: AsyncIterable<unknown>, file: string): AsyncGenerator<string, void, undefined> {
  try {
    for await (const piece of stream) yield String(piece);
  } catch (error) {
    throw new ApsidaryError("unreadable", whyUnreadable(file, error as NodeJS.ErrnoException));
  }
}

function whyUnreadable(file: string, { code, message }: NodeJS.ErrnoException): string {
  if (code === "ENOENT" || code === "ENOTDIR")
    return `there is no file ${shown(file)}; give the path of a list, or - for standard input.`;
  if (code === "EISDIR") return `${shown(file)} is a directory; give the path of a list in it.`;
  if (code === "EACCES" || code === "EPERM") return `${shown(file)} may not be read; ask for permission to read it.`;
  return `${shown(file)} cannot be read (${message}).`;
}
