/** Signs of the trade that have a plain spelling; accents are dropped by decomposition, anything else becomes "?". */
const plain: { readonly [character: string]: string } = {
  "\u2212": "-",
  "\u2010": "-",
  "\u2011": "-",
  "\u2013": "-",
  "\u2014": "-",
  "\u00d7": "x",
  "\u00b7": ".",
  "\u2018": "'",
  "\u2019": "'",
  "\u201c": '"',
  "\u201d": '"',
  "\u2032": "'",
  "\u2033": '"',
  "\u00b0": " deg",
  "\u03bb": "lambda",
  "\u03b4": "delta",
  "\u00b5": "u",
  "\u03bc": "u",
  "\u00b1": "+/-",
  "\u2264": "<=",
  "\u2265": ">=",
  "\u2026": "...",
  "\u00df": "ss",
  "\u00e6": "ae",
  "\u00c6": "AE",
  "\u00f8": "o",
  "\u00d8": "O",
  "\u0142": "l",
  "\u0141": "L",
};

/** A text in printable ASCII (0x20 to 0x7E), for formats that know nothing else: line breaks and tabs become spaces. */
export function asciiText(text: string): string {
  return Array.from(text)
    .map((character) => plain[character] ?? character.normalize("NFKD").replace(/\p{M}/gu, ""))
    .join("")
    .replace(/\s/gu, " ")
    .replace(/[^\x20-\x7e]/gu, "?");
}
