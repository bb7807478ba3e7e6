/**
 * The program the faults are planted in: what a router post writes for the plain test shop, with its
 * own safety lines, low rapids and retracts. Three tools of eight pockets, drilling, a pocket with arcs
 * and a through cut. It is clear as it stands.
 */
export const CLEAN_PROGRAM = `%
O1001 (CABINET SIDE)
(T3 D=5. CR=0. TAPER=118DEG - ZMIN=-12. - DRILL)
(T2 D=6. CR=0. - ZMIN=-4. - FLAT END MILL)
(T4 D=6. CR=0. - ZMIN=-18.3 - COMPRESSION END MILL)
N10 G90 G94 G17 G21
N15 G40 G49 G80
N20 G53 G0 Z0
(SHELF PINS)
N25 T3 M6
N30 S8000 M3
N35 G54
N40 G0 X100 Y100
N45 G43 Z20 H3
N50 G98 G81 X100 Y100 Z-12 R2 F900
N55 Y132
N60 Y164
N65 G80
N70 G53 G0 Z0
N75 M5
(POCKET)
N80 T2 M6
N85 S18000 M3
N90 G54 G0 X300 Y200
N95 G43 Z20 H2
N100 Z2
N105 G1 Z-4 F1200
N110 G3 X300 Y200 I15 J0 F2400
N115 G0 Z20
N120 G53 G0 Z0
N125 M5
(OUTSIDE)
N130 T4 M6
N135 S18000 M3
N140 G54 G0 X40 Y30
N145 G43 Z20 H4
N150 Z2
N155 G1 Z-18.3 F1000
N160 X600 F4500
N165 G3 X610 Y40 I0 J10
N170 G1 Y400
N175 X40
N180 Y30
N185 G0 Z20
N190 M5
N195 G53 G0 Z0
N200 G91 G28 X0 Y0
N205 G90
N210 M30
%
`;

export const CLEAN_LINES: readonly string[] = CLEAN_PROGRAM.split('\n');

/** Number of the one line that begins so. */
export function lineOf(beginning: string): number {
  const found = CLEAN_LINES.flatMap((line, index) =>
    line === beginning || line.startsWith(`${beginning} `) ? [index + 1] : [],
  );
  if (found.length !== 1) throw new Error(`${found.length} lines begin with “${beginning}”.`);
  return found[0]!;
}
