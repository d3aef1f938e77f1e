import sharp from 'sharp';
import { v7 } from 'uuid';
import { nameOf } from '#tests/worlds/pictures.ts';
import { startServer } from '#tests/worlds/server.ts';
import { serveBareUpload, type BareUpload } from './bare-upload.ts';
import { makeCrew, type Crew } from './crew.ts';
import { timed, type Finding, type Pair } from './measuring.ts';
import { fileBody, putFile } from './wire.ts';

const PHOTOS = 100;
const PHOTO_BYTES = 300 * 1024;
const FIELD = 'photo';
const AT_ONCE = 4;
const WARM_UPS = 2;
const ROUNDS = 8;
/** 0.8 of the bare one's speed */
const GOAL = 1.25;

interface Upload {
  sha256: string;
  body: Buffer;
}

type Put = (upload: Upload) => Promise<unknown>;

/** 100 photos of 300 KiB whose ops have come before, through PUT /api/photos, against a raw upload to disk with fsync. */
export async function benchPhotos(): Promise<Finding[]> {
  const server = await startServer();
  const bare = await serveBareUpload(FIELD);
  try {
    const crew = await makeCrew(server, ['crew']);
    const makeUpload = await uploadMaker();
    const round = async (atOnce: number) => timeRound(crew, bare, Array.from({ length: PHOTOS }, makeUpload), atOnce);
    const [apart, together]: [Pair[], Pair[]] = [[], []];
    for (let count = 0; count < WARM_UPS + ROUNDS; count += 1) {
      apart.push(await round(1));
      together.push(await round(AT_ONCE));
    }
    const name = `${PHOTOS} photos of 300 KiB`;
    return [
      { what: `${name}, one at a time`, pairs: apart.slice(WARM_UPS), goal: GOAL },
      { what: `${name}, ${AT_ONCE} at a time`, pairs: together.slice(WARM_UPS), goal: GOAL },
    ];
  } finally {
    await bare.close();
    await server.close();
  }
}

async function timeRound(crew: Crew, bare: BareUpload, uploads: Upload[], atOnce: number): Promise<Pair> {
  await attach(crew, uploads);
  const { accessToken } = crew.hands[0]!.session;
  const oursMs = await timed(() => putAll(uploads, atOnce, ({ sha256, body }) => putFile(`${crew.server.url}/api/photos/${sha256}`, accessToken, body)));
  const bareMs = await timed(() => putAll(uploads, atOnce, ({ body }) => putFile(bare.url, accessToken, body)));
  return { oursMs, bareMs };
}

// so that each arrival changes a row and is hailed
async function attach({ hands: [hand], yard }: Crew, uploads: Upload[]): Promise<void> {
  const { boatId, stageId } = yard;
  const ops = uploads.map(({ sha256 }) =>
    hand!.op('photo.attach', { photoId: v7(), sha256, boatId, stageId, width: 640, height: 480, bytes: PHOTO_BYTES }),
  );
  const outcomes = await hand!.send(...ops);
  if (outcomes.some(({ outcome }) => outcome !== 'kept')) throw new Error('Some photos were not attached.');
}

async function putAll(uploads: Upload[], atOnce: number, put: Put): Promise<void> {
  const left = uploads.values();
  const putOnes = async () => {
    for (const upload of left) await put(upload);
  };
  await Promise.all(Array.from({ length: atOnce }, putOnes));
}

/** Each a JPEG with a comment of its own, so that no two have one name. */
async function uploadMaker(): Promise<() => Upload> {
  const picture = await pictureOfSize();
  return () => {
    const comment = Buffer.from(`\xff\xfe\0\x26${v7()}`, 'latin1');
    const bytes = Buffer.concat([picture.subarray(0, 2), comment, picture.subarray(2)]);
    return { sha256: nameOf(bytes), body: fileBody(FIELD, bytes) };
  };
}

/** Noise, cut to the height at which it weighs 300 KiB. */
async function pictureOfSize(): Promise<Buffer> {
  const width = 1280;
  const noise = (height: number) =>
    sharp({ create: { width, height, channels: 3, background: '#777', noise: { type: 'gaussian', mean: 120, sigma: 30 } } })
      .jpeg({ quality: 82 })
      .toBuffer();
  const trial = await noise(512);
  return noise(Math.round((512 * PHOTO_BYTES) / trial.length));
}
