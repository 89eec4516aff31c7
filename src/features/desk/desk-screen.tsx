import type { ReactNode } from 'react';
import { Screen } from '../../components/frame';
import { DeskProvider } from '../../data/desk/use-desk-query';
import { WaitingRow } from './waiting-row';
import './desk.css';

/** Every page of the Desk: what waits above, what was opened below at full width. */
export function DeskScreen({ chosen, children }: { readonly chosen?: string; readonly children: ReactNode }) {
  return (
    <DeskProvider>
      <Screen>
        <div className="desk">
          <WaitingRow {...(chosen === undefined ? {} : { chosen })} />
          {children}
        </div>
      </Screen>
    </DeskProvider>
  );
}
