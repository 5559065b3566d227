import type { Clock } from '../services/command-context';

export const systemClock: Clock = { now: () => new Date() };
