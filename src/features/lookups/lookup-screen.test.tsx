import { act, fireEvent, render, screen, within } from '@testing-library/react';
import { MemoryRouter, Route, Routes } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { FrameProvider } from '../../components/frame';
import { HoldStage } from '../../components/hold-stage';
import { paths, patterns } from '../../config/paths';
import { ClientProvider } from '../../data/client-context';
import { exchange, newWorld, openTab, signIn } from '../../data/fakes/tablet';
import { settle } from '../../data/fakes/virtual-time';
import type { HoldoffClient } from '../../data/holdoff-client';
import { LOOKUPS } from '../../domain/lookup/lookups';
import { kettleLikeSpec, labSettings } from '../../domain/lookup/rig.fixture';
import { LookupRoute } from './lookup-route';
import { LookupsRoute } from './lookups-route';

vi.setConfig({ testTimeout: 30_000 });

const open: HoldoffClient[] = [];
afterEach(async () => {
  vi.unstubAllGlobals();
  for (const client of open.splice(0)) await act(() => client.close());
});

const rest = () => act(() => settle(50));

async function opened(path: (rig: string) => string = (rig) => paths.lookup('gap', rig)) {
  const world = newWorld();
  const { rig, ada, inge, server, write } = world.lab;
  write('lab.set', inge, { subject: server.lab.id, body: labSettings });
  write('rig.revised', ada, {
    subject: rig,
    body: { based_on: rig, number: '7A', spec: kettleLikeSpec, why: 'As it is at the bench' },
  });
  const { client } = await openTab(world.newBrowser());
  open.push(client);
  const lab = await signIn(client, 'Ada');
  await exchange(lab);
  render(
    <ClientProvider client={client}>
      <HoldStage>
        <FrameProvider strip={null} tooth={null} places={null}>
          <MemoryRouter initialEntries={[path(world.lab.rig)]}>
            <Routes>
              <Route path={patterns.lookupsOf} element={<LookupsRoute />} />
              <Route path={patterns.lookup} element={<LookupRoute />} />
              <Route path={patterns.lookupWithoutRig} element={<LookupRoute />} />
            </Routes>
          </MemoryRouter>
        </FrameProvider>
      </HoldStage>
    </ClientProvider>,
  );
  await rest();
  return { lab };
}

async function touch(element: HTMLElement): Promise<void> {
  fireEvent.click(element);
  await rest();
}
const button = (name: string | RegExp) => screen.getByRole('button', { name });

async function type(text: string): Promise<void> {
  const group = screen.getByRole('group', { name: 'Pressure' });
  await touch(within(group).getByRole('button', { name: /^\u2212?[\d.]+.bar\(g\)$/ }));
  const pad = screen.getAllByRole('group').find((one) => one.className === 'keypad');
  if (pad === undefined) throw new Error('no keypad');
  for (const key of ['Delete', ...text, 'Enter']) fireEvent.keyDown(pad, { key });
  await rest();
}

