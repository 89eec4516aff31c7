import 'fake-indexeddb/auto';
import fc from 'fast-check';
import { afterEach, beforeEach, vi } from 'vitest';

// What a person would see in the console is part of the behaviour: a test that means to warn stubs the
// console itself (`vi.spyOn(console, 'warn').mockImplementation(...)`) and asserts on it; any other fails.
const unexpected: string[] = [];
let restoreConsole: () => void = () => undefined;

beforeEach(() => {
  unexpected.length = 0;
  const spies = (['error', 'warn'] as const).map((level) =>
    vi.spyOn(console, level).mockImplementation((...parts: unknown[]) => {
      unexpected.push(`console.${level}: ${parts.map(String).join(' ')}`);
    }),
  );
  restoreConsole = () => {
    for (const spy of spies) spy.mockRestore();
  };
});

afterEach(() => {
  restoreConsole();
  if (unexpected.length > 0) {
    throw new Error(`The test wrote to the console unexpectedly:\n${unexpected.join('\n')}`);
  }
});

// The short form of every campaign runs the same draws each time; HOLDOFF_SEED gives others.
fc.configureGlobal({ seed: Number(process.env['HOLDOFF_SEED'] ?? 20261201) });
