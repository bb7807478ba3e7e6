import type { StoredFinding } from '#contracts';
import { markOnPlan } from './plan-mark';
import type { ShownFinding } from './shown-finding';

function shown(data: StoredFinding['data']): ShownFinding {
  const finding = { rule: 'beyond-travel', worstLine: 1415, data } as unknown as StoredFinding;
  return { severity: 'stop', tool: 4, finding } as ShownFinding;
}

test('a travel finding is marked at its coordinate, with how far past it goes', () => {
  const data = { axis: 'x', by: 34.2, at: 1304.2, limit: 1270 };
  expect(markOnPlan(shown(data), 'mm')).toEqual({
    line: 1415,
    severity: 'stop',
    tool: 4,
    words: '34.2 mm past travel',
    axis: 'x',
    at: 1304.2,
  });
  expect(markOnPlan(shown(data), 'inch').words).toBe('1.346 in past travel');
});

test('what is below or above cannot be placed by its height: only its line is named', () => {
  const mark = markOnPlan(shown({ axis: 'z', by: 3, at: -223, limit: -220 }), 'mm');
  expect(mark).toEqual({ line: 1415, severity: 'stop', tool: 4, words: 'line 1\u202f415' });
});
