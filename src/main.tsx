import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { z } from 'zod';
import { followAppUpdates } from '#src/app-update.ts';
import { App } from '#src/app.tsx';
import { ErrorBoundary } from '#src/components/error-page.tsx';
import { AppUpdateContext } from '#src/components/use-update.ts';
import '#src/styles.css';

// zod otherwise tries `new Function`, which the content security policy reports
z.config({ jitless: true });

const appUpdate = followAppUpdates();
const root = document.getElementById('root');
if (!root) throw new Error('index.html has no #root');
createRoot(root).render(
  <StrictMode>
    <ErrorBoundary>
      <AppUpdateContext value={appUpdate}>
        <App />
      </AppUpdateContext>
    </ErrorBoundary>
  </StrictMode>,
);
