import { limitsFromLms } from '../lms';
import { measureOf } from '../measure-of';
import type { ReferenceSet } from '../types';
import { lungVolumeLms, lungVolumes } from './lung-volume-lms';

export const gli2021LungVolumes: ReferenceSet = {
  id: 'gli-2021-lung-volumes',
  title: 'GLI 2021 lung volumes',
  source: 'Hall 2021, ERJ 57:2000289',
  kind: 'lung-volumes',
  measures: lungVolumes,
  groups: null,
  needsWeight: false,
  ages: () => ({ from: 18, to: 80 }),
  evaluate: (measure, person) => limitsFromLms(lungVolumeLms(measureOf(lungVolumes, measure), person)),
};
