import type { HttpRequest } from '@angular/common/http';
import { HttpEventType } from '@angular/common/http';
import type { TestRequest } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { CurrentUser } from '../sign-in/current-user';
import { CHECK, NORTH, PROGRAM, REVISION, aProblem, aSession } from '../testing/records';
import { setUp, signInAs } from '../testing/set-up';
import { UploadQueue } from './upload-queue';

const file = (name: string, size = 100): File => new File(['x'.repeat(size)], name);
const stored = (name: string) => ({
  files: [
    {
      outcome: 'stored',
      name,
      programId: PROGRAM,
      revisionId: REVISION,
      revision: 1,
      unchanged: false,
      checkId: CHECK,
    },
  ],
});

async function open() {
  const http = setUp();
  await signInAs(http, 'programmer');
  const queue = TestBed.inject(UploadQueue);
  return {
    queue,
    underWay: (): TestRequest[] => http.match((request) => request.url === '/api/v1/programs'),
    steps: () =>
      queue
        .items()
        .map((item) => `${item.name} ${item.state.step}`)
        .join(', '),
  };
}

describe('UploadQueue', () => {
  it('sends each file in a request of its own, two at a time', async () => {
    const { queue, underWay, steps } = await open();
    queue.add([file('a.nc'), file('b.nc'), file('c.nc')], NORTH);
    const [a, b, ...more] = underWay();
    expect(more).toHaveLength(0);
    expect(a?.request.params.get('machineId')).toBe(NORTH);
    expect((a?.request.body as FormData).getAll('files')).toHaveLength(1);
    expect(steps()).toBe('a.nc sending, b.nc sending, c.nc waiting');
    b?.flush(stored('b.nc'), { status: 201, statusText: 'Created' });
    expect(underWay()).toHaveLength(1);
    expect(steps()).toBe('a.nc sending, b.nc stored, c.nc sending');
  });

  it('says how much of a file is out, and when the server stores it', async () => {
    const { queue, underWay } = await open();
    queue.add([file('a.nc', 100)], NORTH);
    const [request] = underWay();
    request?.event({ type: HttpEventType.UploadProgress, loaded: 40, total: 160 });
    expect(queue.items()[0]?.state).toEqual({ step: 'sending', sent: 40 });
    request?.event({ type: HttpEventType.UploadProgress, loaded: 160, total: 160 });
    expect(queue.items()[0]?.state.step).toBe('storing');
    expect(queue.isSending()).toBe(true);
  });

  it('does not let one refused file sink the others', async () => {
    const { queue, underWay, steps } = await open();
    queue.add([file('a.nc'), file('large.nc', 2 * 1024 ** 2), file('c.nc')], NORTH);
    const [a, c] = underWay();
    a?.flush(aProblem({ status: 503 }), { status: 503, statusText: 'Not ready' });
    c?.flush(stored('c.nc'), { status: 201, statusText: 'Created' });
    expect(steps()).toBe('a.nc failed, large.nc refused, c.nc stored');
  });

  it('sends a file again that broke off', async () => {
    const { queue, underWay, steps } = await open();
    queue.add([file('a.nc')], NORTH);
    underWay()[0]?.error(new ProgressEvent('error'));
    expect(steps()).toBe('a.nc failed');
    queue.sendAgain(queue.items()[0]?.id ?? 0);
    underWay()[0]?.flush(stored('a.nc'), { status: 201, statusText: 'Created' });
    expect(steps()).toBe('a.nc stored');
  });

  it('renews a session that is about to end before the bytes go out', async () => {
    const http = setUp();
    const user = TestBed.inject(CurrentUser);
    const resumed = user.resume();
    const soon = new Date(Date.now() + 30_000).toISOString();
    http.expectOne('/api/v1/session').flush({ ...aSession(), expiresAt: soon });
    await resumed;
    TestBed.inject(UploadQueue).add([file('a.nc')], NORTH);
    const isUpload = (request: HttpRequest<unknown>) => request.url === '/api/v1/programs';
    expect(http.match(isUpload)).toHaveLength(0);
    http.expectOne('/api/v1/session/refresh').flush(aSession());
    expect(http.match(isUpload)).toHaveLength(1);
  });

  it('breaks off a file that is taken off the list', async () => {
    const { queue, underWay } = await open();
    queue.add([file('a.nc')], NORTH);
    const [request] = underWay();
    queue.drop(queue.items()[0]?.id ?? 0);
    expect(request?.cancelled).toBe(true);
    expect(queue.items()).toHaveLength(0);
  });

  it('keeps what is under way when the list is cleared', async () => {
    const { queue, underWay, steps } = await open();
    queue.add([file('a.nc'), file('b.nc')], NORTH);
    underWay()[0]?.flush(stored('a.nc'), { status: 201, statusText: 'Created' });
    queue.clearFinished();
    expect(steps()).toBe('b.nc sending');
  });
});
