import { lazy } from 'react';

// what opens over Alongside comes when it is first opened; all of it is precached, so that it opens without signal too
export const BoatSheet = lazy(() =>
  import('#src/routes/alongside/boat-sheet.tsx').then((module) => ({ default: module.BoatSheet })),
);
export const EarlierSheet = lazy(() => import('#src/routes/alongside/earlier-sheet.tsx'));
export const OwnHoursSheet = lazy(() => import('#src/routes/alongside/own-hours-sheet.tsx'));
export const DoneUndo = lazy(() =>
  import('#src/routes/alongside/done-undo.tsx').then((module) => ({ default: module.DoneUndo })),
);
