import type {} from 'vitest';

/** What the global setups hand to the tests. */
export interface TestDatabase {
  /** Address of the server's maintenance database. */
  serverUrl: string;
  /** A migrated, empty database to copy. */
  template: string;
}

export interface RunningProduct {
  baseUrl: string;
  databaseUrl: string;
  /** Program of the browser. */
  chromium: string;
}

declare module 'vitest' {
  export interface ProvidedContext {
    testDatabase: TestDatabase;
    product: RunningProduct;
  }
}
