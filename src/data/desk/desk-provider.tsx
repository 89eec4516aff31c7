import { QueryClientProvider } from '@tanstack/react-query';
import { useEffect, useState, type ReactNode } from 'react';
import { useLabClient } from '../client-context';
import { openDeskQueries } from './desk-queries';
import { useBookState } from '../use-book';
import { useSession } from '../use-session';
import { DeskContext } from './use-desk-query';

/** What Desk and Crew fetch lives here, per lab and person; it comes with their own chunks and nothing of the bench needs it. */
export function DeskProvider({ children }: { readonly children: ReactNode }) {
  const lab = useLabClient();
  const session = useSession();
  const person = session.state === 'open' ? session.person.id : 'nobody';
  // Another person never sees what the one before had fetched.
  return <PersonsDesk key={`${lab.lab.id}/${person}`}>{children}</PersonsDesk>;
}

function PersonsDesk({ children }: { readonly children: ReactNode }) {
  const lab = useLabClient();
  const [desk] = useState(() => openDeskQueries(lab));
  const { revision } = useBookState();
  // Whatever moved the Book may have moved what was fetched: an act that was applied shows at once.
  useEffect(() => {
    void desk.client.invalidateQueries();
  }, [desk, revision]);
  return (
    <DeskContext value={desk}>
      <QueryClientProvider client={desk.client}>{children}</QueryClientProvider>
    </DeskContext>
  );
}
