import { createRoot } from 'react-dom/client';
import { applyDisplay, readDisplay } from '../data/display-settings';
import { openClient } from '../data/holdoff-client';
import { browserPorts } from '../data/ports/browser-ports';
import { App } from './app';

/** Opens the stores, then paints once: nothing is shown that the stores have not said. */
export function start(page: Document): void {
  const element = page.getElementById('root');
  if (element === null) throw new Error('the page has no root element');
  applyDisplay(
    page.documentElement,
    readDisplay(window.localStorage),
    window.location.pathname.startsWith('/desk') ? 'desk' : 'bench',
  );
  const root = createRoot(element);
  void openClient(browserPorts()).then((client) => {
    root.render(<App client={client} />);
  });
}
