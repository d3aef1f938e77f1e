import { PictureError, type PreparedPicture } from '#src/replica/photos/picture.ts';
import { sha256Of } from '#src/replica/photos/sha256.ts';

/** What a browser makes of a picture, where there is none to draw with: its bytes as they are. A `.txt` is no picture. */
export async function preparedAsItIs(file: File): Promise<PreparedPicture> {
  if (file.name.endsWith('.txt')) throw new PictureError(`‘${file.name}’ is no picture.`);
  const bytes = await file.arrayBuffer();
  const full = new Blob([bytes], { type: 'image/jpeg' });
  const thumb = new Blob([`thumb of ${file.name}`], { type: 'image/jpeg' });
  return { full, thumb, sha256: await sha256Of(bytes), width: 2560, height: 1920, bytes: bytes.byteLength };
}

/** A file whose bytes are its name and `more`. */
export function pictureFile(name: string, more = ''): File {
  return new File([`${name}${more}`], name, { type: 'image/jpeg' });
}
