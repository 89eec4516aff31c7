import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import '../../src/components/theme/theme.css';
import './gallery.css';
import { HoldStage } from '../../src/components/hold-stage';
import { BenchPage } from './bench-page';
import { DeskPage } from './desk-page';
import { FiringPage } from './firing-page';
import { GapPage } from './gap-page';
import { KeypadPage } from './keypad-page';
import { StatePage } from './state-page';

const PAGES = {
  gap: GapPage,
  bench: BenchPage,
  firing: FiringPage,
  keypad: KeypadPage,
  desk: DeskPage,
  state: StatePage,
};

const asked = new URLSearchParams(window.location.search);
const root = document.documentElement;
for (const setting of ['theme', 'hand', 'eyewear']) {
  const value = asked.get(setting);
  if (value !== null) root.setAttribute(`data-${setting}`, value);
}
const scale = asked.get('scale');
if (scale !== null) {
  root.style.setProperty('--scale', scale);
  if (Number(scale) > 1.3) root.setAttribute('data-large-text', '');
}

const name = asked.get('page') ?? 'gap';
const Page = name in PAGES ? PAGES[name as keyof typeof PAGES] : GapPage;
const place = document.getElementById('root');
if (place === null) throw new Error('index.html has no root');
createRoot(place).render(
  <StrictMode>
    <HoldStage>
      <Page />
    </HoldStage>
  </StrictMode>,
);
