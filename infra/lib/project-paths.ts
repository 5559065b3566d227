import path from 'node:path';

/** Folder of the checkout. */
export const projectRoot = path.resolve(import.meta.dirname, '../..');

/** Folder of everything that must survive a restart; ignored by git. */
export const dataDir = path.join(projectRoot, '.data');
