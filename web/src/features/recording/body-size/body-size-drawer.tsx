import { toLocalInput } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { DraftStart } from '../forms/draft-start';
import type { RecordDrawerProps } from '../record-drawer';
import { bodySizeForm, emptyBodySizeForm } from './body-size-form';
import { BodySizeFormDrawer } from './body-size-form-drawer';

export const BodySizeDrawer = (props: RecordDrawerProps) => {
  const timeZone = useClinicZone();
  return (
    <DraftStart
      title="Record body size"
      form="body-size"
      subject={props.patient.id}
      schema={bodySizeForm}
      empty={() => emptyBodySizeForm(toLocalInput(new Date(), timeZone), crypto.randomUUID())}
      onClose={props.onClose}
    >
      {(start, key) => <BodySizeFormDrawer key={key} {...props} {...start} />}
    </DraftStart>
  );
};
