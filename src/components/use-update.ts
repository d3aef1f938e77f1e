import { createContext, useContext, useSyncExternalStore } from 'react';
import type { AppUpdate } from '#src/app-update.ts';

/** Given its value in main.tsx; without one no version ever waits. */
export const AppUpdateContext = createContext<AppUpdate>({
  state: () => 'none',
  subscribe: () => () => undefined,
  apply: () => undefined,
});

/** Whether a newer version of the app is there, and the way to it. */
export function useUpdate() {
  const update = useContext(AppUpdateContext);
  return { state: useSyncExternalStore(update.subscribe, update.state), apply: update.apply };
}
