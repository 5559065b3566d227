import type { Voided } from '@slighthill/shared/contracts/common';
import { formatInstant } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { Icon } from '../../../ui/icon';
import { voidWords } from './void-words';

interface VoidedNoticeProps {
  voided: NonNullable<Voided>;
}

export const VoidedNotice = ({ voided }: VoidedNoticeProps) => {
  const timeZone = useClinicZone();
  return (
    <p className="flex items-start gap-2 rounded-control bg-rowan-wash px-4 py-3 text-rowan-ink">
      <Icon name="alert" />
      <span>
        <strong>Voided.</strong>{' '}
        {`${voidWords(voided)}. By ${voided.by.displayName}, ${formatInstant(voided.at, timeZone)}. It counts for nothing and stays readable.`}
      </span>
    </p>
  );
};
