import type { View } from '#src/replica/view.ts';

/** A person's name as this reader says it: 'you' for oneself. */
export function whoWords(view: View, personId: string): string {
  if (personId === view.me.personId) return 'you';
  return view.find('person', personId)?.name ?? 'somebody not known here';
}

/** At the start of a sentence. */
export function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
