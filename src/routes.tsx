import type { ComponentType } from 'react';
import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { Loading } from '#src/components/empty.tsx';
import { BrokenScreen } from '#src/shell/lost-page.tsx';
import { Home, Moves, SignedIn } from '#src/shell/signed-in.tsx';

type Screen = () => Promise<{ default: ComponentType }>;

/** A screen whose code comes when it is first opened; all of it is precached, so that it opens without signal too. */
function screen(path: string, load: Screen): RouteObject {
  return { path, lazy: async () => ({ Component: (await load()).default }) };
}

const signedInScreens: RouteObject[] = [
  { index: true, Component: Home },
  screen('alongside', () => import('#src/routes/alongside/alongside-page.tsx')),
  screen('log', () => import('#src/routes/alongside/log/log-page.tsx')),
  screen('tasks', () => import('#src/routes/alongside/tasks/tasks-page.tsx')),
  screen('entry/:id', () => import('#src/routes/alongside/entry/entry-page.tsx')),
  screen('held', () => import('#src/routes/held/held-page.tsx')),
  screen('me', () => import('#src/routes/me/me-page.tsx')),
  screen('own-boats', () => import('#src/routes/own-boats/own-boats-page.tsx')),
  screen('day', () => import('#src/routes/day-sheet/day-sheet-page.tsx')),
  screen('day/:date', () => import('#src/routes/day-sheet/day-sheet-page.tsx')),
  screen('boats', () => import('#src/routes/boats/boats-page.tsx')),
  screen('boats/:id', () => import('#src/routes/boats/boat-page.tsx')),
  screen('people', () => import('#src/routes/people/people-page.tsx')),
  screen('devices', () => import('#src/routes/devices/devices-page.tsx')),
];

/** The addresses of the app. */
export const routes: RouteObject[] = [
  {
    Component: Moves,
    ErrorBoundary: BrokenScreen,
    HydrateFallback: Loading,
    children: [
      screen('sign-in', () => import('#src/routes/sign-in/sign-in-page.tsx')),
      screen('first-run', () => import('#src/routes/first-run/first-run-page.tsx')),
      { Component: SignedIn, children: signedInScreens },
      screen('*', () => import('#src/shell/lost-page.tsx')),
    ],
  },
];

export function createRouter() {
  return createBrowserRouter(routes);
}
