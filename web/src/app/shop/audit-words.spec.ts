import type { AuditEvent } from '#contracts';
import { auditLine } from './audit-words';

const event = (change: Partial<AuditEvent>): AuditEvent => ({
  id: '1',
  at: '2026-12-01T10:00:00.000Z',
  person: 'Ada',
  action: 'person.change',
  subject: 'Pia',
  detail: {},
  ...change,
});

describe('auditLine', () => {
  it('says who did what to whom', () => {
    const { person, did, subject } = auditLine(event({}));
    expect([person, did, subject].join(' ')).toBe('Ada changed Pia');
  });
  it('names nobody’s acts as our own', () => {
    expect(auditLine(event({ person: null })).person).toBe('Nightlatch');
  });
  it('spells an act it does not know from its code', () => {
    expect(auditLine(event({ action: 'run.break-off' })).did).toBe('run break off');
  });
  it('does not name the subject twice', () => {
    const { subject } = auditLine(event({ action: 'policy.change', subject: 'shop policy' }));
    expect(subject).toBe('');
  });
  it('lays nested details out in lines', () => {
    const detail = { before: { roles: ['lead'], active: true }, newPassword: false, note: null };
    expect(auditLine(event({ detail })).details).toEqual([
      { name: 'before roles', value: 'lead' },
      { name: 'before active', value: 'yes' },
      { name: 'new password', value: 'no' },
      { name: 'note', value: '–' },
    ]);
  });
});
