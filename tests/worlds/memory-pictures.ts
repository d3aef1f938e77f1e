import type { MemoryStore } from '#shared/sync/memory-store.ts';
import type { PhotoRow } from '#shared/photo/photo.ts';
import { sha256Of } from '#src/replica/photos/sha256.ts';

interface Asked {
  method: string;
  path: string;
  body: unknown;
}

/** What a server in memory has of pictures, and every request for one that has come to it. */
export class MemoryPictures {
  readonly kept = new Map<string, Blob>();
  /** `PUT <sha256>/thumb`, in the order in which they came */
  readonly asked: string[] = [];
  /** answers so to the PUT of a picture, as long as it is set */
  refuse: ((name: string) => { status: number; detail: string } | null) | null = null;
  private readonly store: () => MemoryStore;

  constructor(store: () => MemoryStore) {
    this.store = store;
  }

  async answer({ method, path, body }: Asked): Promise<Response> {
    const [, sha256, rest = '/full'] =
      /^\/api\/photos\/([0-9a-f]{64})(\/thumb|\?size=\w+)?$/.exec(path) ?? [];
    if (!sha256) return problem(404, 'There is nothing here.');
    const size = rest.replace(/^(\/|\?size=)/, '');
    this.asked.push(`${method} ${sha256}/${size}`);
    if (method === 'PUT') return this.put(sha256, size, (body as FormData).get('photo') as Blob);
    const blob = this.kept.get(`${sha256}/${size === 'view' ? 'full' : size}`);
    if (!blob) return problem(404, 'It has not come yet.');
    return new Response(method === 'HEAD' ? null : blob, { headers: { 'Content-Type': 'image/jpeg' } });
  }

  private async put(sha256: string, size: string, blob: Blob): Promise<Response> {
    const refused = this.refuse?.(`${sha256}/${size}`);
    if (refused) return problem(refused.status, refused.detail);
    if (size === 'full' && (await sha256Of(await blob.arrayBuffer())) !== sha256)
      return problem(422, 'The bytes are not those that the name promises.');
    const wasThere = this.kept.has(`${sha256}/${size}`);
    this.kept.set(`${sha256}/${size}`, blob);
    this.tellArrived(sha256);
    return new Response(null, { status: wasThere ? 200 : 201 });
  }

  private tellArrived(sha256: string): void {
    const arrived = this.kept.has(`${sha256}/full`) ? 'full' : 'thumb';
    for (const { entity, id, row } of this.store().feed(0)) {
      if (entity === 'photo' && (row as PhotoRow | null)?.sha256 === sha256)
        this.store().put('photo', id, { ...row, arrived });
    }
  }
}

function problem(status: number, detail: string): Response {
  return new Response(JSON.stringify({ status, detail }), {
    status,
    headers: { 'Content-Type': 'application/problem+json' },
  });
}
