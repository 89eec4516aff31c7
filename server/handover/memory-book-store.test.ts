import { randomUUID } from 'node:crypto';
import { describeBookStore } from '../../tests/support/book-store-contract';
import { createMemoryBookStore } from './memory-book-store';

describeBookStore('a Book kept in memory', () => {
  const store = createMemoryBookStore();
  return Promise.resolve({
    store,
    addTablet: (whose, people) => {
      store.addTablet(whose, people);
      return Promise.resolve();
    },
    addPerson: () => Promise.resolve(randomUUID()),
  });
});
