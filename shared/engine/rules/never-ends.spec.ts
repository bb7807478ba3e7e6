import { test } from 'vitest';
import { checkRule } from '../testing/check-rule';
import { neverEnds } from './never-ends';

const MACRO = { controller: { language: 'custom-macro' } };

test('finds loops in which nothing changes', () => {
  checkRule(
    neverEnds,
    MACRO,
    `
WHILE [1 EQ 1] DO1
^^^^^^^^^^^^^^^^^^ never-ends: Nothing in the loop of “WHILE [1 EQ 1] DO1” changes what could end it.
G0 X1
END1
M30
`,
  );
  checkRule(
    neverEnds,
    MACRO,
    `
N10 G0 X1
N20 GOTO 10
^^^^^^^^^^^ never-ends: Nothing in the loop of “N20 GOTO 10” changes what could end it.
M30
`,
  );
  checkRule(
    neverEnds,
    {},
    `
#1=0
o1 do
^^^^^ never-ends
G0 X#1
o1 while [#1 LT 5]
M2
`,
  );
});

test('finds a loop whose own counter stands still, whatever turns within it', () => {
  checkRule(
    neverEnds,
    {},
    `
#1=0
o1 while [#1 LT 3]
^^^^^^^^^^^^^^^^^^ never-ends
#2=0
o2 while [#2 LT 3]
#2=[#2+1]
o2 endwhile
o1 endwhile
M2
`,
  );
});

test('finds a return that leads back in front of its call', () => {
  checkRule(
    neverEnds,
    MACRO,
    `
N10 G0 X1
M98 P5
^^^^^^ never-ends
M30
O5
M99 P10
`,
  );
});

test('finds a loop that counts for ever', () => {
  checkRule(
    neverEnds,
    {},
    `
#1=1
o1 while [#1 GT 0]
^^^^^^^^^^^^^^^^^^ never-ends: The loop of “o1 while [#1 GT 0]” has not ended after 300,000 turns.
#1=[#1+1]
o1 endwhile
M2
`,
  );
});

test('finds more repeated blocks than any program has', () => {
  checkRule(
    neverEnds,
    {},
    `
o1 repeat [3000]
^^^^^^^^^^^^^^^^ never-ends: The program is still going on at “o1 repeat [3000]” after 2,000,000 repeated blocks.
o2 repeat [3000]
G4 P0
o2 endrepeat
o1 endrepeat
M2
`,
  );
});

test('stays silent where a loop ends, and at the M99 of a main program', () => {
  checkRule(neverEnds, {}, '#1=0\no1 while [#1 LT 5000]\n#1=[#1+1]\no1 endwhile\nM2\n');
  checkRule(neverEnds, {}, 'o1 repeat [5000]\nG91 G0 X0.001\no1 endrepeat\nM2\n');
  checkRule(neverEnds, {}, 'G0 X1\nM99\n');
  checkRule(neverEnds, MACRO, '#1=0\nN10 #1=#1+1\nIF [#1 LT 2000] GOTO 10\nM99 P10\n');
});

test('stays silent where an input ends the loop, whenever it comes', () => {
  const waits = {
    controller: {
      codes: [
        {
          code: 'M66',
          does: 'wait-input',
          input: 'holder-clamped',
          when: 1,
          into: '#5399',
          timeout: -1,
        },
      ],
    },
  };
  checkRule(neverEnds, waits, 'M66\no1 while [#5399 NE 1]\nG4 P1\nM66\no1 endwhile\nM2\n');
  checkRule(
    neverEnds,
    waits,
    'o1 while [1]\nM66\no2 if [#5399 EQ 1]\no1 break\no2 endif\nG4 P1\no1 endwhile\nM2\n',
  );
});

test('finds a loop whose unknown value ends nothing', () => {
  checkRule(
    neverEnds,
    MACRO,
    `
WHILE [1 EQ 1] DO1
^^^^^^^^^^^^^^^^^^ never-ends
IF [#500 EQ 1] THEN #101=5
G4 P1
END1
M30
`,
  );
});
