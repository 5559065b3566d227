import '@testing-library/jest-dom/vitest';
import { cleanup } from '@testing-library/react';
import { format } from 'node:util';
import { afterAll, afterEach, beforeAll, beforeEach, expect, vi } from 'vitest';
import { server } from './server';

const complaints: string[] = [];

beforeAll(() => server.listen({ onUnhandledRequest: 'error' }));

beforeEach(() => {
  complaints.length = 0;
  for (const method of ['error', 'warn'] as const) {
    vi.spyOn(console, method).mockImplementation((...words: unknown[]) => void complaints.push(format(...words)));
  }
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
