import type { UploadItem } from './upload-item';
import { percentSent, refusalBeforehand, stateOfAnswer, stateOfProblem } from './upload-item';
import { toProblemError } from '../http/problem-error';
import { HttpErrorResponse } from '@angular/common/http';
import { aProblem } from '../testing/records';

describe('refusalBeforehand', () => {
  it('lets a file of exactly the limit through', () => {
    expect(refusalBeforehand({ name: 'a.nc', size: 1024 ** 2 }, 1024 ** 2)).toBeNull();
  });
  it('refuses one byte more and names both sizes', () => {
    const refused = refusalBeforehand({ name: 'a.nc', size: 3 * 1024 ** 2 }, 1024 ** 2);
    expect(refused?.reason).toBe('3 MB is more than the shop takes (1 MB).');
  });
});

describe('stateOfAnswer', () => {
  it('gives the server’s reason for a refused file', () => {
    const state = stateOfAnswer({
      files: [
        {
          outcome: 'refused',
          name: 'a.nc',
          code: 'not-text',
          reason: 'It is a PNG picture.',
          next: 'Upload the posted program.',
        },
      ],
    });
    expect(state).toEqual({
      step: 'refused',
      reason: 'It is a PNG picture.',
      next: 'Upload the posted program.',
    });
  });
  it('does not call a file stored that the answer leaves out', () => {
    expect(stateOfAnswer({ files: [] }).step).toBe('failed');
  });
});

describe('stateOfProblem', () => {
  const state = (status: number) =>
    stateOfProblem(toProblemError(new HttpErrorResponse({ status, error: aProblem({ status }) })));
  it('offers to send again what broke off', () => expect(state(503).step).toBe('failed'));
  it('does not offer to send again what is too large', () =>
    expect(state(413).step).toBe('refused'));
});

describe('percentSent', () => {
  const item = (bytes: number, sent: number): UploadItem => ({
    id: 1,
    name: 'a.nc',
    bytes,
    machineId: 'm',
    state: { step: 'sending', sent },
  });
  it('counts bytes sent', () => expect(percentSent(item(200, 50))).toBe(25));
  it('has nothing to count in an empty file', () => expect(percentSent(item(0, 0))).toBeNull());
});
