import { HttpErrorResponse } from '@angular/common/http';
import { aProblem } from '../testing/records';
import { ProblemError, toProblemError } from './problem-error';

const answer = (status: number, error: unknown): HttpErrorResponse =>
  new HttpErrorResponse({ status, error });

describe('toProblemError', () => {
  it('takes the server’s own words', () => {
    const problem = toProblemError(answer(409, aProblem()));
    expect(problem.message).toBe('It cannot be done as things stand.');
    expect([problem.status, problem.code, problem.next]).toEqual([
      409,
      'not-possible-now',
      'Change something first.',
    ]);
  });
  it('reads a problem that arrived as text', () => {
    expect(toProblemError(answer(409, JSON.stringify(aProblem()))).code).toBe('not-possible-now');
  });
  it('finds the message of one field', () => {
    const fields = [{ path: 'email', message: 'This address is taken.' }];
    const problem = toProblemError(answer(400, aProblem({ status: 400, fields })));
    expect(problem.field('email')).toBe('This address is taken.');
    expect(problem.field('name')).toBeUndefined();
  });
  it('says so when nobody answered', () => {
    expect(toProblemError(answer(0, null)).message).toBe('The server did not answer.');
  });
  it('names the status of an answer that gives no reason', () => {
    expect(toProblemError(answer(502, '<html>')).message).toContain('502');
  });
  it('leaves a problem as it is', () => {
    const problem = new ProblemError(toProblemError(answer(0, null)).problem);
    expect(toProblemError(problem)).toBe(problem);
  });
  it('never shows a fault of our own as if it came from the server', () => {
    expect(toProblemError(new TypeError('x is undefined')).code).toBe('client-fault');
  });
});
