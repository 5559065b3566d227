import type { SpirometryTestDetail } from '@slighthill/shared/contracts/spirometry-test';
import type { BodySize, MeasurementDetail } from '@slighthill/shared/contracts/measurement';
import type { Revision, Voided } from '@slighthill/shared/contracts/common';

interface BodySizeDetail {
  bodySize: BodySize;
  history: Revision[];
  abilities: ('amend' | 'void')[];
}

/** One test of any kind with its history, as its own route answers it. */
export type TestDetail =
  | ({ kind: 'spirometry-test' } & SpirometryTestDetail)
  | ({ kind: 'measurement' } & MeasurementDetail)
  | ({ kind: 'body-size' } & BodySizeDetail);

interface Recorded {
  version: number;
  voided: Voided;
  recordedBy: { displayName: string };
  recordedAt: string;
}

/** What every kind of test says about who entered it. */
export const recordedOf = (detail: TestDetail): Recorded => {
  if (detail.kind === 'spirometry-test') return detail.test;
  return detail.kind === 'measurement' ? detail.measurement : detail.bodySize;
};
