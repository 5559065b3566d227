const seconds = (sinceMs: number) => `${((Date.now() - sinceMs) / 1000).toFixed(1)} s`;

/** Shows a step with the seconds it took; on a terminal the seconds count up while it runs. */
export async function step<T>(label: string, work: () => Promise<T> | T): Promise<T> {
  const startedAt = Date.now();
  const live = process.stdout.isTTY === true && !process.env.CI;
  const timer = live
    ? setInterval(() => process.stdout.write(`\r  ${label} … ${seconds(startedAt)}`), 500)
    : setInterval(() => console.log(`  ${label} … still working, ${seconds(startedAt)}`), 15_000);
  timer.unref();
  if (live) process.stdout.write(`  ${label} …`);
  try {
    const result = await work();
    process.stdout.write(`${live ? '\r\u001B[K' : ''}  ${label} (${seconds(startedAt)})\n`);
    return result;
  } catch (error) {
    process.stdout.write(`${live ? '\r\u001B[K' : ''}  ${label}: failed after ${seconds(startedAt)}\n`);
    throw error;
  } finally {
    clearInterval(timer);
  }
}
