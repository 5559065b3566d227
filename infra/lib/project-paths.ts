import path from 'node:path';

/** Folder of the checkout. */
export const projectRoot = path.resolve(import.meta.dirname, '../..');

/** Folder of everything that must survive a restart; ignored by git. Another one lets two copies run side by side. */
export const dataDir = path.resolve(projectRoot, process.env.DATA_DIR ?? '.data');

/** A path as the person typed it, from the folder where the command was typed. */
export function pathFromUser(typed: string): string {
  return path.resolve(process.env.INIT_CWD ?? process.cwd(), typed);
}
