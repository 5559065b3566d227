import { toLocalInput } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { DraftStart } from '../forms/draft-start';
import type { RecordDrawerProps } from '../record-drawer';
import { emptyResultForm, resultForm } from './result-form';
import { ResultFormDrawer } from './result-form-drawer';

export const ResultDrawer = (props: RecordDrawerProps) => {
  const timeZone = useClinicZone();
  return (
    <DraftStart
      title="Record a result"
      form="measurement"
      subject={props.patient.id}
      schema={resultForm}
      empty={() => emptyResultForm(toLocalInput(new Date(), timeZone), crypto.randomUUID())}
      onClose={props.onClose}
    >
      {(start, key) => <ResultFormDrawer key={key} {...props} {...start} />}
    </DraftStart>
  );
};
