import type { AddressInfo } from 'node:net';
import type { Server } from 'node:http';
import type { Sequelize } from 'sequelize';
import request from 'supertest';
import { createApp, type AppOptions } from '../app';
import type { Sessions } from '../auth/session';
import { connectDatabase } from '../db/connect';
import { testDatabaseUrl } from './database';
import { TestClock } from './test-clock';

/** Speaks to the test server as one browser would: same origin, one session cookie. */
export class Client {
  private readonly base: string;
  cookie: string | null;

  constructor(base: string, cookie: string | null = null) {
    this.base = base;
    this.cookie = cookie;
  }

  get(path: string) {
    return this.dress(request(this.base).get(path));
  }

  post(path: string, body?: object) {
    return this.dress(request(this.base).post(path)).send(body);
  }

  patch(path: string, body?: object) {
    return this.dress(request(this.base).patch(path)).send(body);
  }

  put(path: string, body?: object) {
    return this.dress(request(this.base).put(path)).send(body);
  }

  delete(path: string) {
    return this.dress(request(this.base).delete(path));
  }

  send(method: string, path: string, body?: object) {
    const verb = method.toLowerCase() as 'get' | 'post' | 'patch' | 'put' | 'delete';
    const call = this.dress(request(this.base)[verb](path));
    return body === undefined ? call : call.send(body);
  }

  private dress(call: request.Test): request.Test {
    const dressed = call.set('Origin', this.base);
    return this.cookie ? dressed.set('Cookie', this.cookie) : dressed;
  }
}

export interface TestServer {
  base: string;
  clock: TestClock;
  sequelize: Sequelize;
  sessions: Sessions;
  anonymous: Client;
  signedIn(userId: string): Promise<Client>;
  close(): Promise<void>;
}

/** The whole API on this worker's database, with every answer held to its contract. */
export async function startTestServer(options: Pick<AppOptions, 'logger' | 'publicOrigin'> = {}): Promise<TestServer> {
  const clock = new TestClock();
  const sequelize = connectDatabase(await testDatabaseUrl(), { poolSize: 8 });
  const { express, sessions } = createApp({ clock, checkResponses: true, ...options });
  const server = await new Promise<Server>((resolve) => {
    const listening = express.listen(0, '127.0.0.1', () => resolve(listening));
  });
  const base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  return {
    base,
    clock,
    sequelize,
    sessions,
    anonymous: new Client(base),
    async signedIn(userId) {
      const { cookie } = await sessions.create(userId, clock.now());
      return new Client(base, cookie.split(';')[0] ?? null);
    },
    async close() {
      await new Promise((resolve) => server.close(resolve));
      await sequelize.close();
    },
  };
}
