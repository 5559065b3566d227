import http from 'node:http';

export interface LoadResult {
  /** Wall time divided by requests, in milliseconds. */
  perRequestMs: number;
  medianMs: number;
  p95Ms: number;
}

interface LoadOptions {
  url: (request: number) => string;
  cookie: string;
  clients: number;
  requests: number;
  /** Runs before each request and is not timed. */
  before?: () => Promise<void>;
}

/** Sends a fixed number of requests from a fixed number of clients, each with a connection of its own, and stops. */
export async function load(options: LoadOptions): Promise<LoadResult> {
  const times: number[] = [];
  let sent = 0;
  const one = async () => {
    const agent = new http.Agent({ keepAlive: true, maxSockets: 1 });
    while (sent < options.requests) {
      const number = sent++;
      await options.before?.();
      const startedAt = performance.now();
      await get(agent, options.url(number), options.cookie);
      times.push(performance.now() - startedAt);
    }
    agent.destroy();
  };
  const startedAt = performance.now();
  await Promise.all(Array.from({ length: options.clients }, one));
  const wallMs = performance.now() - startedAt;
  times.sort((a, b) => a - b);
  return {
    perRequestMs: wallMs / times.length,
    medianMs: times[Math.floor(times.length / 2)] ?? 0,
    p95Ms: times[Math.floor(times.length * 0.95)] ?? 0,
  };
}

function get(agent: http.Agent, url: string, cookie: string): Promise<void> {
  return new Promise((resolve, reject) => {
    const request = http.get(url, { agent, headers: { cookie } }, (response) => {
      response.on('end', () =>
        response.statusCode === 200 ? resolve() : reject(new Error(`${url} answered ${response.statusCode}`)),
      );
      response.resume();
    });
    request.on('error', reject);
  });
}
