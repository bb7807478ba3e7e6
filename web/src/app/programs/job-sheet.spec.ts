import type { Corner, JobDocument, TypedJob } from './job-sheet';
import { BLANK_JOB, jobDocument, twistedSides, typedJob } from './job-sheet';

const typed = (change: Partial<TypedJob>): TypedJob => ({
  ...BLANK_JOB,
  hasStock: true,
  sizeX: 600,
  sizeY: 400,
  thickness: 18,
  ...change,
});
const box = (job: JobDocument): string => {
  const { min, max } = job.stock!;
  return `${min.x},${min.y},${min.z} to ${max.x},${max.y},${max.z}`;
};

describe('jobDocument', () => {
  it.each<[Corner, string]>([
    ['front-left', '0,0,-18 to 600,400,0'],
    ['front-right', '-600,0,-18 to 0,400,0'],
    ['back-left', '0,-400,-18 to 600,0,0'],
    ['back-right', '-600,-400,-18 to 0,0,0'],
    ['centre', '-300,-200,-18 to 300,200,0'],
  ])('puts the stock round a zero on its %s', (corner, expected) => {
    expect(box(jobDocument(typed({ corner }), 'mm'))).toBe(expected);
  });

  it('puts the stock above a zero on the spoilboard', () => {
    expect(box(jobDocument(typed({ zeroOn: 'board' }), 'mm'))).toBe('0,0,0 to 600,400,18');
  });

  it('puts the stock where it was measured', () => {
    const job = jobDocument(typed({ corner: 'measured', atX: -5, atY: 12.5 }), 'mm');
    expect(box(job)).toBe('-5,12.5,-18 to 595,412.5,0');
  });

  // 1 inch is exactly 25.4 mm (International yard and pound agreement, 1959): 4 ft x 8 ft x 3/4 in.
  it('stores a 48 by 96 inch sheet of 3/4 inch in millimetres', () => {
    const sheet = typed({ sizeX: 48, sizeY: 96, thickness: 0.75 });
    expect(box(jobDocument(sheet, 'inch'))).toBe('0,0,-19.05 to 1219.2,2438.4,0');
  });

  it('leaves the sides of an obstacle open that nobody typed', () => {
    const clamp = { name: ' Clamp ', in: 'G55', sides: [0, 40, null, null, null, 30] };
    const job = jobDocument({ ...BLANK_JOB, obstacles: [clamp] }, 'mm');
    expect(job.obstacles).toEqual([
      { name: 'Clamp', in: 'G55', box: { min: { x: 0 }, max: { x: 40, z: 30 } } },
    ]);
    expect(job.stock).toBeUndefined();
  });
});

describe('typedJob', () => {
  it.each<Corner>(['front-left', 'front-right', 'back-left', 'back-right', 'centre', 'measured'])(
    'reads back what was typed with zero on: %s',
    (corner) => {
      const before = typed({ corner, atX: 7, atY: -3, material: 'oak' });
      const after = typedJob(jobDocument(before, 'mm'), 'mm');
      expect(after.corner).toBe(corner);
      expect([after.sizeX, after.sizeY, after.thickness]).toEqual([600, 400, 18]);
      expect(after.material).toBe('oak');
    },
  );

  it('loses nothing on the way through inches and back', () => {
    const job = jobDocument(typed({ sizeX: 597.3, thickness: 18.2 }), 'mm');
    expect(jobDocument(typedJob(job, 'inch'), 'inch')).toEqual(job);
  });

  it('keeps the height of an imported stock that does not lie at zero', () => {
    const job: JobDocument = {
      stock: { in: 'G54', min: { x: 0, y: 0, z: -20 }, max: { x: 10, y: 10, z: -2 } },
      zeroOn: 'top',
      obstacles: [],
    };
    expect(typedJob(job, 'mm').lift).toBe(-2);
    expect(jobDocument(typedJob(job, 'mm'), 'mm')).toEqual(job);
  });

  it('is blank where no sheet was saved', () => expect(typedJob(null, 'mm')).toBe(BLANK_JOB));
});

describe('twistedSides', () => {
  it('allows sides that are open or in order', () => {
    expect(twistedSides([0, 10, null, 5, -3, null])).toEqual([]);
  });
  it('names each pair that stands the wrong way round', () => {
    expect(twistedSides([10, 0, 0, 1, 5, 4])).toEqual([
      'left must not lie beyond right',
      'bottom must not lie beyond top',
    ]);
  });
});
