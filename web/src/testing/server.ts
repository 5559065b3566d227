import { setupServer } from 'msw/node';

/** Stands where the API is. A request no test planned for fails the test. */
export const server = setupServer();
