import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { z } from 'zod'
import { App } from '#src/app.tsx'
import { ErrorBoundary } from '#src/components/error-page.tsx'
import '#src/styles.css'

// zod otherwise tries `new Function`, which the content security policy reports
z.config({ jitless: true })

const root = document.getElementById('root')
if (!root) throw new Error('index.html has no #root')
createRoot(root).render(
  <StrictMode>
    <ErrorBoundary>
      <App />
    </ErrorBoundary>
  </StrictMode>,
)
