/**
 * What each route must answer, written by hand from the roles matrix. It is the second opinion the tests hold the
 * policy to, so nothing of the product may import it, and it is never derived from the policy.
 *
 * Columns: administrator, coordinator, therapist, pulmonologist, patient, signed out.
 */
export type Row6 = readonly [number, number, number, number, number, number];

export interface Expectation {
  /** Callers of the clinic the row belongs to. The patient column holds for the own record and for another's. */
  own: Row6;
  /** Callers of another clinic. Where no row is named they get their own clinic's answer, and nothing of this one. */
  other: Row6;
}

const everyone = (status: number): Expectation => ({
  own: [status, status, status, status, status, status],
  other: [status, status, status, status, status, status],
});
const signedIn = (status: number): Expectation => ({
  own: [status, status, status, status, status, 401],
  other: [status, status, status, status, status, 401],
});
const list = (own: Row6): Expectation => ({ own, other: own });

export const accessExpectations: Record<string, Expectation> = {
  'get /api/health': everyone(200),
  'get /api/health/ready': everyone(200),

  'post /api/auth/sign-in': everyone(200),
  'post /api/auth/sign-out': everyone(204),
  'get /api/auth/me': signedIn(200),
  'post /api/auth/activity': signedIn(204),
  'post /api/auth/invitation/look-up': everyone(200),
  'post /api/auth/invitation/accept': everyone(200),

  // clinic settings, users, programs, audit trail: the administrator; the coordinator reads programs
  'get /api/clinic': list([200, 403, 403, 403, 403, 401]),
  'patch /api/clinic': list([200, 403, 403, 403, 403, 401]),
  'get /api/users': list([200, 403, 403, 403, 403, 401]),
  'post /api/users': list([201, 403, 403, 403, 403, 401]),
  'patch /api/users/:id': { own: [200, 403, 403, 403, 403, 401], other: [404, 403, 403, 403, 403, 401] },
  'post /api/users/:id/invitation': { own: [201, 403, 403, 403, 403, 401], other: [404, 403, 403, 403, 403, 401] },
  'get /api/programs': list([200, 200, 403, 403, 403, 401]),
  'post /api/programs': list([201, 403, 403, 403, 403, 401]),
  'patch /api/programs/:id': { own: [200, 403, 403, 403, 403, 401], other: [404, 403, 403, 403, 403, 401] },
  'get /api/audit-events': list([200, 403, 403, 403, 403, 401]),

  // referrals, enroll, discharge: the coordinator; therapist and pulmonologist read; patients never come here
  'get /api/patients': list([403, 200, 200, 200, 403, 401]),
  'post /api/patients': list([403, 201, 403, 403, 403, 401]),
  'post /api/patients/duplicate-check': list([403, 200, 200, 200, 403, 401]),
  'get /api/patients/:id': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'patch /api/patients/:id': { own: [403, 200, 403, 403, 403, 401], other: [403, 404, 403, 403, 403, 401] },
  'get /api/patients/:id/enrollments': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/patients/:id/enrollments': { own: [403, 201, 403, 403, 403, 401], other: [403, 404, 403, 403, 403, 401] },
  'patch /api/enrollments/:id': { own: [403, 200, 403, 403, 403, 401], other: [403, 404, 403, 403, 403, 401] },
  'post /api/flags/:id/resolve': { own: [403, 403, 200, 200, 403, 401], other: [403, 403, 404, 404, 403, 401] },

  // record spirometry, walk tests, scores: the three clinical roles
  'get /api/patients/:id/tests': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'get /api/patients/:id/spirometry-tests': {
    own: [403, 200, 200, 200, 403, 401],
    other: [403, 404, 404, 404, 403, 401],
  },
  'post /api/patients/:id/spirometry-tests': {
    own: [403, 201, 201, 201, 403, 401],
    other: [403, 404, 404, 404, 403, 401],
  },
  'get /api/spirometry-tests/:id': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/spirometry-tests/:id/amend': {
    own: [403, 200, 200, 200, 403, 401],
    other: [403, 404, 404, 404, 403, 401],
  },
  'post /api/spirometry-tests/:id/void': {
    own: [403, 200, 200, 200, 403, 401],
    other: [403, 404, 404, 404, 403, 401],
  },
  'get /api/patients/:id/measurements': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/patients/:id/measurements': {
    own: [403, 201, 201, 201, 403, 401],
    other: [403, 404, 404, 404, 403, 401],
  },
  'get /api/measurements/:id': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/measurements/:id/amend': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/measurements/:id/void': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'get /api/patients/:id/body-sizes': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/patients/:id/body-sizes': { own: [403, 201, 201, 201, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'get /api/body-sizes/:id': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/body-sizes/:id/amend': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/body-sizes/:id/void': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },

  // the record's file; a hold is released by a pulmonologist alone
  'get /api/patients/:id/file-entries': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/patients/:id/file-entries': {
    own: [403, 201, 201, 201, 403, 401],
    other: [403, 404, 404, 404, 403, 401],
  },
  'get /api/file-entries/:id': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/file-entries/:id/amend': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/file-entries/:id/void': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'post /api/file-entries/:id/release': { own: [403, 403, 403, 200, 403, 401], other: [403, 403, 403, 404, 403, 401] },

  // trends and predictions: the three clinical roles; "staff" does not include the administrator
  'post /api/predictions': list([403, 200, 200, 200, 403, 401]),
  'get /api/patients/:id/trends': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },

  'get /api/drafts/:form/:subject': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'put /api/drafts/:form/:subject': { own: [403, 200, 200, 200, 403, 401], other: [403, 404, 404, 404, 403, 401] },
  'delete /api/drafts/:form/:subject': { own: [403, 204, 204, 204, 403, 401], other: [403, 404, 404, 404, 403, 401] },

  // a patient's own pages
  'get /api/me/home': list([403, 403, 403, 403, 200, 401]),
};

/** Routes whose answer depends on what the entry is: oxygen orders and safety holds in the file. */
export const fileEntryExpectations: Record<string, readonly [number, number, number]> = {
  // coordinator, therapist, pulmonologist
  'enter an oxygen order of this clinic': [403, 403, 201],
  'record what an outside oxygen order says': [201, 201, 201],
  'amend an oxygen order of this clinic': [403, 403, 200],
  'turn an order of this clinic into an outside one': [403, 403, 200],
  'turn an outside order into one of this clinic': [403, 403, 200],
  'void an oxygen order of this clinic': [403, 403, 200],
  'amend an outside oxygen order': [200, 200, 200],
  'raise a safety hold': [201, 201, 201],
  'amend a safety hold': [403, 403, 200],
  'void a safety hold': [403, 403, 200],
};
