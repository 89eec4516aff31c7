import type { Workbox } from 'workbox-window';
import type { ServiceWorkerPort } from './ports';

/** The generated worker waits by itself; it is only ever told to take over by `activate`. */
export function browserServiceWorker(): ServiceWorkerPort {
  let workbox: Promise<Workbox> | null = null;
  return {
    register: ({ onWaiting, onReplaced }) => {
      if (!('serviceWorker' in navigator)) return;
      workbox = import('workbox-window').then(({ Workbox: Box }) => {
        const box = new Box('/sw.js');
        box.addEventListener('waiting', onWaiting);
        box.addEventListener('controlling', (event) => {
          if (event.isUpdate === true) onReplaced();
        });
        void box.register();
        return box;
      });
    },
    activate: () => {
      void workbox?.then((box) => {
        box.messageSkipWaiting();
      });
    },
    reload: () => {
      location.reload();
    },
  };
}
