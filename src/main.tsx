import { StrictMode, type ReactNode } from 'react';
import { createRoot } from 'react-dom/client';
import { z } from 'zod';
import { version } from '../package.json';
import { followAppUpdates } from '#src/app-update.ts';
import { App } from '#src/app.tsx';
import { ErrorBoundary, ErrorPage } from '#src/components/error-page.tsx';
import { AppUpdateContext } from '#src/components/use-update.ts';
import { browserWorld } from '#src/replica/browser-world.ts';
import { openReplica } from '#src/replica/live-replica.ts';
import { startSyncLoop } from '#src/replica/sync-loop.ts';
import { fetchScreenAt } from '#src/routes.tsx';
import '#src/styles.css';

// zod otherwise tries `new Function`, which the content security policy reports
z.config({ jitless: true });

const appUpdate = followAppUpdates();
const element = document.getElementById('root');
if (!element) throw new Error('index.html has no #root');
const root = createRoot(element);

function show(page: ReactNode) {
  root.render(
    <StrictMode>
      <ErrorBoundary>
        <AppUpdateContext value={appUpdate}>{page}</AppUpdateContext>
      </ErrorBoundary>
    </StrictMode>,
  );
}

const world = browserWorld(version, () => {
  show(<ErrorPage error={new Error('Another window of Ribband holds on to an older version. Close it.')} />);
});
fetchScreenAt(window.location.pathname);
openReplica(world).then(
  (replica) => {
    startSyncLoop(replica, world);
    show(<App replica={replica} />);
  },
  (error: unknown) => show(<ErrorPage error={error instanceof Error ? error : new Error(String(error))} />),
);
