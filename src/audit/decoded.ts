/**
 * Gives text whose characters are bytes as what it means: UTF-8 where it is valid, else as it stands (Latin-1).
 *
 * @param text each character a byte; text that is not such is given back
 */
export function decoded(text: string): string {
  // biome-ignore lint/suspicious/noControlCharactersInRegex: what is not ASCII is sought
  if (!/[^\x00-\x7f]/.test(text)) return text;
  const bytes = new Uint8Array(text.length);
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i);
    if (code > 255) return text;
    bytes[i] = code;
  }
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return text;
  }
}
