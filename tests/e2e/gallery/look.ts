import { mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { SCREENS, SETS, SIZES, openGallery } from '#tests/e2e/gallery/open-gallery.ts';

// `tsx tests/e2e/gallery/look.ts FOLDER` leaves a picture of every screen in every set and size there
const folder = process.argv[2];
if (!folder) throw new Error('say which folder the pictures go to');
await mkdir(folder, { recursive: true });
const gallery = await openGallery();
for (const screen of SCREENS) {
  for (const set of SETS) {
    for (const size of Object.keys(SIZES) as (keyof typeof SIZES)[]) {
      const page = await gallery.show(screen, set, size);
      await page.screenshot({
        path: join(folder, `${screen}-${set}-${size}.png`),
        fullPage: size === 'tablet',
      });
      await page.context().close();
    }
  }
}
await gallery.close();
