const PLAIN: Readonly<Record<string, string>> = {
  "′": "'",
  "″": '"',
  "±": "+-",
  Δ: "Delta ",
  "…": "...",
  "–": "-",
  "—": "-",
  "−": "-",
  "→": "->",
  "×": "x",
  ß: "ss",
  æ: "ae",
  Æ: "AE",
  ø: "o",
  Ø: "O",
  ł: "l",
  Ł: "L",
  đ: "d",
  Đ: "D",
  "\u00a0": " ",
  "\u202f": " ",
  "\u2009": " ",
  "’": "'",
};

/**
 * Gives a text in ASCII alone: signs in the letters that stand for them, letters without their accents, and a question mark for
 * what has no such letters. Columns keep their width where a sign becomes one letter.
 */
export function asciiText(text: string): string {
  let plain = "";
  for (const sign of text.normalize("NFC")) plain += (sign.codePointAt(0) as number) < 128 ? sign : asciiSign(sign);
  return plain;
}

function asciiSign(sign: string): string {
  const known = PLAIN[sign];
  if (known !== undefined) return known;
  const bare = sign.normalize("NFKD").replaceAll(/\p{Mark}/gu, "");
  return /^[\x20-\x7e]+$/.test(bare) ? bare : "?";
}
