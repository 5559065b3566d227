import type { ScriptLine } from './demo-script';
import { playStep } from './play-step';

/** Lines looked at together, and how many of them are played at once: fewer than the pool has connections. */
const lookAhead = 24;
const atOnce = 6;

/**
 * Plays the lines in their order, a few patients at a time: the lines of one patient, and the additions of patients
 * (which take running record numbers), wait for each other.
 */
export async function playScript(script: readonly ScriptLine[], onDone: (done: number) => void): Promise<void> {
  const latest = new Map<string, Promise<void>>();
  const running = new Set<Promise<void>>();
  const gate = gateFor(atOnce);
  let done = 0;
  let failed = false;
  try {
    for (const line of script) {
      const { step } = line;
      const keys = step.kind === 'patient' ? ['additions', step.patientId] : [step.patientId];
      const before = keys.map((key) => latest.get(key) ?? Promise.resolve());
      const work = Promise.all(before).then(async () => {
        if (failed) return;
        await gate(() => playStep(line.clinic, step));
        onDone((done += 1));
      });
      for (const key of keys) latest.set(key, work);
      running.add(work);
      // a failed one stays in the set, so that the race rejects
      void work.then(
        () => running.delete(work),
        () => (failed = true),
      );
      while (running.size >= lookAhead) await Promise.race(running);
    }
    await Promise.all(running);
  } finally {
    // nothing is left running behind an error
    await Promise.allSettled(running);
  }
}

/** Lets at most `places` pieces of work run together; the others wait in their order. */
function gateFor(places: number): (work: () => Promise<void>) => Promise<void> {
  const waiting: (() => void)[] = [];
  let free = places;
  return async (work) => {
    if (free === 0) await new Promise<void>((resolve) => waiting.push(resolve));
    else free -= 1;
    try {
      await work();
    } finally {
      const next = waiting.shift();
      if (next) next();
      else free += 1;
    }
  };
}
