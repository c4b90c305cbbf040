/** Gives the SHA-256 of bytes, or of several parts one after the other, as hexadecimal text. */
export async function sha256(...parts: readonly Uint8Array[]): Promise<string> {
  const bytes = parts.length === 1 ? (parts[0] as Uint8Array) : joined(parts);
  const digest = await globalThis.crypto.subtle.digest("SHA-256", bytes as Uint8Array<ArrayBuffer>);
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, "0")).join("");
}

function joined(parts: readonly Uint8Array[]): Uint8Array {
  const bytes = new Uint8Array(parts.reduce((length, part) => length + part.length, 0));
  let at = 0;
  for (const part of parts) {
    bytes.set(part, at);
    at += part.length;
  }
  return bytes;
}
