import { clinicDateOf } from '../../../lib/clinic-time';
import { useClinicZone } from '../../../lib/session';
import { DraftStart } from '../forms/draft-start';
import type { RecordDrawerProps } from '../record-drawer';
import { FileEntryFormDrawer } from './file-entry-form-drawer';
import { emptyFileForm, fileForm } from './file-form';

export const FileEntryDrawer = (props: RecordDrawerProps) => {
  const timeZone = useClinicZone();
  const { patient } = props;
  const outside = !patient.abilities.includes('order-oxygen');
  return (
    <DraftStart
      title="Enter in the file"
      form="file-entry"
      subject={patient.id}
      schema={fileForm}
      empty={() =>
        emptyFileForm(clinicDateOf(new Date(), timeZone), crypto.randomUUID(), patient.diagnosisGroup, outside)
      }
      onClose={props.onClose}
    >
      {(start, key) => <FileEntryFormDrawer key={key} {...props} {...start} />}
    </DraftStart>
  );
};
