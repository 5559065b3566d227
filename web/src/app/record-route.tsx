import { RecordPage } from '../features/record/record-page';
import { RecordMenu } from '../features/recording/record-menu';

/** A patient's record: its header and sections, with the menu that records into it. */
export const Component = () => <RecordPage recordMenu={(patient) => <RecordMenu patient={patient} />} />;
