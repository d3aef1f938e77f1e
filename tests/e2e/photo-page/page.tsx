import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { createRoot } from 'react-dom/client';
import { z } from 'zod';
import { PhotoPicker } from '#src/components/photo/photo-picker.tsx';
import { PhotoViewer } from '#src/components/photo/photo-viewer.tsx';
import { Thumb, ThumbGrid } from '#src/components/photo/thumb.tsx';
import { usePick } from '#src/components/photo/use-pick.ts';
import { browserWorld } from '#src/replica/browser-world.ts';
import { ReplicaProvider, useMe, useRead, useReplica, useSyncState } from '#src/replica/hooks.tsx';
import { openReplica, type LiveReplica } from '#src/replica/live-replica.ts';
import { startSyncLoop } from '#src/replica/sync-loop.ts';
import '#src/styles.css';

z.config({ jitless: true });

declare global {
  interface Window {
    replica: LiveReplica;
  }
}

function PhotoPage() {
  const replica = useReplica();
  const { heldPhotos } = useSyncState();
  const boat = useRead(['boat'], (view) => view.all('boat')[0]);
  const photos = useRead(['photos'], (view) =>
    view.all('photo').map(({ id, sha256, width, height, caption }, index) => ({
      id,
      sha256,
      width,
      height,
      words: caption ?? `Photo ${index + 1}`,
    })),
  );
  const picking = usePick((files, onProgress) =>
    replica.attachPhotos(files, { boatId: boat!.id }, onProgress),
  );
  const [shownId, setShownId] = useState<string | null>(null);
  return (
    <main className="mx-auto grid max-w-[820px] gap-4 p-4">
      <h1>{boat?.name ?? 'No boat'}</h1>
      <p>{heldPhotos} held</p>
      <ThumbGrid>
        {photos.map(({ id, sha256, words }) => (
          <Thumb key={id} sha256={sha256} words={words} onOpen={() => setShownId(id)} />
        ))}
      </ThumbGrid>
      <PhotoPicker {...picking} />
      {shownId !== null && (
        <PhotoViewer photos={photos} shownId={shownId} onShow={setShownId} onClose={() => setShownId(null)} />
      )}
    </main>
  );
}

function SignedIn() {
  return useMe() ? <PhotoPage /> : <p>Nobody is signed in.</p>;
}

void navigator.serviceWorker.register('/sw.js');
const world = browserWorld('0.1.0', () => {});
const replica = await openReplica(world);
startSyncLoop(replica, world);
window.replica = replica;
createRoot(document.getElementById('root')!).render(
  <QueryClientProvider client={new QueryClient()}>
    <ReplicaProvider replica={replica}>
      <SignedIn />
    </ReplicaProvider>
  </QueryClientProvider>,
);
