import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { createContext, useContext, useEffect, useSyncExternalStore, type ReactNode } from 'react';
import type { Holding, Replica } from './replica.ts';
import type { Me, View } from './view.ts';

const ReplicaContext = createContext<Replica | null>(null);
const READS = 'replica';

/** Gives the replica to everything below it, and has reads done again when it changes. Needs a QueryClientProvider above. */
export function ReplicaProvider({ replica, children }: { replica: Replica; children: ReactNode }) {
  const queryClient = useQueryClient();
  useEffect(
    () =>
      replica.subscribe(() => {
        // with nobody signed in there is no view to read
        if (replica.session.current()) void queryClient.invalidateQueries({ queryKey: [READS] });
      }),
    [replica, queryClient],
  );
  return <ReplicaContext value={replica}>{children}</ReplicaContext>;
}

export function useReplica(): Replica {
  const replica = useContext(ReplicaContext);
  if (!replica) throw new Error('There is no ReplicaProvider above.');
  return replica;
}

/** What `read` makes of the view, now and after every change. `key` names all that `read` depends on. */
export function useRead<T>(key: unknown[], read: (view: View) => T): T {
  const replica = useReplica();
  const query = useQuery({
    queryKey: [READS, ...key],
    queryFn: () => ({ read: read(replica.view()) }),
    initialData: () => ({ read: read(replica.view()) }),
    networkMode: 'always',
    staleTime: Infinity,
    // what a screen left is out of date by the time it is back
    gcTime: 0,
    retry: false,
    throwOnError: true,
  });
  return query.data.read;
}

/** A mutation that is done once the phone has the op, with signal or without. */
export function useHold() {
  const replica = useReplica();
  return useMutation({
    mutationFn: ({ kind, data, ...options }: Holding) => replica.hold(kind, data, options),
    networkMode: 'always',
    retry: false,
  });
}

export function useSyncState() {
  const replica = useReplica();
  return useSyncExternalStore(replica.subscribe, replica.syncState);
}

/** Who is signed in, or null. */
export function useMe(): Me | null {
  const replica = useReplica();
  return useSyncExternalStore(replica.subscribe, replica.session.current);
}
