const TIFF_BYTES = 26;
const ORIENTATION_TAG = 0x0112;
const SHORT = 3;

/** How a picture is to be turned to stand upright, 1 to 8 (Exif 2.32, 4.6.4); 1 is as it is. */
export type Orientation = number;

/** An Exif block (a TIFF header and one directory) that says nothing but the orientation. */
export function orientationOnly(orientation: Orientation): Buffer {
  const block = Buffer.alloc(TIFF_BYTES);
  block.write('II*\0', 'latin1');
  block.writeUInt32LE(8, 4); // the directory begins after the header
  block.writeUInt16LE(1, 8);
  block.writeUInt16LE(ORIENTATION_TAG, 10);
  block.writeUInt16LE(SHORT, 12);
  block.writeUInt32LE(1, 14);
  block.writeUInt16LE(orientation, 18);
  return block;
}
