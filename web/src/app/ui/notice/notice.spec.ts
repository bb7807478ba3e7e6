import { TestBed } from '@angular/core/testing';
import { aProblem } from '../../testing/records';
import { ProblemError } from '../../http/problem-error';
import type { Problem } from '#contracts';
import { Notice } from './notice';

const problem = (change: Record<string, unknown>) =>
  new ProblemError(aProblem(change) as unknown as Problem);

async function draw(inputs: Record<string, unknown>) {
  const fixture = TestBed.createComponent(Notice);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return { fixture, host: fixture.nativeElement as HTMLElement };
}

describe('Notice', () => {
  it('says what was refused, each wrong field, and what to do', async () => {
    const fields = [{ path: 'stock.max.x', message: 'must exceed min' }];
    const { host } = await draw({ problem: problem({ status: 400, fields }) });
    expect(host.getAttribute('role')).toBe('alert');
    expect(host.className).toContain('refused');
    expect(host.textContent).toContain('It cannot be done as things stand.');
    expect(host.textContent).toContain('Change something first.');
    expect(host.textContent).toMatch(/stock\.max\.x\s+must exceed min/);
  });
  it('tells a failure from a refusal', async () => {
    expect((await draw({ problem: problem({ status: 503 }) })).host.className).toContain('failed');
  });
  it('shows progress while waiting and does not alarm', async () => {
    const { host } = await draw({ kind: 'waiting', heading: 'Reading the list' });
    const bar = host.querySelector('[role=progressbar]');
    expect(bar?.getAttribute('aria-label')).toBe('Reading the list');
    expect(host.getAttribute('role')).toBe('status');
  });
  it('offers to try again only when that can help', async () => {
    expect((await draw({ problem: problem({}) })).host.querySelector('button')).toBeNull();
    const { fixture, host } = await draw({ problem: problem({}), canTryAgain: true });
    let asked = 0;
    fixture.componentInstance.tryAgain.subscribe(() => (asked += 1));
    host.querySelector('button')?.click();
    expect(asked).toBe(1);
  });
});
