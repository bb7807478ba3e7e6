import { TestBed } from '@angular/core/testing';
import type { MarkKind } from './mark-kind';
import { MARK_WORDS, markOfCheck } from './mark-kind';
import { SeverityMark } from './severity-mark';

async function draw(inputs: Record<string, unknown>): Promise<HTMLElement> {
  const fixture = TestBed.createComponent(SeverityMark);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('SeverityMark', () => {
  it('gives every kind a shape of its own beside its word', async () => {
    const kinds = Object.keys(MARK_WORDS) as MarkKind[];
    const drawn = await Promise.all(kinds.map((kind) => draw({ kind })));
    const shapes = drawn.map((mark) => mark.querySelector('svg')?.innerHTML);
    expect(new Set(shapes).size).toBe(kinds.length);
    drawn.forEach((mark, index) => {
      expect(mark.textContent.trim()).toBe(MARK_WORDS[kinds[index]!]);
    });
  });
  it('keeps the word for readers where a sentence stands beside it', async () => {
    const mark = await draw({ kind: 'stop', wordUnseen: true });
    expect(mark.querySelector('.unseen')?.textContent).toContain('stop');
  });
  it('counts, nought included', async () => {
    expect((await draw({ kind: 'hold', count: 0 })).textContent).toMatch(/hold\s*0/);
  });
});

describe('markOfCheck', () => {
  it.each([
    ['queued', null, 'waiting', 'waiting'],
    ['running', null, 'waiting', 'checking'],
    ['done', 'stopped', 'stop', 'stopped'],
    ['done', 'held', 'hold', 'held'],
    ['done', 'clear', 'clear', 'clear'],
    ['failed', null, 'failed', 'not finished'],
    ['failed', 'clear', 'failed', 'not finished'],
  ] as const)('marks a %s check with verdict %s as %s', (state, verdict, kind, word) => {
    expect(markOfCheck({ state, verdict })).toEqual({ kind, word });
  });
});
