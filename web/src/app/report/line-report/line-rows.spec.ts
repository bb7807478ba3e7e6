import type { FindingSpan, Segment } from './line-rows';
import { grouped, layRows, openingOf, wordFold } from './line-rows';

function at(line: number, more: Partial<FindingSpan> = {}): FindingSpan {
  return { id: `f${line}`, severity: 'stop', line, endLine: line, count: 1, ...more };
}
function lay(
  lines: number,
  findings: FindingSpan[],
  more: Partial<Parameters<typeof layRows>[0]> = {},
) {
  return layRows({ lines, findings, leftOut: [], opened: [], ...more });
}
/** Segments as short text: `1-3`, `~4-99` quiet, `=5-9` repeat, `!0@4` finding 0 at line 4. */
function short(segments: readonly Segment[]): string {
  const words = segments.map((segment) => {
    if (segment.kind === 'finding') return `!${segment.index}@${segment.line}`;
    const sign = { lines: '', quiet: '~', repeat: '=' }[segment.kind];
    return `${sign}${segment.from}-${segment.to}`;
  });
  return words.join(' ');
}
/** Whether every line stands exactly once, in order, and every finding below its line. */
function faults(segments: readonly Segment[], lines: number, findings: readonly FindingSpan[]) {
  const wrong: string[] = [];
  let line = 0;
  let index = 0;
  for (const segment of segments) {
    if (segment.kind === 'finding') {
      if (segment.index !== index) wrong.push(`finding ${segment.index} instead of ${index}`);
      if (segment.line !== line) wrong.push(`finding ${index} stands below line ${line}`);
      index += 1;
    } else {
      if (segment.from !== line + 1) wrong.push(`line ${segment.from} follows ${line}`);
      line = segment.to;
    }
  }
  if (line !== lines) wrong.push(`ends at ${line} of ${lines}`);
  if (index !== findings.length) wrong.push(`${index} of ${findings.length} findings`);
  return wrong;
}

describe('folding', () => {
  test('a program without findings shows its head and its last line', () => {
    expect(short(lay(500, []))).toBe('1-3 ~4-499 500-500');
  });

  test('each finding stands below its line, with a line around it', () => {
    expect(short(lay(500, [at(4), at(412)]))).toBe(
      '1-4 !0@4 5-5 ~6-410 411-412 !1@412 413-413 ~414-499 500-500',
    );
  });

  test('a finding on the first and one on the last line', () => {
    expect(short(lay(500, [at(1), at(500)]))).toBe('1-1 !0@1 2-3 ~4-498 499-500 !1@500');
  });

  test('several findings of one line stand in their order', () => {
    expect(short(lay(50, [at(20), at(20, { severity: 'note' })]))).toBe(
      '1-3 ~4-18 19-20 !0@20 !1@20 21-21 ~22-49 50-50',
    );
  });

  test('a gap of two lines is shown, not folded', () => {
    expect(short(lay(50, [at(7), at(12)]))).toBe('1-7 !0@7 8-12 !1@12 13-13 ~14-49 50-50');
  });

  test('a program of one line', () => {
    expect(short(lay(1, [at(1)]))).toBe('1-1 !0@1');
  });

  test('an empty program still shows what was found', () => {
    expect(short(lay(0, [at(1)]))).toBe('1-1 !0@1');
  });

  test('a finding past the end stands on the last line rather than nowhere', () => {
    expect(short(lay(10, [at(99)]))).toBe('1-3 ~4-9 10-10 !0@10');
  });
});

describe('repeats', () => {
  const episode = at(412, { endLine: 430, count: 9 });

  test('lines over which a finding goes on are folded as its repeat', () => {
    const segments = lay(1000, [episode]);
    expect(short(segments)).toBe('1-3 ~4-410 411-412 !0@412 413-413 =414-430 ~431-999 1000-1000');
    expect(segments.find((each) => each.kind === 'repeat')).toMatchObject({
      severity: 'stop',
      findings: [0],
      more: 8,
    });
  });

  test('a finding inside the stretch of another splits it; the count is told once', () => {
    const segments = lay(1000, [
      at(100, { endLine: 300, count: 50 }),
      at(200, { severity: 'note' }),
    ]);
    expect(short(segments)).toBe(
      '1-3 ~4-98 99-100 !0@100 101-101 =102-198 199-200 !1@200 201-201 =202-300 ~301-999 1000-1000',
    );
    const folds = segments.filter((each) => each.kind === 'repeat');
    expect(folds.map(wordFold)).toEqual(['same finding, 49 more blocks', 'same finding goes on']);
  });

  test('overlapping findings: the graver colour, the longer stretch, and how many go on', () => {
    const segments = lay(1000, [
      at(100, { endLine: 300, count: 50, severity: 'note' }),
      at(101, { endLine: 200, count: 4, severity: 'hold' }),
    ]);
    const folds = segments.filter((each) => each.kind === 'repeat');
    expect(folds).toMatchObject([{ from: 103, to: 300, severity: 'hold', findings: [0, 1] }]);
    expect(folds.map(wordFold)).toEqual(['2 findings go on']);
  });

  test('a finding of one block has no repeat, wherever its end is said to be', () => {
    expect(short(lay(50, [at(10, { endLine: 30, count: 1 })]))).not.toContain('=');
  });

  test('a repeat to the last line leaves no quiet stretch behind', () => {
    expect(short(lay(100, [at(10, { endLine: 100, count: 40 })]))).toBe(
      '1-3 ~4-8 9-10 !0@10 11-11 =12-99 100-100',
    );
  });

  test('a rest of one or two lines joins the repeat', () => {
    expect(short(lay(100, [at(10, { endLine: 97, count: 40 })]))).toContain('=12-99');
  });
});

