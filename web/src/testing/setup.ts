import '@testing-library/jest-dom/vitest';
import { cleanup, configure } from '@testing-library/react';
import { format } from 'node:util';
import { afterAll, afterEach, beforeAll, beforeEach, expect, vi } from 'vitest';
import { server } from './server';

// The first test of a file also waits for the pages it loads on demand, on a machine that may be busy.
configure({ asyncUtilTimeout: 12_000 });

const complaints: string[] = [];

/**
 * Two messages of React speak about how a test waits, not about the page. An answer of the network may arrive between
 * two steps of a test, outside any `act`; and the simulated user wraps every `focus()` in `act`, so that a dialog which
 * focuses a field while React is flushing nests one in another, reported as a component that suspended.
 */
const aboutWaiting = /not wrapped in act\(|^A component suspended inside an `act` scope/;

const listen = (...words: unknown[]): void => {
  const complaint = format(...words);
  if (!aboutWaiting.test(complaint)) complaints.push(complaint);
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
