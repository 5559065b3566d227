import { useInfiniteQuery } from '@tanstack/react-query';
import { clinicDateOf } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { Button } from '../../ui/button';
import { DateInput } from '../../ui/date-input';
import { Field } from '../../ui/field';
import { Select } from '../../ui/select';
import { usersQuery, type AuditFilter } from './queries';

interface AuditFiltersProps {
  filter: AuditFilter;
  onChange: (filter: AuditFilter) => void;
  onClear: () => void;
}

export const AuditFilters = ({ filter, onChange, onClear }: AuditFiltersProps) => {
  const users = useInfiniteQuery(usersQuery);
  const todayOn = clinicDateOf(new Date(), useClinicZone());
  const choices = (users.data?.pages ?? [])
    .flatMap((page) => page.items)
    .map((user) => ({ value: user.id, label: user.displayName }));
  const filtered = filter.from !== '' || filter.to !== '' || filter.actor !== '' || filter.patient !== null;
  return (
    <div className="mt-4 flex flex-wrap items-end gap-4">
      <Field label="From">
        <DateInput
          value={filter.from}
          max={todayOn}
          onChange={(event) => onChange({ ...filter, from: event.target.value })}
        />
      </Field>
      <Field label="To">
        <DateInput
          value={filter.to}
          max={todayOn}
          onChange={(event) => onChange({ ...filter, to: event.target.value })}
        />
      </Field>
      <Field label="Who" className="w-56">
        <Select
          value={filter.actor}
          onChange={(event) => onChange({ ...filter, actor: event.target.value })}
          emptyLabel="Anyone"
          choices={choices}
        />
      </Field>
      {filter.patient && (
        <p className="flex min-h-10 items-center">
          <span className="text-ink-soft">Only</span>&nbsp;<span className="font-semibold">{filter.patient.name}</span>
        </p>
      )}
      {filtered && (
        <Button kind="quiet" onClick={onClear}>
          Show everything
        </Button>
      )}
    </div>
  );
};
