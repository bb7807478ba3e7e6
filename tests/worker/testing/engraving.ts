/** A program of about this many lines, always the same: a wandering engraving with some faults in it. */
export function engraving(lines: number): string {
  const text = ['%', 'G21 G90 G17 G40 G49 G80', 'G54', 'T4 M6', 'S18000 M3', 'G0 G43 H4 Z30'];
  text.push('G0 X20 Y20', 'G1 Z-1 F1200');
  for (let line = 0; line < lines; line += 1) {
    const x = 20 + ((line * 37) % 4000) / 10;
    const y = 20 + Math.floor(line / 100) / 10;
    text.push(`G1 X${x.toFixed(3)} Y${y.toFixed(3)}`);
    // A code that no setup of these tests declares, and a tool that no pocket holds.
    if (line % 5000 === 4999) text.push('M77');
  }
  text.push('G0 Z30', 'T91 M6', 'M5', 'M30', '%', '');
  return text.join('\n');
}
