import { UserError } from './user-error';

/** Runs a command's main function; a problem ends it with its message and a non-zero exit code. */
export async function runMain(main: () => Promise<number | void>): Promise<void> {
  try {
    process.exitCode = (await main()) ?? 0;
  } catch (error) {
    console.error(error instanceof UserError ? error.message : error);
    process.exitCode = 1;
  }
  // A forgotten timer or socket must not keep a finished command open.
  process.exit();
}
