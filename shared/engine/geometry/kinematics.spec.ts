import { expect, test } from 'vitest';
import { alongDirection, standstillSeconds, travelSeconds } from './kinematics';

// Source: uniform acceleration, any handbook of mechanics: t = d/v + v/a if d >= v²/a, else 2 sqrt(d/a).
// The figures are worked by hand from these formulas.
test.each([
  ['1500 mm at 333.333 mm/s, 1000 mm/s²: 4.5 + 0.3333', 1500, 1000, 1000 / 3, 4.8333],
  ['50 mm is too short to reach that speed: 2 sqrt(0.05)', 50, 1000, 1000 / 3, 0.4472],
  ['200 mm at 166.667 mm/s, 800 mm/s²: 1.2 + 0.2083', 200, 800, 500 / 3, 1.4083],
  ['10 mm at 150 mm/s, 1000 mm/s²: a triangle, 0.2', 10, 1000, 150, 0.2],
  ['1 mm: 0.0632', 1, 1000, 150, 0.0632],
  ['exactly v²/a: triangle and trapezoid agree, 2 v/a', 22.5, 1000, 150, 0.3],
] as const)('standstill to standstill: %s', (_name, length, acceleration, most, seconds) => {
  expect(standstillSeconds(length, acceleration, most)).toBeCloseTo(seconds, 4);
});

test('carried through at full speed a length takes length over speed', () => {
  expect(travelSeconds(10, 1000, 150, 150, 150)).toBeCloseTo(10 / 150, 12);
});

test('entered at speed and left standing: the ramp down alone is longer by half its own time', () => {
  // s = v²/2a = 11.25 to stop, the other 8.75 mm at 150 mm/s.
  expect(travelSeconds(20, 1000, 150, 150, 0)).toBeCloseTo(0.15 + 8.75 / 150, 12);
});

test('agrees with small steps of time', () => {
  const byStepping = (length: number, a: number, most: number, enter: number, leave: number) => {
    const step = 1e-5;
    let speed = enter;
    let left = length;
    let seconds = 0;
    while (left > 0) {
      const braking = (speed * speed - leave * leave) / (2 * a);
      if (braking >= left) speed = Math.max(leave, speed - a * step);
      else if (speed < most) speed = Math.min(most, speed + a * step);
      left -= Math.max(speed, a * step) * step;
      seconds += step;
    }
    return seconds;
  };
  for (const [length, a, most, enter, leave] of [
    [30, 1500, 80, 20, 40],
    [4, 1500, 200, 10, 30],
    [100, 800, 100, 0, 60],
    [2, 1000, 500, 40, 5],
  ] as const) {
    expect(travelSeconds(length, a, most, enter, leave)).toBeCloseTo(
      byStepping(length, a, most, enter, leave),
      3,
    );
  }
});

test('never takes less time for a longer way, and never none for some', () => {
  let before = 0;
  for (let length = 0.01; length < 40; length += 0.17) {
    const seconds = travelSeconds(length, 1200, 90, 15, 30);
    expect(seconds).toBeGreaterThan(before);
    before = seconds;
  }
});

test('the axis that is used up first decides along a slope', () => {
  expect(alongDirection(0.6, 0.8, 0, { x: 100, y: 100, z: 10 })).toBeCloseTo(125, 9);
  expect(alongDirection(0, 0, -1, { x: 100, y: 100, z: 10 })).toBe(10);
  expect(alongDirection(0.8, 0, 0.6, { x: 100, y: 100, z: 10 })).toBeCloseTo(10 / 0.6, 9);
});
