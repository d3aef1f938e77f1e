import { useState } from 'react';
import type { FailedPicture, PickProgress } from '#src/replica/photos/picture.ts';

type Take<Taken extends { failed: FailedPicture[] }> = (
  files: File[],
  onProgress: (progress: PickProgress) => void,
) => Promise<Taken>;

/** What a PhotoPicker needs: hands each pick to `take` (to attach or to keep it), and what came of it to `onTaken`. */
export function usePick<Taken extends { failed: FailedPicture[] }>(
  take: Take<Taken>,
  onTaken: (taken: Taken) => void = () => {},
) {
  const [progress, setProgress] = useState<PickProgress | null>(null);
  const [failed, setFailed] = useState<FailedPicture[]>([]);
  const pick = async (files: File[]) => {
    setFailed([]);
    setProgress({ done: 0, of: files.length });
    try {
      const taken = await take(files, setProgress);
      setFailed(taken.failed);
      onTaken(taken);
    } finally {
      setProgress(null);
    }
  };
  return { onPick: (files: File[]) => void pick(files), progress, failed };
}
