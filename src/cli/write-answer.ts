import { type Destination, openDestination, ReaderGone } from "./destination.ts";

/** Characters that are gathered before they are written. */
const PIECE = 1 << 16;

/**
 * Writes an answer to standard output or to a file.
 *
 * The pieces are drawn as they are needed and as fast as the reader takes them, so that memory stays flat. A reader who
 * leaves early (`| head`) ends the answer quietly.
 *
 * @param pieces text, in order
 * @param out    the file of `--out`; left out, standard output
 * @throws ApsidaryError `unwritable`; whatever `pieces` throws
 */
export async function writeAnswer(pieces: Iterable<string>, out: string | undefined): Promise<void> {
  const destination = await openDestination(out);
  try {
    await writeAll(pieces, destination);
    await destination.finish();
  } catch (error) {
    await destination.abandon();
    if (!(error instanceof ReaderGone)) throw error;
  }
}

async function writeAll(pieces: Iterable<string>, destination: Destination): Promise<void> {
  let gathered = "";
  for (const piece of pieces) {
    gathered += piece;
    if (gathered.length < PIECE) continue;
    await destination.write(gathered);
    gathered = "";
    await new Promise(setImmediate); // lets an interrupt and a reader's leaving be noticed
  }
  if (gathered) await destination.write(gathered);
}
