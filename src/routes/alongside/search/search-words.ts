const NUMBER_WORDS = [
  'zero',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** A text as words to be looked for: small letters, no signs, numbers up to twelve as figures ('beam four' is 'beam 4'). */
export function wordsOf(text: string): string[] {
  const plain = text.toLowerCase().normalize('NFKD').replace(/\p{M}/gu, '').replace(/['’]/g, '');
  return (plain.match(/[\p{L}\p{N}]+/gu) ?? []).map((word) => {
    const number = NUMBER_WORDS.indexOf(word);
    return number === -1 ? word : String(number);
  });
}

/** Whether every word that is asked for begins a word of the text; a figure is a word of its own, so that 1 finds no 12. */
export function isFound(known: ReadonlySet<string>, asked: readonly string[]): boolean {
  return asked.every((word) => {
    if (known.has(word)) return true;
    if (/^\d+$/.test(word)) return false;
    for (const each of known) if (each.startsWith(word)) return true;
    return false;
  });
}
