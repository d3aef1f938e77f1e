import type { Role } from '#shared/identity/role.ts';

interface PlaceForRoles {
  to: string;
  label: string;
  roles: readonly Role[];
}

const PLACES: readonly PlaceForRoles[] = [
  { to: '/day', label: 'Day sheet', roles: ['foreman', 'office'] },
  { to: '/alongside', label: 'Alongside', roles: ['crew', 'foreman'] },
  { to: '/order', label: 'Order of work', roles: ['foreman', 'crew', 'office'] },
  { to: '/plan', label: 'Plan', roles: ['foreman', 'crew', 'office'] },
  { to: '/boats', label: 'Boats', roles: ['foreman', 'office'] },
  { to: '/people', label: 'People', roles: ['foreman', 'office'] },
  { to: '/devices', label: 'Devices', roles: ['foreman', 'office'] },
  { to: '/own-boats', label: 'My boats', roles: ['owner'] },
];

/** The places that somebody with these roles goes to, for the bar of the places. */
export function placesFor(roles: readonly Role[]): { to: string; label: string }[] {
  return PLACES.filter((place) => place.roles.some((role) => roles.includes(role))).map(({ to, label }) => ({
    to,
    label,
  }));
}

/** Where a person arrives: who keeps the day, at the Day sheet; crew Alongside; owners with their boats. */
export function homeFor(roles: readonly Role[]): string {
  if (roles.includes('foreman')) return '/day';
  if (roles.includes('crew')) return '/alongside';
  return roles.includes('office') ? '/day' : '/own-boats';
}
