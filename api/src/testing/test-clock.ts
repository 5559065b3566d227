import type { Clock } from '../services/command-context';

/** A clock that stands still until a test moves it. */
export class TestClock implements Clock {
  private at: Date;

  constructor(at = '2026-06-15T16:00:00Z') {
    this.at = new Date(at);
  }

  now(): Date {
    return this.at;
  }

  set(at: string): void {
    this.at = new Date(at);
  }

  advance(ms: number): void {
    this.at = new Date(this.at.getTime() + ms);
  }
}