describe('unfolding', () => {
  test('what was opened is shown and the rest stays folded', () => {
    expect(short(lay(500, [], { opened: [{ from: 100, to: 119 }] }))).toBe(
      '1-3 ~4-99 100-119 ~120-499 500-500',
    );
  });

  test('everything opened is one stretch of lines', () => {
    expect(short(lay(500, [], { opened: [{ from: 4, to: 499 }] }))).toBe('1-500');
  });

  test('opens more with each press, from the top or from the bottom', () => {
    const fold = { from: 1001, to: 9000 };
    expect(openingOf(fold, 0, 'top')).toEqual({ from: 1001, to: 1020 });
    expect(openingOf(fold, 0, 'bottom')).toEqual({ from: 8981, to: 9000 });
    expect(openingOf(fold, 1, 'top')).toEqual({ from: 1001, to: 1200 });
    expect(openingOf(fold, 2, 'top')).toEqual({ from: 1001, to: 3000 });
    expect(openingOf(fold, 3, 'top')).toEqual(fold);
  });

  test('never leaves a sliver that could not be folded', () => {
    expect(openingOf({ from: 1, to: 22 }, 0, 'top')).toEqual({ from: 1, to: 22 });
  });
});

describe('the filter', () => {
  test('a stretch that hides findings is not called quiet', () => {
    const segments = lay(500, [at(412)], { leftOut: [20, 30, 450] });
    const folds = segments.filter((each) => each.kind === 'quiet');
    expect(folds.map(wordFold)).toEqual([
      '407 lines, 2 findings not shown',
      '86 lines, 1 finding not shown',
    ]);
  });
});

describe('large programs', () => {
  test('a million lines and 5,000 findings: every line once, every finding in its place', () => {
    const findings: FindingSpan[] = [];
    let seed = 7;
    const random = (below: number): number => {
      // A linear congruential generator (mem: constants as commonly printed) keeps the test the same.
      seed = (seed * 1664525 + 1013904223) % 4294967296;
      return Math.floor((seed / 4294967296) * below);
    };
    for (let count = 0; count < 5000; count += 1) {
      const line = 1 + random(1_000_000);
      const length = random(3) === 0 ? random(20_000) : 0;
      findings.push(
        at(line, {
          endLine: Math.min(1_000_000, line + length),
          count: length > 0 ? 2 + random(50) : 1,
        }),
      );
    }
    findings.sort((a, b) => a.line - b.line);
    const segments = lay(1_000_000, findings);
    expect(faults(segments, 1_000_000, findings)).toEqual([]);
    expect(segments.length).toBeLessThan(5000 * 5);
    const opened = [{ from: 1, to: 1_000_000 }];
    expect(faults(lay(1_000_000, findings, { opened }), 1_000_000, findings)).toEqual([]);
  });

  test('random small programs: every line once, every finding in its place', () => {
    let seed = 3;
    const random = (below: number): number => {
      seed = (seed * 1664525 + 1013904223) % 4294967296;
      return Math.floor((seed / 4294967296) * below);
    };
    for (let round = 0; round < 400; round += 1) {
      const lines = 1 + random(60);
      const findings = Array.from({ length: random(6) }, () => {
        const line = 1 + random(lines);
        const endLine = Math.min(lines, line + random(20));
        return at(line, { endLine, count: endLine > line ? 1 + random(4) : 1 });
      }).sort((a, b) => a.line - b.line);
      const opened = Array.from({ length: random(3) }, () => {
        const from = 1 + random(lines);
        return { from, to: from + random(15) };
      });
      expect(faults(lay(lines, findings, { opened }), lines, findings)).toEqual([]);
    }
  });
});

test('counts are written in groups of three', () => {
  expect([7, 405, 9381, 58025, 1000000].map(grouped)).toEqual([
    '7',
    '405',
    '9\u202f381',
    '58\u202f025',
    '1\u202f000\u202f000',
  ]);
});
