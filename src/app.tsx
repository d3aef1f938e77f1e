import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { RouterProvider } from 'react-router-dom';
import { ReplicaProvider } from '#src/replica/hooks.tsx';
import type { Replica } from '#src/replica/replica.ts';
import { createRouter } from '#src/routes.tsx';

/** The whole app, over the replica of this device. */
export function App({ replica }: { replica: Replica }) {
  const [queryClient] = useState(() => new QueryClient());
  const [router] = useState(createRouter);
  return (
    <QueryClientProvider client={queryClient}>
      <ReplicaProvider replica={replica}>
        <RouterProvider router={router} />
      </ReplicaProvider>
    </QueryClientProvider>
  );
}
