import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, configure, render } from '@testing-library/react';
import { v7 } from 'uuid';
import { MemoryRouter } from 'react-router-dom';
import { ReplicaProvider } from '#src/replica/hooks.tsx';
import { AppRoutes } from '#src/routes.tsx';
import { MemoryServer } from '#tests/worlds/memory-server.ts';
import { Phone, type Tab } from '#tests/worlds/phone.ts';

// a screen's code is read from the disk when it is first opened
configure({ asyncUtilTimeout: 5000 });

const START_MS = Date.parse('2026-06-01T08:00:00Z');

/** A crew member's phone with the whole app on it, over a server in memory that has a boat with a stage and a task. */
export class CrewPhone {
  readonly server = new MemoryServer(v7({ msecs: START_MS }), () => START_MS);
  readonly phone = new Phone('phone', this.server, () => START_MS, 7);
  tab!: Tab;
  boatId = '';
  stageId = '';
  taskId = '';

  static async open(): Promise<CrewPhone> {
    const crew = new CrewPhone();
    const [foreman, rosa, wes] = [v7(), v7(), v7()];
    crew.server.addPerson(foreman, 'Orrin', ['foreman']);
    crew.server.addPerson(rosa, 'Rosa', ['crew']);
    crew.server.addPerson(wes, 'Wes', ['crew']);
    await crew.fillShop();
    crew.tab = (await crew.phone.openTab())!;
    await crew.signIn(crew.tab, 'Rosa');
    return crew;
  }

  get replica() {
    return this.tab.replica;
  }

  /** The app at an address, as the phone shows it. */
  show(path: string) {
    cleanup();
    return render(
      <QueryClientProvider client={new QueryClient()}>
        <ReplicaProvider replica={this.replica}>
          <MemoryRouter initialEntries={[path]}>
            <AppRoutes />
          </MemoryRouter>
        </ReplicaProvider>
      </QueryClientProvider>,
    );
  }

  /** The phone dies at once and is started again. */
  async dieAndStart(): Promise<void> {
    this.phone.cutPower();
    cleanup();
    this.tab = (await this.phone.openTab())!;
  }

  private async signIn({ replica }: Tab, name: string): Promise<void> {
    const request = { email: `${name}@ribband.test`, password: 'tight seam', label: `${name}'s phone` };
    const result = await replica.session.signIn(request);
    if (!('ok' in result)) throw new Error(JSON.stringify(result));
    await replica.syncNow();
  }

  private async fillShop(): Promise<void> {
    const tab = (await new Phone('desk', this.server, () => START_MS, 8).openTab())!;
    const { replica } = tab;
    await this.signIn(tab, 'Orrin');
    [this.boatId, this.stageId, this.taskId] = [replica.newId(), replica.newId(), replica.newId()] as const;
    const { boatId, stageId, taskId } = this;
    await replica.hold('boat.add', { boatId, name: 'Penny Candle', arrivedOn: '2026-05-01' });
    await replica.hold('stage.add', { stageId, boatId, name: 'Strip', order: 1, after: [] });
    await replica.hold('task.add', { taskId, boatId, stageId, title: 'Draw the screws' });
    await replica.syncNow();
    tab.power.cut();
  }
}
