import type { Bus, BusMessage } from '../ports/ports';

interface Member {
  readonly name: string;
  readonly listeners: Set<(message: BusMessage) => void>;
}

/** Channels of one browser: a message reaches every other tab, never the one that posted it. */
export function memoryBusHub() {
  const members = new Set<Member>();
  return {
    open: (name: string): Bus => {
      const self: Member = { name, listeners: new Set() };
      members.add(self);
      return {
        post: (message) => {
          for (const other of members) {
            if (other === self || other.name !== name) continue;
            for (const listen of other.listeners)
              queueMicrotask(() => {
                listen(message);
              });
          }
        },
        subscribe: (listen) => {
          self.listeners.add(listen);
          return () => {
            self.listeners.delete(listen);
          };
        },
        close: () => {
          members.delete(self);
        },
      };
    },
  };
}
