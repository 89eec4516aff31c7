import type { ServiceWorkerPort } from './ports/ports';
import type { LabClient } from './lab-client';

export interface UpdateState {
  /** 'reload-needed': another tab accepted the new version, and this page still runs the old one. */
  readonly state: 'none' | 'waiting' | 'reload-needed';
  /** False while a firing or check of this tablet is open (protocol 2.7). */
  readonly may_accept: boolean;
  readonly words: string;
}

export interface UpdateWatch {
  readonly subscribe: (listen: () => void) => () => void;
  readonly state: () => UpdateState;
  readonly accept: () => void;
}

/** A new version waits until nothing is open and somebody accepts it; nothing ever reloads under a hand that types. */
export function createUpdateWatch(
  worker: ServiceWorkerPort | null,
  lab: () => LabClient | null,
): UpdateWatch {
  const listeners = new Set<() => void>();
  let state: UpdateState['state'] = 'none';
  let accepted = false;
  let shown: UpdateState = describe(state, true);
  const refresh = () => {
    const next = describe(state, !isBusy(lab()));
    if (next.state === shown.state && next.may_accept === shown.may_accept) return;
    shown = next;
    for (const listen of listeners) listen();
  };
  worker?.register({
    onWaiting: () => {
      state = 'waiting';
      refresh();
    },
    onReplaced: () => {
      if (accepted) worker.reload();
      else {
        state = 'reload-needed';
        refresh();
      }
    },
  });
  return {
    subscribe: (listen) => {
      listeners.add(listen);
      const stop = lab()?.view.subscribe(refresh);
      return () => {
        listeners.delete(listen);
        stop?.();
      };
    },
    state: () => shown,
    accept: () => {
      if (worker === null || isBusy(lab())) return;
      if (state === 'reload-needed') worker.reload();
      if (state !== 'waiting') return;
      accepted = true;
      worker.activate();
    },
  };
}

function describe(state: UpdateState['state'], may_accept: boolean): UpdateState {
  if (state === 'none') return { state, may_accept, words: '' };
  const what =
    state === 'waiting'
      ? 'A new version of Holdoff is here.'
      : 'Another tab took up the new version; this one has not.';
  const when = may_accept
    ? 'It starts when you accept it.'
    : 'It waits until no firing and no check is open here.';
  return { state, may_accept, words: `${what} ${when}` };
}

function isBusy(lab: LabClient | null): boolean {
  if (lab === null) return false;
  const { id } = lab.device();
  const firing = lab.view.list('firing').some((one) => one.closed === null && one.opened.device === id);
  return firing || lab.view.list('check').some((one) => one.ended === null && one.opened.device === id);
}
