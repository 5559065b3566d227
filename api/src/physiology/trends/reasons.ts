import type { BronchodilatorState } from '../pattern/judge-pattern';
import type { NotPredictable } from '../reference-sets/predict';

/** Why a point of another state is not compared, as the end of a sentence. */
export const stateReasons: Record<BronchodilatorState, string> = {
  before: 'taken before bronchodilator',
  after: 'taken after bronchodilator',
  none: 'no bronchodilator was given',
  unknown: 'bronchodilator not stated',
};

/** Why a point has no percent predicted. */
export const predictionReasons: Record<NotPredictable, string> = {
  'no-equation': 'no equation is used for this measure',
  'age-outside-set': 'age is outside the reference set',
  'no-height': 'no measured height up to 12 months earlier',
  'no-weight': 'no weight was entered with the test',
  'size-outside-set': 'height and weight are outside what the equation covers',
  'no-group': 'the reference set needs a group',
};
