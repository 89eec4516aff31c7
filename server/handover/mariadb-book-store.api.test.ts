import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll } from 'vitest';
import { describeBookStore } from '../../tests/support/book-store-contract';
import { createTestDatabase, type TestDatabase } from '../../tests/support/test-database';
import { createDatabase, type Database } from '../db/database';
import { createLogger } from '../logger';
import { createMariaDbBookStore } from './mariadb-book-store';

let made: TestDatabase;
let database: Database;
beforeAll(async () => {
  made = await createTestDatabase();
  database = createDatabase(made.settings, createLogger('silent'));
});
afterAll(async () => {
  await database.destroy();
  await made.drop();
});

let letters = 0;

describeBookStore('a Book kept in MariaDB', () =>
  Promise.resolve({
    store: createMariaDbBookStore(database),
    async addTablet({ lab, device }, people) {
      letters += 1;
      const letter = `T${String.fromCharCode(65 + Math.floor(letters / 26), 65 + (letters % 26))}`;
      await database('devices').insert({ lab, id: device, letter, name: 'Contract tablet', enrolled_ms: 1 });
      for (const person of people) await database('grants').insert({ lab, device, person, granted_ms: 1 });
    },
    async addPerson() {
      const id = randomUUID();
      await database('people').insert({
        id,
        email: `${id}@bench.example`,
        name: 'Ada',
        password_hash: 'none',
        created_ms: 1,
      });
      return id;
    },
  }),
);
