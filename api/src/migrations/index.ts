import { peopleAndAccess } from './0001-people-and-access';
import { clinicalRecord } from './0002-clinical-record';
import { trendOrder } from './0003-trend-order';
import type { Migration } from './migration';

/** In the order they run. Listed by hand so that bundling keeps them and a file's ending is no part of its name. */
export const migrations: readonly Migration[] = [peopleAndAccess, clinicalRecord, trendOrder];
