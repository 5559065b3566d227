/** Actions whose words do not follow from their parts. */
const whole: Record<string, string> = {
  'account.sign-in': 'Signed in',
  'account.sign-out': 'Signed out',
  'account.read': 'Opened the app',
  'account.activity': 'Was active',
  'account.link-read': 'Opened an invitation',
  'account.password-chosen': 'Chose a password',
  'audit.read': 'Read the audit trail',
  'patient.duplicate-check': 'Checked for a duplicate',
  'patient.list': 'Listed patients',
  'file-entry.release': 'Released a safety hold',
  'user.invite': 'Made an invitation link',
};

const verbs: Record<string, string> = {
  read: 'Opened',
  list: 'Listed',
  create: 'Added',
  change: 'Changed',
  amend: 'Amended',
  void: 'Voided',
  save: 'Saved',
  discard: 'Discarded',
  resolve: 'Resolved',
  compute: 'Computed',
};

/** `spirometry-test.amend` as "Amended: spirometry test"; a code without words here is shown as it is. */
export const actionWords = (action: string): string => {
  const known = whole[action];
  if (known) return known;
  const [thing = '', deed = ''] = action.split('.');
  const verb = verbs[deed];
  return verb ? `${verb}: ${thing.replace(/-/g, ' ')}` : action;
};
