import type { FileEntryInput } from '@slighthill/shared/contracts/file-entry';
import type { DiagnosisGroup } from '@slighthill/shared/contracts/patient';

export type LungPattern = 'obstructive' | 'restrictive' | 'mixed' | 'normal' | 'non-specific';

export type MedicineDetails = Extract<FileEntryInput, { kind: 'medicine' }>['details'];

/** What is usual in a group: how the people are, how their lungs test, what stands in their file. Invented shares. */
export interface Profile {
  /** How many of sixty. */
  share: number;
  ages: readonly [number, number];
  patterns: readonly LungPattern[];
  /** Share of FEV1 that a bronchodilator adds, least and most. */
  bronchodilatorGain: readonly [number, number];
  /** Percent of predicted, where the group's tests include transfer factor. */
  transferPercent: readonly [number, number] | null;
  spo2Nadir: readonly [number, number];
  smoking: readonly ('never' | 'former' | 'current')[];
  oxygenChance: number;
  exacerbationChance: number;
  descriptions: readonly string[];
  medicines: readonly MedicineDetails[];
  /** Lung function over a course, as a share of the first values, by how the course goes. */
  lungDrift: Readonly<Record<'better' | 'same' | 'worse', number>>;
}

const rescue: MedicineDetails = { name: 'Albuterol inhaler', medicineClass: 'short-acting-beta-agonist' };
const tiotropium: MedicineDetails = { name: 'Tiotropium', medicineClass: 'long-acting-antimuscarinic' };
const salmeterol: MedicineDetails = { name: 'Salmeterol', medicineClass: 'long-acting-beta-agonist' };
const metoprolol: MedicineDetails = { name: 'Metoprolol', medicineClass: 'beta-blocker' };

const steady = { better: 0.01, same: 0, worse: -0.02 } as const;

export const profiles: Readonly<Record<DiagnosisGroup, Profile>> = {
  copd: {
    share: 24,
    ages: [52, 87],
    patterns: ['obstructive', 'obstructive', 'obstructive', 'obstructive', 'obstructive', 'obstructive', 'mixed'],
    bronchodilatorGain: [0.02, 0.11],
    transferPercent: null,
    spo2Nadir: [83, 93],
    smoking: ['former', 'former', 'former', 'current'],
    oxygenChance: 0.35,
    exacerbationChance: 0.55,
    descriptions: ['COPD with emphysema', 'COPD, chronic bronchitis', 'COPD'],
    medicines: [rescue, tiotropium, salmeterol, metoprolol],
    lungDrift: { better: 0.02, same: -0.005, worse: -0.04 },
  },
  ild: {
    share: 11,
    ages: [48, 79],
    patterns: ['restrictive', 'restrictive', 'restrictive', 'restrictive', 'normal'],
    bronchodilatorGain: [0, 0.03],
    transferPercent: [30, 60],
    spo2Nadir: [80, 90],
    smoking: ['never', 'former', 'former'],
    oxygenChance: 0.45,
    exacerbationChance: 0.15,
    descriptions: ['Idiopathic pulmonary fibrosis', 'Fibrotic hypersensitivity pneumonitis', 'ILD with scleroderma'],
    medicines: [metoprolol],
    lungDrift: { better: 0.01, same: -0.02, worse: -0.17 },
  },
  asthma: {
    share: 5,
    ages: [30, 66],
    patterns: ['obstructive', 'normal', 'obstructive'],
    bronchodilatorGain: [0.08, 0.22],
    transferPercent: null,
    spo2Nadir: [92, 97],
    smoking: ['never', 'former'],
    oxygenChance: 0,
    exacerbationChance: 0.5,
    descriptions: ['Severe asthma', 'Asthma with fixed obstruction'],
    medicines: [rescue, salmeterol],
    lungDrift: { better: 0.16, same: 0, worse: -0.05 },
  },
  bronchiectasis: {
    share: 5,
    ages: [34, 76],
    patterns: ['obstructive', 'non-specific', 'mixed', 'obstructive'],
    bronchodilatorGain: [0.02, 0.08],
    transferPercent: null,
    spo2Nadir: [87, 94],
    smoking: ['never', 'never', 'former'],
    oxygenChance: 0.2,
    exacerbationChance: 0.7,
    descriptions: ['Bronchiectasis after pneumonia', 'Bronchiectasis, cause unknown'],
    medicines: [rescue],
    lungDrift: steady,
  },
  'post-covid': {
    share: 5,
    ages: [32, 70],
    patterns: ['normal', 'restrictive', 'non-specific'],
    bronchodilatorGain: [0, 0.03],
    transferPercent: [55, 82],
    spo2Nadir: [88, 95],
    smoking: ['never', 'former'],
    oxygenChance: 0.1,
    exacerbationChance: 0,
    descriptions: ['Breathlessness after COVID-19 pneumonia'],
    medicines: [],
    lungDrift: { better: 0.15, same: 0.02, worse: -0.03 },
  },
  'pulmonary-hypertension': {
    share: 4,
    ages: [36, 74],
    patterns: ['normal', 'non-specific'],
    bronchodilatorGain: [0, 0.03],
    transferPercent: [38, 62],
    spo2Nadir: [83, 91],
    smoking: ['never', 'former'],
    oxygenChance: 0.5,
    exacerbationChance: 0.1,
    descriptions: ['Pulmonary arterial hypertension', 'Chronic thromboembolic pulmonary hypertension'],
    medicines: [],
    lungDrift: steady,
  },
  'surgery-or-transplant': {
    share: 4,
    ages: [40, 76],
    patterns: ['restrictive', 'obstructive'],
    bronchodilatorGain: [0.01, 0.06],
    transferPercent: null,
    spo2Nadir: [87, 95],
    smoking: ['former', 'never'],
    oxygenChance: 0.2,
    exacerbationChance: 0.1,
    descriptions: ['After lobectomy', 'Before lung volume reduction', 'After lung transplant'],
    medicines: [metoprolol],
    lungDrift: { better: 0.06, same: 0.01, worse: -0.05 },
  },
  other: {
    share: 2,
    ages: [30, 88],
    patterns: ['non-specific', 'restrictive'],
    bronchodilatorGain: [0, 0.03],
    transferPercent: null,
    spo2Nadir: [89, 95],
    smoking: ['never', 'former'],
    oxygenChance: 0,
    exacerbationChance: 0,
    descriptions: ['Kyphoscoliosis', 'Diaphragm weakness'],
    medicines: [],
    lungDrift: steady,
  },
};
