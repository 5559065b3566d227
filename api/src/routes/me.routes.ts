import { meHome } from '@slighthill/shared/contracts/me';
import { notFound } from '../errors/app-error';
import { defineRoute, type Route } from '../http/define-route';
import { findMeHome } from '../queries/me-home';

export const meRoutes: Route[] = [
  defineRoute({
    method: 'get',
    path: '/api/me/home',
    contract: { summary: 'What a patient sees first', response: meHome },
    access: 'me:read',
    audit: 'me.home',
    handler: async ({ context }) => {
      const { patientId } = context.actor;
      const home = patientId === null ? null : await findMeHome(context.actor, patientId);
      if (!home) throw notFound('This account\u2019s record');
      context.audit.showsPatients(home.patientId);
      const { patientId: _patientId, ...shown } = home;
      return shown;
    },
  }),
];
