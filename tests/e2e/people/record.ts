import { v7 } from 'uuid';
import { DEMO_PASSWORD } from '#server/demo/demo-people.ts';
import type { EntryRow } from '#shared/entry/entry.ts';
import { sessionAnswerSchema } from '#shared/identity/session.ts';
import type { LooseEnd } from '#shared/sync/loose-ends.ts';
import { syncAnswerSchema } from '#shared/sync/protocol.ts';
import type { TaskRow } from '#shared/task/task.ts';

/** The shop's record as the server gives it to somebody who asks for all of it. */
export interface ShopRecord {
  entries: EntryRow[];
  tasks: TaskRow[];
  looseEnds: LooseEnd[];
  setAsides: unknown[];
}

// one computer, however often it asks
const deviceId = v7();

/** Pulls the whole record from the server, as the office would on a new computer. */
export async function readRecord(serverUrl: string): Promise<ShopRecord> {
  const device = { id: deviceId, label: 'Office, spare' };
  const credentials = { email: 'imelda@hornbeam.example', password: DEMO_PASSWORD };
  const session = sessionAnswerSchema.parse(
    await post(`${serverUrl}/api/session`, { ...credentials, device }),
  );
  const rows: { entity: string; row: unknown }[] = [];
  for (let cursor: string | null = null, more = true; more;) {
    const body = { deviceId, cursor, ops: [] };
    const answer = syncAnswerSchema.parse(await post(`${serverUrl}/api/sync`, body, session.accessToken));
    rows.push(...answer.rows);
    ({ cursor, more } = answer);
  }
  const all = <T>(entity: string) =>
    rows.filter((each) => each.entity === entity && each.row !== null).map(({ row }) => row as T);
  return {
    entries: all('entry'),
    tasks: all('task'),
    looseEnds: all('looseEnd'),
    setAsides: all('setAside'),
  };
}

async function post(url: string, body: object, token?: string): Promise<unknown> {
  const headers = new Headers({ 'Content-Type': 'application/json' });
  if (token) headers.set('Authorization', `Bearer ${token}`);
  const response = await fetch(url, {
    method: 'POST',
    headers,
    body: JSON.stringify(body),
  });
  if (!response.ok) throw new Error(`${url} answered ${response.status}: ${await response.text()}`);
  return response.json();
}
