import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import type { ProgramDetails } from '#contracts';
import { NORTH, PROGRAM, REVISION, aCheck, aProblem, aProgram } from '../testing/records';
import { setUp, settle, signInAs } from '../testing/set-up';
import { ProgramPage } from './program-page';

const ADDRESS = `/api/v1/programs/${PROGRAM}`;
const CONFLICT = { status: 409, statusText: 'Conflict' };

function details(change: Partial<ProgramDetails> = {}): ProgramDetails {
  const failed = aCheck({ state: 'failed', verdict: null, counts: null, failure: 'It broke off.' });
  return {
    program: aProgram({ checks: [failed] }),
    revisions: [
      {
        id: REVISION,
        number: 1,
        sha256: 'b'.repeat(64),
        bytes: 1200,
        lines: 80,
        originalName: 'door.nc',
        uploadedBy: 'Pia',
        uploadedAt: '2026-12-01T10:00:00.000Z',
        checks: [failed],
      },
    ],
    job: { zeroOn: 'top', obstacles: [], stock: STOCK },
    jobRevision: 3,
    ...change,
  };
}
const STOCK = { in: 'G54', min: { x: 0, y: 0, z: -18 }, max: { x: 600, y: 400, z: 0 } };

async function open() {
  const http = setUp();
  await signInAs(http, 'programmer');
  const fixture = TestBed.createComponent(ProgramPage);
  fixture.componentRef.setInput('id', PROGRAM);
  await settle();
  http.expectOne('/api/v1/machines').flush({ machines: [] });
  http.expectOne(ADDRESS).flush(details());
  await settle(fixture);
  const loader = TestbedHarnessEnvironment.loader(fixture);
  const thickness = async (): Promise<MatInputHarness> => {
    const box = await loader.getHarness(
      MatFormFieldHarness.with({ floatingLabelText: 'Thickness' }),
    );
    return (await box.getControl(MatInputHarness))!;
  };
  const press = async (text: string | RegExp): Promise<void> =>
    (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  const text = (): string => (fixture.nativeElement as HTMLElement).textContent ?? '';
  return { http, fixture, thickness, press, text };
}

describe('ProgramPage', () => {
  it('shows why a check did not finish and starts it again', async () => {
    const { http, press, text } = await open();
    expect(text()).toContain('It broke off.');
    await press('Check again');
    const request = http.expectOne(`/api/v1/program-revisions/${REVISION}/checks`);
    expect(request.request.body).toEqual({ machineId: NORTH });
  });

  it('saves the job sheet on the revision it was read at', async () => {
    const { http, fixture, thickness, press, text } = await open();
    await (await thickness()).setValue('19');
    await press('Save as job sheet 4');
    const request = http.expectOne(`${ADDRESS}/job`);
    expect(request.request.body).toMatchObject({ basedOn: 3, job: { stock: { min: { z: -19 } } } });
    request.flush(details({ jobRevision: 4 }));
    await settle(fixture);
    expect(text()).toContain('revision 4');
    expect(fixture.componentInstance.hasUnsaved()).toBe(false);
  });

  it('keeps what was typed when someone saved first, and saves it on request', async () => {
    const { http, fixture, thickness, press, text } = await open();
    await (await thickness()).setValue('19');
    await press('Save as job sheet 4');
    const refusal = aProblem({ detail: 'Len changed the job sheet; it is now at revision 4.' });
    http.expectOne(`${ADDRESS}/job`).flush(refusal, CONFLICT);
    await settle(fixture);
    expect(text()).toContain('Len changed the job sheet');
    expect(await (await thickness()).getValue()).toBe('19');
    await press('Save mine as the newest');
    http.expectOne(ADDRESS).flush(details({ jobRevision: 4 }));
    await settle();
    const again = http.expectOne(`${ADDRESS}/job`);
    expect(again.request.body).toMatchObject({ basedOn: 4, job: { stock: { min: { z: -19 } } } });
  });

  it('asks before it is left with a sheet nobody saved', async () => {
    const { fixture, thickness } = await open();
    expect(fixture.componentInstance.hasUnsaved()).toBe(false);
    await (await thickness()).setValue('19');
    expect(fixture.componentInstance.hasUnsaved()).toBe(true);
  });
});
