import { act, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ClientProvider } from './client-context';
import { modelReading } from './fakes/model-lab';
import { exchange, labOf, newWorld, openTab, signIn } from './fakes/tablet';
import { settle } from './fakes/virtual-time';
import type { HoldoffClient } from './holdoff-client';
import { useAppend } from './use-append';
import { useBookState, useEntryState, useFirings, usePending, useReadings, useRigs } from './use-book';
import { useDraft } from './use-draft';
import { useHandover } from './use-handover';
import { useDeclared, useReadiness } from './use-now';
import { useSession } from './use-session';

vi.setConfig({ testTimeout: 30_000 });

const open: HoldoffClient[] = [];
afterEach(async () => {
  for (const client of open.splice(0)) await act(() => client.close());
});

function Bench({ rig }: { readonly rig: string }) {
  const session = useSession();
  const rigs = useRigs();
  const { words } = usePending();
  const { filling, letter } = useBookState();
  const missing = useReadiness(rig);
  const declared = useDeclared(rig);
  const [firing] = useFirings(rig);
  const { readings } = useReadings(firing?.id ?? '');
  const state = useEntryState(readings[0]?.id ?? '');
  const handover = useHandover();
  const draft = useDraft('note', 'nothing yet');
  const append = useAppend();
  const log = async () => {
    const unready = { missing: [{ code: 'x', words: 'x' }], why: 'x' };
    const outcome = await append({
      kind: 'firing.opened',
      body: { rig, rig_revision: rig, check: null, permit: null, unready },
    });
    if (outcome.type === 'logged')
      await append({ kind: 'firing.reading', subject: outcome.entry.id, body: modelReading() });
  };
  return (
    <dl>
      <dd>session {session.state}</dd>
      <dd>rigs {rigs.map((one) => one.name).join(', ')}</dd>
      <dd>pending: {words}</dd>
      <dd>
        book {letter} {filling ? 'filling' : 'filled'}
      </dd>
      <dd>missing {missing?.map((one) => one.code).join(' ')}</dd>
      <dd>declared {declared?.state}</dd>
      <dd>readings {readings.length}</dd>
      <dd>place {state?.place}</dd>
      <dd>handover {handover.state}</dd>
      <dd>draft {draft.value}</dd>
      <button onClick={() => void log()}>log</button>
      <button onClick={() => draft.set((now) => `${now}!`)}>type</button>
    </dl>
  );
}

describe('the hooks of the Book', () => {
  it('stand still before a lab is open', async () => {
    const world = newWorld();
    const { client } = await openTab(world.newBrowser());
    open.push(client);
    render(
      <ClientProvider client={client}>
        <Bench rig={world.lab.rig} />
      </ClientProvider>,
    );
    expect(screen.getByText('session no-lab')).toBeDefined();
    expect(screen.getByText('book filling')).toBeDefined();
  });

  it('follow what is logged, handed over and typed', async () => {
    const world = newWorld();
    const { client } = await openTab(world.newBrowser());
    open.push(client);
    const lab = await signIn(client, 'Ada');
    await exchange(lab);
    render(
      <ClientProvider client={client}>
        <Bench rig={world.lab.rig} />
      </ClientProvider>,
    );
    const rest = () => act(() => settle(300));
    await rest();
    for (const text of [
      'session open',
      'rigs Heron',
      'book A filled',
      'missing no-check',
      'declared not-known',
    ])
      expect(screen.getByText(text)).toBeDefined();
    expect(screen.getByText('pending: Nothing waits on this tablet.')).toBeDefined();

    act(() => {
      screen.getByText('log').click();
      screen.getByText('type').click();
    });
    await rest();
    for (const text of ['pending: 2 entries on this tablet only.', 'readings 1', 'place on this tablet'])
      expect(screen.getByText(text)).toBeDefined();
    expect(screen.getByText('declared firing')).toBeDefined();
    expect(screen.getByText('draft nothing yet!')).toBeDefined();

    await act(() => exchange(labOf(client)));
    await rest();
    expect(screen.getByText('place sent')).toBeDefined();
    expect(screen.getByText('pending: Nothing waits on this tablet.')).toBeDefined();
  });
});
