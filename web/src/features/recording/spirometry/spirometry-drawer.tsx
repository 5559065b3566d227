import { toLocalInput } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { DraftStart } from '../forms/draft-start';
import type { RecordDrawerProps } from '../record-drawer';
import { emptySpirometryForm, spirometryForm } from './spirometry-form';
import { SpirometryFormDrawer } from './spirometry-form-drawer';

export const SpirometryDrawer = (props: RecordDrawerProps) => {
  const timeZone = useClinicZone();
  return (
    <DraftStart
      title="Record spirometry"
      form="spirometry"
      subject={props.patient.id}
      schema={spirometryForm}
      empty={() => emptySpirometryForm(toLocalInput(new Date(), timeZone), () => crypto.randomUUID())}
      onClose={props.onClose}
    >
      {(start, key) => <SpirometryFormDrawer key={key} {...props} {...start} />}
    </DraftStart>
  );
};
