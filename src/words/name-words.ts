/** Names in a row: 'Rosa', 'Rosa and Orrin', 'Rosa, Orrin and Wes'. */
export function listWords(words: readonly string[]): string {
  if (words.length < 2) return words[0] ?? '';
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}

/** The first words of a longer text, cut at a space. */
export function openingWords(text: string, lengthMax = 80): string {
  const line = text.trim().replace(/\s+/g, ' ');
  if (line.length <= lengthMax) return line;
  const cut = line.slice(0, lengthMax);
  return `${cut.slice(0, Math.max(cut.lastIndexOf(' '), lengthMax / 2))} …`;
}
