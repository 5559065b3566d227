import { expect, it } from 'vitest';
import { readClinicOptions } from './read-clinic-options';

const complete = ['--name', 'Fern Hollow', '--zone', 'America/Chicago', '--admin-email', 'Head@FernHollow.test'];

it('reads a clinic and lower-cases the address', () => {
  expect(readClinicOptions(complete)).toEqual({
    name: 'Fern Hollow',
    timeZone: 'America/Chicago',
    adminEmail: 'head@fernhollow.test',
    adminName: 'Administrator',
  });
  expect(readClinicOptions([...complete, '--admin-name', 'Ada Fern']).adminName).toBe('Ada Fern');
});

it('names every problem at once', () => {
  expect(() => readClinicOptions([])).toThrow(
    /--name is missing[^]*--zone is missing[^]*--admin-email is missing[^]*Usage/,
  );
});

it.each(['Chicago', 'CST', '+05:00', 'America/Nowhere'])('refuses the zone %s', (zone) => {
  const args = complete.map((arg) => (arg === 'America/Chicago' ? zone : arg));
  expect(() => readClinicOptions(args)).toThrow(/is not a time zone/);
});

it('refuses an unknown option', () => {
  expect(() => readClinicOptions([...complete, '--color', 'red'])).toThrow(/--color/);
});
