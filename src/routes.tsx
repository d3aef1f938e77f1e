import { lazy, Suspense, type ComponentType } from 'react';
import { Route, Routes } from 'react-router-dom';
import { Loading } from '#src/components/empty.tsx';
import LostPage from '#src/shell/lost-page.tsx';
import { Moves } from '#src/shell/moves.tsx';
import { Home, SignedIn } from '#src/shell/signed-in.tsx';

type Load = () => Promise<{ default: ComponentType }>;

// a screen's code comes when it is first opened; all of it is precached, so that it opens without signal too
const OPEN_SCREENS: [path: string, load: Load][] = [
  ['sign-in', () => import('#src/routes/sign-in/sign-in-page.tsx')],
  ['first-run', () => import('#src/routes/first-run/first-run-page.tsx')],
];

const loadDaySheet = () => import('#src/routes/day-sheet/day-sheet-page.tsx');
const loadWeek = () => import('#src/routes/day-sheet/week/week-page.tsx');
const loadPlan = () => import('#src/routes/plan/plan-page.tsx');
const SIGNED_IN_SCREENS: [path: string, load: Load][] = [
  ['alongside', () => import('#src/routes/alongside/alongside-page.tsx')],
  ['log', () => import('#src/routes/alongside/log/log-page.tsx')],
  ['tasks', () => import('#src/routes/alongside/tasks/tasks-page.tsx')],
  ['entry/:id', () => import('#src/routes/alongside/entry/entry-page.tsx')],
  ['photos', () => import('#src/routes/alongside/photos/photos-page.tsx')],
  ['found', () => import('#src/routes/alongside/found/found-page.tsx')],
  ['finding/:id', () => import('#src/routes/alongside/note/finding-page.tsx')],
  ['sound/:id', () => import('#src/routes/alongside/note/sound-page.tsx')],
  ['photo/:id', () => import('#src/routes/alongside/note/photo-page.tsx')],
  ['search', () => import('#src/routes/alongside/search/search-page.tsx')],
  ['held', () => import('#src/routes/held/held-page.tsx')],
  ['me', () => import('#src/routes/me/me-page.tsx')],
  ['own-boats', () => import('#src/routes/own-boats/own-boats-page.tsx')],
  ['day', loadDaySheet],
  ['day/:date', loadDaySheet],
  ['week', loadWeek],
  ['week/:date', loadWeek],
  ['order', () => import('#src/routes/order-of-work/work-page.tsx')],
  ['order/:id', () => import('#src/routes/order-of-work/order-page.tsx')],
  ['plan', loadPlan],
  ['plan/:date', loadPlan],
  ['boats', () => import('#src/routes/boats/boats-page.tsx')],
  ['boats/:id', () => import('#src/routes/boats/boat-page.tsx')],
  ['people', () => import('#src/routes/people/people-page.tsx')],
  ['devices', () => import('#src/routes/devices/devices-page.tsx')],
];

const HOME_SCREEN = 'alongside';

/** Begins to load what the screen at an address needs, so that it need not wait for the record to be open. */
export function fetchScreenAt(pathname: string): void {
  const [place = ''] = pathname.split('/').filter(Boolean);
  const screen = SIGNED_IN_SCREENS.find(([path]) => path.split('/')[0] === (place || HOME_SCREEN));
  // whoever shows it meets the error and says so
  screen?.[1]().catch(() => {});
}

function routeOf([path, load]: [path: string, load: Load]) {
  const Screen = lazy(load);
  return <Route key={path} path={path} element={<Screen />} />;
}

const openRoutes = OPEN_SCREENS.map(routeOf);
const signedInRoutes = SIGNED_IN_SCREENS.map(routeOf);

/** The addresses of the app. Below a BrowserRouter: its data routers weigh twice as much, and nothing here loads by route. */
export function AppRoutes() {
  return (
    <Suspense fallback={<Loading words="Opening …" />}>
      <Routes>
        <Route element={<Moves />}>
          {openRoutes}
          <Route element={<SignedIn />}>
            <Route index element={<Home />} />
            {signedInRoutes}
          </Route>
          <Route path="*" element={<LostPage />} />
        </Route>
      </Routes>
    </Suspense>
  );
}
