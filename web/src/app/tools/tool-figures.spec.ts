import { sumHolder } from './holder-sum';
import { judgeJump } from './length-jump';

describe('the holder’s steps against the gauge length', () => {
  const tool = (...lengths: number[]) => ({
    gaugeLength: 92.4,
    stickOut: 40,
    holder: { steps: lengths.map((length) => ({ length, diameter: 50 })) },
  });
  it('agree within half a millimetre', () => {
    expect(sumHolder(tool(12, 40.4))).toMatchObject({ agrees: true });
    expect(sumHolder(tool(12, 40.9))?.agrees).toBe(true);
    expect(sumHolder(tool(12, 41))?.agrees).toBe(false);
  });
  it('agree when none are given, unless the stick-out is longer than the gauge length', () => {
    expect(sumHolder(tool())?.agrees).toBe(true);
    expect(sumHolder({ ...tool(), stickOut: 100 })?.agrees).toBe(false);
  });
  it('say nothing while a figure is missing', () => {
    expect(sumHolder({ ...tool(), gaugeLength: undefined })).toBeNull();
    expect(sumHolder({ ...tool(), holder: { steps: [{}] } })).toBeNull();
    expect(sumHolder(null)).toBeNull();
  });
});

describe('a newly measured length', () => {
  // The thresholds are those of the rule length-offset-disagrees: over 0.05 a look, over 1 mm a stop.
  it('is taken without a word when it repeats the last one', () => {
    expect(judgeJump(92.4, 92.43)).toBe('none');
  });
  it('wants a look beyond what a setter scatters, and a firm one beyond a millimetre', () => {
    expect(judgeJump(92.4, 92.5)).toBe('look');
    expect(judgeJump(92.4, 91.2)).toBe('large');
  });
});
