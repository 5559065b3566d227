import { spawn } from 'node:child_process';

export interface CommandResult {
  code: number;
  output: string;
}

export interface CommandOptions {
  cwd?: string;
  env?: Record<string, string | undefined>;
  signal?: AbortSignal;
  /** Show the output as it comes instead of keeping it. */
  show?: boolean;
}

/** Runs a program to its end and keeps what it wrote. */
export function runCommand(program: string, args: string[], options: CommandOptions = {}): Promise<CommandResult> {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      stdio: options.show ? 'inherit' : ['ignore', 'pipe', 'pipe'],
      ...(options.cwd ? { cwd: options.cwd } : {}),
      ...(options.env ? { env: options.env } : {}),
      ...(options.signal ? { signal: options.signal } : {}),
    });
    let output = '';
    child.stdout?.setEncoding('utf8').on('data', (text: string) => (output += text));
    child.stderr?.setEncoding('utf8').on('data', (text: string) => (output += text));
    child.once('error', reject);
    child.once('close', (code, signal) => {
      if (signal) output += `\nEnded by ${signal}.`;
      resolve({ code: code ?? 1, output });
    });
  });
}
