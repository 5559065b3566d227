import type { Patient } from '@slighthill/shared/contracts/patient';
import { BodySizeAmendDrawer } from '../body-size/body-size-amend-drawer';
import { ResultAmendDrawer } from '../result/result-amend-drawer';
import { SpirometryAmendDrawer } from '../spirometry/spirometry-amend-drawer';
import type { TestDetail } from './test-detail';

interface AmendTestProps {
  patient: Patient;
  detail: TestDetail;
  onClose: () => void;
}

/** The form a test was entered with, prefilled. */
export const AmendTest = ({ patient, detail, onClose }: AmendTestProps) => {
  if (detail.kind === 'spirometry-test')
    return <SpirometryAmendDrawer patient={patient} test={detail.test} onClose={onClose} />;
  if (detail.kind === 'measurement')
    return <ResultAmendDrawer patient={patient} measurement={detail.measurement} onClose={onClose} />;
  return <BodySizeAmendDrawer patient={patient} bodySize={detail.bodySize} onClose={onClose} />;
};
