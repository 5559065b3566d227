/**
 * What keeps a patient from testing or training until it is cleared. `absolute` items bar exercise until a physician
 * releases them; `relative` ones ask the pulmonologist first. Follows the contraindications of the ATS 2002 six-minute
 * walk statement (AJRCCM 2002;166:111) and the ERS/ATS 2014 field walking test standard (ERJ 2014;44:1428), in our own
 * words; details from memory, check against local protocol before clinical use.
 */
export const safetyItems = [
  { id: 'recent-heart-attack', severity: 'absolute', label: 'Heart attack or unstable angina in the last month' },
  {
    id: 'rhythm-uncontrolled',
    severity: 'absolute',
    label: 'Rhythm disturbance that is uncontrolled or causes symptoms',
  },
  { id: 'faint', severity: 'absolute', label: 'Unexplained faint' },
  { id: 'heart-infection', severity: 'absolute', label: 'Active endocarditis, myocarditis or pericarditis' },
  { id: 'severe-aortic-stenosis', severity: 'absolute', label: 'Severe aortic stenosis with symptoms' },
  { id: 'heart-failure', severity: 'absolute', label: 'Decompensated heart failure or pulmonary edema' },
  { id: 'new-clot', severity: 'absolute', label: 'New pulmonary embolism or leg-vein thrombosis' },
  { id: 'aortic-dissection', severity: 'absolute', label: 'Suspected aortic dissection' },
  { id: 'respiratory-failure', severity: 'absolute', label: 'Uncontrolled asthma or acute respiratory failure' },
  {
    id: 'rest-saturation',
    severity: 'absolute',
    label: 'Resting SpO2 85% or lower on room air without an oxygen plan',
  },
  { id: 'acute-illness', severity: 'absolute', label: 'Acute illness such as infection or renal failure' },
  { id: 'cannot-cooperate', severity: 'absolute', label: 'Cannot follow instructions' },
  { id: 'left-main', severity: 'relative', label: 'Left main coronary narrowing' },
  { id: 'moderate-valve', severity: 'relative', label: 'Moderate valve narrowing' },
  { id: 'fast-or-slow-rhythm', severity: 'relative', label: 'Fast or slow rhythm' },
  { id: 'av-block', severity: 'relative', label: 'High-grade AV block' },
  { id: 'hypertrophic-cardiomyopathy', severity: 'relative', label: 'Hypertrophic cardiomyopathy' },
  { id: 'marked-pulmonary-hypertension', severity: 'relative', label: 'Marked pulmonary hypertension' },
  { id: 'complicated-pregnancy', severity: 'relative', label: 'Complicated pregnancy' },
  { id: 'electrolytes', severity: 'relative', label: 'Electrolyte disorder' },
  { id: 'orthopedic', severity: 'relative', label: 'Orthopedic limits to exercise' },
  { id: 'rest-heart-rate', severity: 'relative', label: 'Resting heart rate over 120 per minute' },
  {
    id: 'rest-blood-pressure',
    severity: 'relative',
    label: 'Resting blood pressure over 180 systolic or 100 diastolic',
  },
] as const;

export type SafetyItemId = (typeof safetyItems)[number]['id'];

export const safetyItemIds = safetyItems.map((item) => item.id) as [SafetyItemId, ...SafetyItemId[]];

export const safetyItem = (id: SafetyItemId) => safetyItems.find((item) => item.id === id)!;
