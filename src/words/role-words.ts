import type { Role } from '#shared/identity/role.ts';
import { listWords } from '#src/words/name-words.ts';

export const ROLE_WORDS: Record<Role, string> = {
  crew: 'crew',
  foreman: 'foreman',
  office: 'office',
  owner: 'owner',
};

/** What each role is for, in one line. */
export const ROLE_NOTES: Record<Role, string> = {
  crew: 'logs and ticks off work',
  foreman: 'keeps the day, the boats and the people',
  office: 'hours, accounts, people',
  owner: 'reads of their own boats what is released',
};

/** 'crew and owner'. */
export function rolesWords(roles: readonly Role[]): string {
  return listWords(roles.map((role) => ROLE_WORDS[role]));
}
