import { TestbedHarnessEnvironment } from '@angular/cdk/testing/testbed';
import { TestBed } from '@angular/core/testing';
import { MatButtonHarness } from '@angular/material/button/testing';
import { MatCheckboxHarness } from '@angular/material/checkbox/testing';
import { MatFormFieldHarness } from '@angular/material/form-field/testing';
import { MatInputHarness } from '@angular/material/input/testing';
import { MatSelectHarness } from '@angular/material/select/testing';
import type { Role } from '#contracts';
import { setUp, signInAs } from '../testing/set-up';
import { JobForm } from './job-form';
import type { JobDocument } from './job-sheet';

async function open(job: JobDocument | null, role: Role = 'programmer') {
  const http = setUp();
  await signInAs(http, role);
  const fixture = TestBed.createComponent(JobForm);
  fixture.componentRef.setInput('job', job);
  fixture.componentRef.setInput('revision', job ? 1 : 0);
  const saved: JobDocument[] = [];
  fixture.componentInstance.saved.subscribe((each) => saved.push(each));
  await fixture.whenStable();
  const loader = TestbedHarnessEnvironment.loader(fixture);
  const field = async (floatingLabelText: string): Promise<MatInputHarness> => {
    const box = await loader.getHarness(MatFormFieldHarness.with({ floatingLabelText }));
    return (await box.getControl(MatInputHarness))!;
  };
  const press = async (text: string | RegExp): Promise<void> =>
    (await loader.getHarness(MatButtonHarness.with({ text }))).click();
  return { fixture, loader, field, press, saved };
}

const OAK: JobDocument = {
  stock: {
    in: 'G54',
    min: { x: 0, y: 0, z: -18 },
    max: { x: 540, y: 210, z: 0 },
    material: 'oak',
  },
  zeroOn: 'top',
  obstacles: [],
};

describe('JobForm', () => {
  it('saves a stock that is typed on a blank sheet', async () => {
    const { loader, field, press, saved } = await open(null);
    await (await loader.getHarness(MatCheckboxHarness)).check();
    await (await field('Size along X')).setValue('600');
    await (await field('Size along Y')).setValue('400');
    await (await field('Thickness')).setValue('18');
    await press('Save as job sheet 1');
    expect(saved).toEqual([
      {
        stock: { in: 'G54', min: { x: 0, y: 0, z: -18 }, max: { x: 600, y: 400, z: 0 } },
        zeroOn: 'top',
        obstacles: [],
      },
    ]);
  });

  it('does not save a stock without a thickness, and says so at the field', async () => {
    const { fixture, field, press, saved } = await open(OAK);
    await (await field('Thickness')).setValue('');
    await press('Save as job sheet 2');
    expect(saved).toEqual([]);
    const text = (fixture.nativeElement as HTMLElement).textContent;
    expect(text).toContain('Type a thickness above 0.');
  });

  it('adds an obstacle and refuses one whose sides are swapped', async () => {
    const { fixture, field, press, saved } = await open(OAK);
    await press(/Add an obstacle/);
    await (await field('Name')).setValue('Clamp');
    await (await field('left (x, mm)')).setValue('40');
    await (await field('right (x, mm)')).setValue('10');
    await press('Save as job sheet 2');
    expect(saved).toEqual([]);
    const text = (fixture.nativeElement as HTMLElement).textContent;
    expect(text).toContain('left must not lie beyond right');
    await (await field('right (x, mm)')).setValue('70');
    await press('Save as job sheet 2');
    expect(saved[0]?.obstacles).toEqual([
      { name: 'Clamp', in: 'G54', box: { min: { x: 40 }, max: { x: 70 } } },
    ]);
  });

  it('drops the changes on request', async () => {
    const { field, press } = await open(OAK);
    await (await field('Size along X')).setValue('1');
    await press('Drop the changes');
    expect(await (await field('Size along X')).getValue()).toBe('540');
  });

  it('is for reading only without the right to change it', async () => {
    const { loader, field } = await open(OAK, 'operator');
    expect(await (await field('Size along X')).isDisabled()).toBe(true);
    const [zero] = await loader.getAllHarnesses(MatSelectHarness);
    expect(await zero?.isDisabled()).toBe(true);
    expect(await loader.getAllHarnesses(MatButtonHarness.with({ text: /Save/ }))).toHaveLength(0);
  });
});
