import { snap } from '../format';
import type { MeasureId } from './measure-ids';
import { getMeasure } from './all-measures';

/** The number the database keeps: whole milliliters for volumes, else the value itself. */
export function toStored(id: MeasureId, value: number): number {
  const { perUnit } = getMeasure(id).storage;
  return perUnit === 1 ? value : Math.round(snap(value * perUnit));
}

/** The number screens and the API use, from the one the database keeps. */
export function fromStored(id: MeasureId, stored: number): number {
  const { perUnit } = getMeasure(id).storage;
  return perUnit === 1 ? stored : stored / perUnit;
}
