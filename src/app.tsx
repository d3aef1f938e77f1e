import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { BrowserRouter } from 'react-router-dom';
import { ReplicaProvider } from '#src/replica/hooks.tsx';
import type { Replica } from '#src/replica/replica.ts';
import { AppRoutes } from '#src/routes.tsx';

/** The whole app, over the replica of this device. */
export function App({ replica }: { replica: Replica }) {
  const [queryClient] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={queryClient}>
      <ReplicaProvider replica={replica}>
        <BrowserRouter>
          <AppRoutes />
        </BrowserRouter>
      </ReplicaProvider>
    </QueryClientProvider>
  );
}
