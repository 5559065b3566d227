export interface Migration {
  /** Never changes once released: it is what the log remembers. */
  name: string;
  sql: string;
}
