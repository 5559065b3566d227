import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { format } from 'node:util';
import { afterAll, afterEach, beforeAll, beforeEach, expect, vi } from 'vitest';
import { server } from './server';

// The first test of a file also waits for the pages it loads on demand, on a machine that may be busy.
configure({ asyncUtilTimeout: 12_000 });

const complaints: string[] = [];

/**
 * The simulated user wraps every `focus()` in `act`; a dialog that focuses a field while React is flushing nests one
 * act in another, which React reports as a component that suspended. No component of ours suspends there.
 */
const nestedFocus = 'A component suspended inside an `act` scope';

const listen = (...words: unknown[]): void => {
  const complaint = format(...words);
  if (!complaint.startsWith(nestedFocus)) complaints.push(complaint);
};

beforeAll(() => server.listen({ onUnhandledRequest: 'error' }));

beforeEach(() => {
  complaints.length = 0;
  for (const method of ['error', 'warn'] as const) vi.spyOn(console, method).mockImplementation(listen);
});

afterEach(() => {
  cleanup();
  server.resetHandlers();
  window.localStorage.clear();
  vi.useRealTimers();
  vi.restoreAllMocks();
  expect(complaints, 'the console stayed silent').toEqual([]);
});

afterAll(() => server.close());
