import type { Page } from 'playwright-core';
import type { MachineList, ProgramPage } from '../../../shared/contracts/index';

export interface Place {
  readonly name: string;
  readonly path: string;
}

/** Every place a lead may see (people are the admin's), with the demo's machine, program and check in their addresses. */
export async function placesOf(page: Page): Promise<Place[]> {
  const { machines } = await read<MachineList>(page, '/api/v1/machines');
  const { programs } = await read<ProgramPage>(page, '/api/v1/programs?limit=50');
  const machine = machines.find(({ name }) => name === 'North router')?.id;
  const checkOf = (name: string) =>
    programs.find((each) => each.name === name)?.checks.find(({ state }) => state === 'done')?.id;
  const program = programs.find(({ name }) => name === 'long-worktop.nc')?.id;
  return [
    { name: 'bench', path: '/bench' },
    { name: 'programs', path: '/programs' },
    { name: 'program', path: `/programs/${program}` },
    { name: 'report', path: `/checks/${checkOf('sign-panel.nc')}` },
    { name: 'report-travel', path: `/checks/${checkOf('long-worktop.nc')}` },
    { name: 'report-clear', path: `/checks/${checkOf('cabinet-door.nc')}` },
    { name: 'report-long', path: `/checks/${checkOf('relief-carving.nc')}` },
    { name: 'racks', path: '/racks' },
    { name: 'rack', path: `/racks/${machine}` },
    { name: 'tools', path: '/tools' },
    { name: 'machines', path: '/machines' },
    { name: 'machine', path: `/machines/${machine}` },
    { name: 'change-macro', path: `/change-macro/${machine}` },
    { name: 'audit', path: '/shop/audit' },
    { name: 'settings', path: '/shop/settings' },
  ];
}

/** Waits until no check of the demo is queued or running any more. */
export async function checksDone(page: Page): Promise<void> {
  const deadline = Date.now() + 120_000;
  for (;;) {
    const { programs } = await read<ProgramPage>(page, '/api/v1/programs?limit=50');
    const checks = programs.flatMap((each) => each.checks);
    if (checks.length > 0 && checks.every(({ state }) => state === 'done' || state === 'failed'))
      return;
    if (Date.now() > deadline) throw new Error('The checks of the demo did not finish.');
    await new Promise((done) => setTimeout(done, 200));
  }
}

async function read<T>(page: Page, path: string): Promise<T> {
  const answer = await page.request.get(path);
  if (!answer.ok()) throw new Error(`${path} answered ${answer.status()}`);
  return (await answer.json()) as T;
}
