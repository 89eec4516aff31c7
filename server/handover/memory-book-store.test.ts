import { randomUUID } from 'node:crypto';
import { describeBookStore } from '../../tests/support/book-store-contract';
import { createMemoryBookStore } from './memory-book-store';

describeBookStore('a Book kept in memory', () => {
  const store = createMemoryBookStore();
  return Promise.resolve({
    store,
    addTablet: (whose, people) => Promise.resolve(store.addTablet(whose, people)),
    addPerson: () => Promise.resolve(randomUUID()),
  });
});
