const demoAccounts = ['admin', 'coordinator', 'therapist', 'pulmonologist', 'patient'];

export function printAddresses(options: { port: number; logFile: string; demo: boolean }): void {
  const lines = ['', `Slighthill is ready: http://127.0.0.1:${options.port}`, ''];
  if (options.demo) {
    lines.push('Demo accounts, password slight-hill-demo:');
    lines.push(...demoAccounts.map((name) => `  ${name}@alderfalls.test`), '  coordinator@stonebridge.test', '');
  }
  lines.push(`Log: ${options.logFile}`, 'Press Ctrl-C to stop.', '');
  console.log(lines.join('\n'));
}
