import type { ScrollPlace } from './scroll-map';
import { GREATEST_HEIGHT, barHeight, follow, isAstray, isStuck, placeAt } from './scroll-map';

const SHORT = { total: 5000, view: 600 };
/** A million lines of 24 px, all unfolded. */
const LONG = { total: 24_000_000, view: 600 };
const START: ScrollPlace = { bar: 0, top: 0 };

test('a report that fits scrolls as any page does', () => {
  expect(barHeight(SHORT)).toBe(5000);
  expect(follow(START, 1234, SHORT)).toEqual({ bar: 1234, top: 1234 });
  expect(follow(START, 4400, SHORT)).toEqual({ bar: 4400, top: 4400 });
  expect(isAstray({ bar: 1234, top: 1234 }, SHORT)).toBe(false);
});

test('no element is higher than browsers can draw', () => {
  expect(barHeight(LONG)).toBe(GREATEST_HEIGHT);
});

test('the wheel moves a long report by as many pixels as it turned', () => {
  const middle = placeAt(12_000_000, LONG);
  const after = follow(middle, middle.bar + 100, LONG);
  expect(after.top - middle.top).toBe(100);
});

test('a drag of the bar reaches every part, and both ends exactly', () => {
  expect(follow(START, GREATEST_HEIGHT - 600, LONG).top).toBe(24_000_000 - 600);
  expect(follow(placeAt(20_000_000, LONG), 0, LONG).top).toBe(0);
  const middle = follow(START, (GREATEST_HEIGHT - 600) / 2, LONG).top;
  expect(middle).toBeCloseTo((24_000_000 - 600) / 2, 0);
});

test('place and bar belong together, wherever the report stands', () => {
  for (const top of [0, 5, 900_000, 1_000_001, 7_654_321, 22_999_000, 23_500_000, 23_999_400]) {
    const place = placeAt(top, LONG);
    expect(place.top).toBe(top);
    expect(0 <= place.bar && place.bar <= GREATEST_HEIGHT - 600).toBe(true);
    expect(isAstray(place, LONG)).toBe(false);
    // A jump to that bar from far away lands on the same row.
    expect(Math.abs(follow({ bar: -1e7, top: 0 }, place.bar, LONG).top - top)).toBeLessThan(0.01);
  }
});

test('the bar goes down only as the report goes down', () => {
  let before = -1;
  for (let top = 0; top <= 23_999_400; top += 47_998) {
    const { bar } = placeAt(top, LONG);
    expect(bar).toBeGreaterThan(before);
    before = bar;
  }
});

test('many small moves leave the bar astray; set right, it stays where it reads', () => {
  let place = placeAt(12_000_000, LONG);
  for (let turn = 0; turn < 50; turn += 1) place = follow(place, place.bar + 100, LONG);
  expect(place.top).toBe(12_005_000);
  expect(isAstray(place, LONG)).toBe(true);
  expect(placeAt(place.top, LONG).top).toBe(place.top);
});

test('sees that the bar ran out while the report goes on', () => {
  expect(isStuck({ bar: 0, top: 4000 }, LONG)).toBe(true);
  expect(isStuck({ bar: GREATEST_HEIGHT - 600, top: 23_000_000 }, LONG)).toBe(true);
  expect(isStuck({ bar: 0, top: 0 }, LONG)).toBe(false);
  expect(isStuck(placeAt(24_000_000, LONG), LONG)).toBe(false);
});

test('a report shorter than its window stands still', () => {
  const tiny = { total: 300, view: 600 };
  expect(placeAt(500, tiny)).toEqual({ bar: 0, top: 0 });
  expect(isStuck({ bar: 0, top: 0 }, tiny)).toBe(false);
});
