import type { Shop } from '../../shop/shop';
import { Walk } from '../walk';
import { Pace } from './pace';

/**
 * Quiet lines of every sort: each way through reading and carrying them out, through arcs of every quarter,
 * and through motion that is long enough to cruise, too short for it, or too short to slow down.
 */
const LINES = `G10 L2 P1 X100 Y100 Z-50
G21 G90 G17 G54 G94 G64 G0 X0 Y0 Z0
G1 X10 Y10 F3000
N20 G1 X10. Y20.25 Z-1.5 F1200
X11.0125 Y20.5 Z-1.25
X10.5 Y20.125
Y20 F900
X9.75 Y19.5
G1 X9.75 Y19.5 (at rest)
X9.76 F12000
X9.761 Y19.55 F100
X200 Y30 Z-20
N100 G91
N110 G1 X-3.5 Y-1.75 ; step
X3.5 Y1.75
N120 G90
N125
G0 Z5
G0 X20 Y60 Z2
G00 X20 Z20 F2000
X0 Y0
g1 z-3
G2 X10 I5 J0
G3 X0 I-5 J0. F2400
G2 X0 Y10 I0 J5 Z-4
G3 X5 Y5 I0 J-5
G2 X0 Y10 J5
G3 X-10 Y0 J-10
G2 X0 Y0 I10
G3 I7
G2 X-5 Y5 I-5 J0
G3 X0 Y0 I5
(APART)

F500
G0 X1 Y1
G1 X50 F6000
X50.01
Y9
X0 Y0
G2 X0 Y10 I0 J5
G2 X10 Y10 I5 J0
G2 X10 Y0 I0 J-5
G2 X0 Y0 I-5 J0
G3 X0 Y10 I0 J5
G3 X-10 Y10 I-5 J0
G3 X-10 Y0 I0 J-5
G3 X0 Y0 I5 J0
G2 X5 Y5 I5 J0
G2 X10 Y0 I0 J-5
G2 X5 Y-5 I-5 J0
G2 X0 Y0 I0 J5
G3 X5 Y-5 I5 J0
G3 X10 Y0 I0 J5
G3 X5 Y5 I-5 J0
G3 X0 Y0 I0 J-5
`;
const ROUNDS = 3;

/**
 * Has quiet lines carried out that nobody sees. A just-in-time compiler makes code for the ways it has seen
 * taken and throws it away at the first other one; what it has seen here it need not learn from the program
 * bit by bit. Saves about a tenth of the processor time on a mixed program of a million lines, and costs
 * 3 ms (npm run bench).
 */
export function exerciseQuietLines(shop: Shop): void {
  const bytes = Uint8Array.from(LINES, (character) => character.charCodeAt(0));
  const walk = new Walk(shop, [{ pace: new Pace(shop.setup), quiet: () => undefined }], {
    skips: false,
  });
  for (let round = 0; round < ROUNDS; round++) walk.push(bytes);
}
