import type { Numbered } from '#shared/trade/task-places.ts';

/** How many, and which as far as they are known: '12' and '4 port, 7-9 starboard'. */
export interface HowMany {
  count: string;
  which: string;
}

export const COUNT_MAX = 60;

const ONE = /^(\d{1,4})(?:\s*(?:-|to)\s*(\d{1,4}))?(?:\s+(port|starboard))?$/i;

/** Those named and, up to the count, those not known yet; a sentence where it cannot be read. */
export function readWhich({ count, which }: HowMany): Numbered[] | { problem: string } {
  const named = which.split(/[,;]/).flatMap((words) => (words.trim() ? [readOne(words.trim())] : []));
  if (named.includes(null)) return { problem: 'Write the numbers like 4 port, 7-9 starboard.' };
  const known = named.flatMap((some) => some ?? []);
  if (count.trim() !== '' && !/^\d{1,4}$/.test(count.trim()))
    return { problem: 'Write how many in figures.' };
  const wanted = count.trim() === '' ? known.length : Number(count);
  if (wanted > COUNT_MAX || known.length > COUNT_MAX) return { problem: `At most ${COUNT_MAX} at once.` };
  if (known.length > wanted) return { problem: `${known.length} are named, and ${wanted} counted.` };
  return [...known, ...Array.from({ length: wanted - known.length }, () => ({}))];
}

function readOne(words: string): Numbered[] | null {
  const match = ONE.exec(words);
  if (!match) return null;
  const [from, to] = [Number(match[1]), Number(match[2] ?? match[1])];
  if (to < from || to - from >= COUNT_MAX) return null;
  const side = match[3]?.toLowerCase() as 'port' | 'starboard' | undefined;
  return Array.from({ length: to - from + 1 }, (_, index) => ({
    number: from + index,
    ...(side ? { side } : {}),
  }));
}
