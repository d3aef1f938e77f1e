import { v7 } from 'uuid';
import type { SyncAnswer, SyncRequest } from '#shared/sync/protocol.ts';
import { formatStamp } from '#shared/sync/stamp.ts';
import type { TestServer } from './server.ts';
import { signIn, type SignedIn, type TestPerson } from './shop.ts';

export interface MadeOp {
  id: string;
  v: number;
  kind: string;
  at: string;
  personId: string;
  over: Record<string, string[]>;
  data: Record<string, unknown>;
}

export interface SyncResponse {
  status: number;
  /** the answer; what a problem says where `status` is not 200 */
  body: SyncAnswer;
}

/** A person signed in on a device, who makes ops and speaks the sync protocol by hand. */
export class Sender {
  readonly session: SignedIn;
  private readonly server: TestServer;
  private counter = 0;

  constructor(server: TestServer, session: SignedIn) {
    this.server = server;
    this.session = session;
  }

  get personId(): string {
    return this.session.person.id;
  }

  get deviceId(): string {
    return this.session.deviceId;
  }

  op(kind: string, data: Record<string, unknown>, changes: Partial<MadeOp> = {}): MadeOp {
    this.counter += 1;
    const at = formatStamp({ ms: this.server.clock.now(), counter: this.counter }, this.deviceId);
    return { id: v7(), v: 1, kind, at, personId: this.personId, over: {}, data, ...changes };
  }

  async sync(request: Partial<SyncRequest> = {}): Promise<SyncResponse> {
    return this.post(JSON.stringify({ deviceId: this.deviceId, cursor: null, ops: [], ...request }));
  }

  /** Sends ops and hears nothing but what became of them. */
  async send(...ops: unknown[]): Promise<SyncAnswer['outcomes']> {
    const { status, body } = await this.sync({ ops, limit: 1 });
    if (status !== 200) throw new Error(`Sync answered ${status}: ${JSON.stringify(body)}`);
    return body.outcomes;
  }

  /** Every row of the feed after `cursor`, page by page. */
  async pullAll(cursor: string | null = null, limit = 1000): Promise<{ rows: SyncAnswer['rows']; cursor: string }> {
    const rows: SyncAnswer['rows'] = [];
    for (;;) {
      const { body } = await this.sync({ cursor, limit });
      rows.push(...body.rows);
      cursor = body.cursor;
      if (!body.more) return { rows, cursor };
    }
  }

  async post(body: BodyInit, headers: Record<string, string> = {}): Promise<SyncResponse> {
    const response = await fetch(`${this.server.url}/api/sync`, {
      method: 'POST',
      headers: { Authorization: `Bearer ${this.session.accessToken}`, 'Content-Type': 'application/json', ...headers },
      body,
    });
    return { status: response.status, body: (await response.json()) as SyncAnswer };
  }
}

export async function senderFor(server: TestServer, person: TestPerson, deviceId?: string): Promise<Sender> {
  return new Sender(server, await signIn(server, person, deviceId));
}

export interface Yard {
  boatId: string;
  stageId: string;
  taskId: string;
}

/** A boat with a stage and a task on her, as the foreman makes them. */
export async function layDown(foreman: Sender): Promise<Yard> {
  const yard = { boatId: v7(), stageId: v7(), taskId: v7() };
  const { boatId, stageId, taskId } = yard;
  await foreman.send(
    foreman.op('boat.add', { boatId, name: 'Dunlin' }),
    foreman.op('stage.add', { stageId, boatId, name: 'Planking', order: 1, after: [] }),
    foreman.op('task.add', { taskId, boatId, stageId, title: 'Fair the garboards' }),
  );
  return yard;
}

/** An entry of two hours by whoever sends it. */
export function entryBy(sender: Sender, { boatId, stageId }: Yard, changes: Record<string, unknown> = {}): MadeOp {
  return sender.op('entry.write', {
    entryId: v7(),
    boatId,
    stageId,
    workDate: '2026-06-01',
    text: 'Two strakes hung on the port side.',
    spoken: false,
    hours: [{ personId: sender.personId, minutes: 120 }],
    ...changes,
  });
}
