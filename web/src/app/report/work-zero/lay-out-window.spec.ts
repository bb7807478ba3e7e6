import { layOutWindows } from './lay-out-window';

function one(range: readonly [number, number] | null, value: number | undefined) {
  return layOutWindows(
    { G54: { x: range, y: null, z: null } },
    { G54: value === undefined ? {} : { x: value } },
  );
}

test('an axis the program does not use has no row', () => {
  expect(one(null, 5)).toEqual([]);
});

test('inside, at either end too', () => {
  for (const value of [-60, -20, 14.2]) expect(one([-60, 14.2], value)[0]!.state).toBe('inside');
});

test('exactly at a limit is inside, past it by more than a thousandth is not (engine.md)', () => {
  expect(one([-60, 14.2], 14.2005)[0]!.state).toBe('inside');
  expect(one([-60, 14.2], 14.2021)[0]!.state).toBe('outside');
});

test('outside says how far to go and which way', () => {
  expect(one([-60, -14.2], 20)[0]).toMatchObject({
    state: 'outside',
    toward: 'to the left',
    by: 34.2,
  });
  expect(one([-60, -14.2], -70)[0]).toMatchObject({ toward: 'to the right', by: 10 });
});

test('on Y and Z the ways are front and back, down and up', () => {
  const rows = layOutWindows(
    { G54: { x: null, y: [0, 10], z: [-190, -120] } },
    { G54: { y: 15, z: -200 } },
  );
  expect(rows.map((row) => row.toward)).toEqual(['toward the front', 'up']);
});

test('a window whose ends are crossed fits nowhere', () => {
  expect(one([5, -12], 0)[0]).toMatchObject({ state: 'nowhere', by: 17, bar: null });
});

test('an offset without a value yet still shows its window', () => {
  const [row] = one([0, 100], undefined);
  expect(row).toMatchObject({ state: 'unset', value: null });
  expect(row!.bar).toMatchObject({ value: null });
});

test('bar and mark lie within the picture, the mark where the value is', () => {
  for (const value of [-500, 0, 50, 100, 900]) {
    const { bar, state } = one([0, 100], value)[0]!;
    expect(bar!.from).toBeGreaterThanOrEqual(0);
    expect(bar!.from + bar!.width).toBeLessThanOrEqual(100);
    expect(bar!.value! < bar!.from || bar!.from + bar!.width < bar!.value!).toBe(
      state === 'outside',
    );
  }
});
