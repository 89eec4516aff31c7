import { StrictMode } from 'react';
import { BrowserRouter } from 'react-router-dom';
import { HoldStage } from '../components/hold-stage';
import { ClientProvider } from '../data/client-context';
import type { HoldoffClient } from '../data/holdoff-client';
import { AreaBoundary } from './area-boundary';
import { Shell } from './shell';

export function App({ client }: { readonly client: HoldoffClient }) {
  return (
    <StrictMode>
      <AreaBoundary area="Holdoff">
        <ClientProvider client={client}>
          <BrowserRouter>
            <HoldStage>
              <Shell />
            </HoldStage>
          </BrowserRouter>
        </ClientProvider>
      </AreaBoundary>
    </StrictMode>
  );
}
