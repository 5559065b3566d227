import type { Migration } from './migration';

/** Results of the same instant are read in the order they were recorded. */
const sql = /* sql */ `
drop index measurements_for_trends;
create index measurements_for_trends on measurements (patient_id, taken_at, created_at, id) where voided_at is null;
`;

export const trendOrder: Migration = { name: '0003-trend-order', sql };