describe('a lookup on screen', () => {
  it('is prefilled from the rig and says where every value comes from', async () => {
    await opened();
    expect(button(/^Gap.*rev.*3\.00 mm/)).toBeDefined();
    expect(button(/^Ambient.*lab/)).toBeDefined();
    expect(screen.getByText(/streamer integral/).textContent).toContain('bar(abs)');
  });

  it('keeps the value while a bad one is refused in words, and takes a good one as what if', async () => {
    await opened();
    await type('-3');
    expect(screen.getAllByText(/^Pressure: must be at least/).length).toBeGreaterThan(0);
    await touch(button('Back'));
    await type('1.5');
    const group = screen.getByRole('group', { name: 'Pressure' });
    expect(within(group).getByText(/^what if/)).toBeDefined();
    await touch(button('Back to the rig'));
    expect(within(screen.getByRole('group', { name: 'Pressure' })).queryByText(/what if/)).toBeNull();
  });

  it('answers while the slider moves', async () => {
    await opened();
    const chart = () => screen.getByRole('figure').getAttribute('aria-label');
    const before = chart();
    fireEvent.keyDown(screen.getByRole('slider', { name: 'Slide pressure' }), { key: 'PageUp' });
    await rest();
    expect(chart()).not.toBe(before);
    expect(chart()).toContain('1.30 bar gauge');
  });

  it('solves for a pressure by what it is for, and takes what was found', async () => {
    await opened();
    await touch(button(/^Find/));
    await touch(screen.getByRole('radio', { name: 'pressure' }));
    await touch(screen.getByRole('radio', { name: 'hold off at least' }));
    expect(screen.getByText('found')).toBeDefined();
    const held = screen.getByText('found').closest('.field-row')?.textContent;
    await touch(screen.getByRole('radio', { name: 'break at most' }));
    expect(screen.getByText('found').closest('.field-row')?.textContent).not.toBe(held);
    await touch(button(/^Take /));
    expect(screen.queryByText('found')).toBeNull();
    expect(within(screen.getByRole('group', { name: 'Pressure' })).getByText(/^what if/)).toBeDefined();
  });

  it('asks for the ambient instead of assuming one, and says help at the label', async () => {
    await opened();
    await touch(button(/^Ambient/));
    await touch(button('Ambient'));
    expect(screen.getByRole('dialog', { name: 'Ambient' }).textContent).toContain('It has no default');
  });

  it('sweeps an input against figures that share a unit', async () => {
    await opened();
    await touch(button('Sweep'));
    expect(screen.getByRole('figure', { name: 'Gap: law against pressure' })).toBeDefined();
    await touch(button('Change'));
    const figures = within(screen.getByRole('group', { name: 'Figures' }));
    await touch(figures.getByRole('checkbox', { name: 'may hold up to, kV' }));
    await touch(screen.getByRole('radio', { name: 'gap' }));
    await touch(button('Done'));
    expect(screen.getByRole('figure', { name: 'Gap: law and may hold up to against gap' })).toBeDefined();
    await touch(button('Answer'));
    expect(screen.queryByText(/against/)).toBeNull();
  });

  it('copies the answer as a table, and shows it where the browser does not copy', async () => {
    await opened();
    const written: string[] = [];
    vi.spyOn(navigator.clipboard, 'writeText').mockImplementation((text) => {
      written.push(text);
      return Promise.resolve();
    });
    await touch(button('Copy as table'));
    expect(written[0]).toContain('Quantity\tValue\tUnit');
    expect(screen.getByText('Copied.')).toBeDefined();
    vi.spyOn(navigator.clipboard, 'writeText').mockRejectedValue(new Error('denied'));
    await touch(button('Copy as table'));
    expect(screen.getByRole('dialog', { name: 'Not copied' })).toBeDefined();
    expect(screen.getByRole<HTMLTextAreaElement>('textbox', { name: 'Table' }).value).toContain('law\t');
  });

  it('prints a bench table with rig, model, cautions, day and who', async () => {
    await opened();
    let printed = '';
    vi.stubGlobal('print', () => {
      printed = document.querySelector('.print-sheet')?.textContent ?? '';
    });
    await touch(button('Print for the wall'));
    await rest();
    for (const words of [
      'Pressure, bar(g)',
      'may hold up to, kV',
      'Model:',
      'no gas gap is a barrier',
      'by Ada',
    ])
      expect(printed).toContain(words);
    expect(document.querySelector('.print-sheet')).toBeNull();
  });

  it('opens what must be read with a help for every quantity', async () => {
    await opened();
    await touch(button(/where it holds/));
    const dialog = within(screen.getByRole('dialog', { name: 'Before you trust this number' }));
    expect(dialog.getByText('Ambient')).toBeDefined();
    expect(dialog.getByText(/The model holds/)).toBeDefined();
  });
});

describe('every lookup of the registry', () => {
  it('stands in the list for the rig', async () => {
    await opened((rig) => paths.lookupsOf(rig));
    for (const { title } of LOOKUPS)
      expect(screen.getByRole('link', { name: new RegExp(`^${title}`) })).toBeDefined();
  });

  it.each(LOOKUPS.map((lookup) => [lookup.key]))('%s opens with and without a rig', async (key) => {
    for (const path of [(rig: string) => paths.lookup(key, rig), () => paths.lookupWithoutRig(key)]) {
      await opened(path);
      expect(screen.getAllByRole('region', { name: 'Inputs' }).length).toBeGreaterThan(0);
      expect(document.body.textContent).not.toMatch(/NaN|Infinity|undefined/);
      document.body.innerHTML = '';
    }
  });
});
