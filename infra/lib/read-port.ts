import { isPortFree } from './ports';
import { UserError } from './user-error';

/** A port from the environment, or its default. */
export function readPort(variable: string, fallback: number): number {
  const text = process.env[variable]?.trim();
  if (!text) return fallback;
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1 || port > 65_535) {
    throw new UserError(`${variable} must be a port number from 1 to 65535, not "${text}".`);
  }
  return port;
}

/** Ends with a clear message when another program has the port. */
export async function requireFreePort(variable: string, port: number, command: string): Promise<void> {
  if (await isPortFree(port)) return;
  throw new UserError(
    `Port ${port} is used by another program, which was left alone. Choose another port with ${variable}, for example:\n\n  ${variable}=${port + 10} ${command}\n`,
  );
}
