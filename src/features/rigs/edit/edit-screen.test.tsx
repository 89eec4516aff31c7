import { act, fireEvent, render, screen, within } from '@testing-library/react';
import { MemoryRouter, Route, Routes } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { FrameProvider } from '../../../components/frame';
import { HoldStage } from '../../../components/hold-stage';
import { ClientProvider } from '../../../data/client-context';
import { exchange, newWorld, openTab, signIn } from '../../../data/fakes/tablet';
import { settle } from '../../../data/fakes/virtual-time';
import type { HoldoffClient } from '../../../data/holdoff-client';
import { HERON } from '../rigs.fixture';
import { NewRigRoute } from '../new-rig-route';
import { ReviseRigRoute } from '../revise-rig-route';

vi.setConfig({ testTimeout: 30_000 });

const open: HoldoffClient[] = [];
afterEach(async () => {
  for (const client of open.splice(0)) await act(() => client.close());
});

const rest = () => act(() => settle(50));

async function opened(path: (rig: string) => string) {
  const world = newWorld();
  const { client } = await openTab(world.newBrowser());
  open.push(client);
  const lab = await signIn(client, 'Ada');
  await exchange(lab);
  const body = { based_on: world.lab.rig, spec: HERON, why: 'As it is at the bench' };
  await lab.append({ kind: 'rig.revised', subject: world.lab.rig, body });
  const start = path(world.lab.rig);
  render(
    <ClientProvider client={client}>
      <HoldStage>
        <FrameProvider strip={null} tooth={null} places={null}>
          <MemoryRouter initialEntries={[start]}>
            <Routes>
              <Route path="/rigs/new" element={<NewRigRoute />} />
              <Route path="/rigs/:rig/revise" element={<ReviseRigRoute />} />
              <Route path="/rigs/:rig" element={<p>the rig itself</p>} />
            </Routes>
          </MemoryRouter>
        </FrameProvider>
      </HoldStage>
    </ClientProvider>,
  );
  await rest();
}

async function touch(element: HTMLElement): Promise<void> {
  fireEvent.pointerDown(element, { button: 0, isPrimary: true, pointerId: 1 });
  fireEvent.pointerUp(element, { button: 0, isPrimary: true, pointerId: 1 });
  fireEvent.click(element);
  await rest();
}

const button = (name: string | RegExp) => screen.getByRole('button', { name });

async function type(field: RegExp, text: string): Promise<void> {
  const [row] = screen.getAllByRole('button', { name: field });
  if (row === undefined) throw new Error(`no field ${String(field)}`);
  await touch(row);
  const pad = screen.getAllByRole('group').find((one) => one.className === 'keypad');
  if (pad === undefined) throw new Error('no keypad');
  for (const key of ['Delete', ...text, 'Enter']) fireEvent.keyDown(pad, { key });
  await rest();
}

describe('revising a rig', () => {
  it('refuses a number in words beside its field, and shows what a good one changes before the hold', async () => {
    await opened((rig) => `/rigs/${rig}/revise`);
    await touch(button(/Envelope/));
    await type(/^Envelope voltage/, '900');
    expect(screen.getAllByText(/must be at most 200/).length).toBeGreaterThan(0);
    await touch(button('Leave as it was'));
    await type(/^Envelope rate/, '1');
    await touch(button('Review'));
    const changes = screen.getByRole('region', { name: 'Changes' });
    expect(within(changes).getByText('Envelope rate')).toBeDefined();
    expect(within(changes).getByText('Touches safety')).toBeDefined();
    expect(screen.getByText(/no permit to lose|is void with it/)).toBeDefined();
    expect(button(/Hold\s+to revise/).getAttribute('aria-description')).toBe('Say why the rig is revised.');
  });
});

describe('a new rig', () => {
  it('suggests what is open, and does not take a suggestion for entered', async () => {
    await opened(() => '/rigs/new');
    await touch(screen.getByRole('radio', { name: 'charge transfer' }));
    await touch(button(/Next:\s+Spark gap/));
    expect(screen.getAllByText('open').length).toBeGreaterThan(1);
    await touch(button('Suggest what is open'));
    expect(screen.getAllByText('suggested').length).toBeGreaterThan(3);
    await touch(button('These are right'));
    expect(screen.queryByText('suggested')).toBeNull();
    await touch(button('All sections'));
    await touch(button('Review'));
    expect(button(/Hold\s+to create/).getAttribute('aria-description')).toBe('Give the rig a name.');
  });

  it('begins as a copy of another rig, whole', async () => {
    await opened(() => '/rigs/new');
    await touch(screen.getByRole('radio', { name: /copy of Heron/ }));
    await touch(button('All sections'));
    await touch(button('Review'));
    expect(screen.queryByRole('region', { name: 'What is still open' })).toBeNull();
    fireEvent.change(screen.getByLabelText(/Name of the rig/), { target: { value: 'Heron' } });
    await rest();
    expect(button(/Hold\s+to create/).getAttribute('aria-description')).toContain('called Heron already');
    fireEvent.change(screen.getByLabelText(/Name of the rig/), { target: { value: 'Egret' } });
    await rest();
    expect(button(/Hold\s+to create/).getAttribute('aria-disabled')).toBe('false');
  });
});
