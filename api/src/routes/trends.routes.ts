import { idParams } from '@slighthill/shared/contracts/common';
import { predictionBody, predictionResponse } from '@slighthill/shared/contracts/prediction';
import { trendQuery, trendResponse } from '@slighthill/shared/contracts/trend';
import { measures, type MeasureId } from '@slighthill/shared/measures';
import { invalidInput } from '../errors/app-error';
import { defineRoute, type Route } from '../http/define-route';
import { checkGroup } from '../physiology/prediction/check-group';
import { predictionResponse as predict } from '../physiology/prediction/prediction-response';
import { computeTrends } from '../physiology/trends/compute-trends';
import { trendSource } from '../queries/trend-source';

export const trendsRoutes: Route[] = [
  defineRoute({
    method: 'post',
    path: '/api/predictions',
    contract: {
      summary: 'Predicted values, z-scores, pattern and grades for one person',
      body: predictionBody,
      response: predictionResponse,
    },
    access: 'predictions:compute',
    audit: 'prediction.compute',
    handler: async ({ context, body }) => {
      const outcome = predict(body, context.actor.clinic);
      if (!outcome.ok) throw invalidInput(...outcome.errors);
      return outcome.response as never;
    },
  }),
  defineRoute({
    method: 'get',
    path: '/api/patients/:id/trends',
    contract: {
      summary: 'A patient\u2019s graded trends in one reference set',
      params: idParams,
      query: trendQuery,
      response: trendResponse,
    },
    access: 'trends:read',
    audit: 'trend.read',
    handler: async ({ context, params, query }) => {
      const groupError = checkGroup(query.referenceSet, query.group);
      if (groupError) throw invalidInput(groupError);
      const source = await trendSource(context.actor, params.id, query.measures);
      const patient = context.authorizeRow('trends:read', source.patient, 'This patient');
      context.audit.showsPatients(patient.id);
      if (query.enrollment && !source.enrollments.some(({ id }) => id === query.enrollment))
        throw invalidInput({ path: 'enrollment', message: 'This patient has no such enrollment' });
      const asked = query.measures ?? presentMeasures(source.measurements);
      return computeTrends({
        ...source,
        clinic: context.actor.clinic,
        options: { ...query, measures: asked },
      }) as never;
    },
  }),
];

/** Without a choice: every measure the patient has a result of, in the registry's order. */
function presentMeasures(rows: readonly { measure: MeasureId }[]): MeasureId[] {
  const found = new Set(rows.map((row) => row.measure));
  return measures.map((measure) => measure.id).filter((id) => found.has(id));
}
