import type { KeptPicture, PhotoAbout } from '#src/replica/photos/picture.ts';
import type { Holding, Replica } from '#src/replica/replica.ts';

/** Holds ops and attaches kept pictures in one write, so that neither is ever there without the other. */
export async function holdTogether(
  replica: Replica,
  holdings: Holding[],
  pictures: KeptPicture[],
  about: PhotoAbout,
): Promise<void> {
  if (pictures.length > 0) await replica.attachKept(pictures, about, holdings);
  else if (holdings.length > 0) await replica.holdAll(holdings);
}
