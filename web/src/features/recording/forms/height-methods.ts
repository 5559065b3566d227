import { heightMethods, type HeightMethod } from '@slighthill/shared/contracts/common';
import { choicesOf } from '../../../lib/labels';

export const heightMethodLabels: Record<HeightMethod, string> = {
  measured: 'Measured',
  stated: 'Stated by the person',
  'arm-span': 'From arm span',
};

export const heightMethodChoices = choicesOf(heightMethods, heightMethodLabels);
