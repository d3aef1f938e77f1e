import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { createContext, useContext, useEffect, useSyncExternalStore, type ReactNode } from 'react';
import { arrivedOf, canCome } from './photos/arrived.ts';
import type { HeldPicture, PictureSize } from './photos/picture.ts';
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

/** The record's pictures that this device has not brought to the server whole. */
export function useHeldPictures(): HeldPicture[] {
  const replica = useReplica();
  return useSyncExternalStore(replica.subscribe, replica.heldPictures);
}

export interface SeenPicture {
  blob: Blob | null;
  /** 'coming': the server has not got it yet; 'away': it has, and cannot be asked just now */
  state: 'here' | 'looking' | 'coming' | 'away';
  /** how this device stands with sending it, where it has it to send */
  held: HeldPicture | undefined;
}

/** How long until a picture that could not be had is asked for again, in milliseconds. */
const ASK_AGAIN_MS = 20_000;

/** A picture from this device, or else from the server; asked for again while it is not to be had. */
export function usePicture(sha256: string, size: PictureSize): SeenPicture {
  const replica = useReplica();
  const arrived = useSyncExternalStore(replica.subscribe, () =>
    replica.session.current() ? arrivedOf(replica.view(), sha256) : undefined,
  );
  const held = useHeldPictures().find((picture) => picture.sha256 === sha256);
  const { data, refetch } = useQuery({
    queryKey: ['picture', sha256, size],
    queryFn: () => replica.picture(sha256, size),
    networkMode: 'always',
    staleTime: ({ state }) => (state.data ? Infinity : 0),
    refetchInterval: ({ state }) => (state.data ? false : ASK_AGAIN_MS),
    retry: false,
  });
  // the server has more of it, or this device, since it was last looked for
  useEffect(() => {
    if (data === null) void refetch();
    // eslint-disable-next-line react-hooks/exhaustive-deps -- an answer of nothing must not ask again at once
  }, [arrived, held?.state, refetch]);
  if (data) return { blob: data, state: 'here', held };
  if (data === undefined) return { blob: null, state: 'looking', held };
  return { blob: null, state: canCome(arrived, size) ? 'away' : 'coming', held };
}
