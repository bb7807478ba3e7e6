/** A small generator of its own, so that a fuzz case is named by its number alone. */
export function randomNumbers(seed: number): (below: number) => number {
  let state = (seed ^ 0x9e3779b9) >>> 0;
  return (below) => {
    state = (Math.imul(state ^ (state >>> 15), 0x2c1b3c6d) + 0x6d2b79f5) >>> 0;
    return Math.floor(((state ^ (state >>> 13)) >>> 0) / (2 ** 32 / below)) % below;
  };
}

// prettier-ignore
const PIECES = [
  'G', 'M', 'X', '#', '[', ']', '(', ')', ';', '%', '/', '\n', '\r', 'O', '<', '>', '*', '-', '.', '=', ',',
  'G81', 'G28', 'G53', 'G92 X0', 'G10 L2 P1', 'M98 P1', 'G65 P9', 'WHILE[1 EQ 1]DO1', 'END1', 'GOTO10',
  'o1 while [1]', 'G2 I1', 'R1', 'L9999999', 'Q0.0000001', '1e300', '99999999999999999999', 'T99', 'M6',
  'M30', 'G41 D1', 'G20', 'G91', '\u0000', '\u00ff', 'Z-', 'F0', 'S-1', 'P.', 'N', ':', '\t', 'G43', 'H1',
  'G93', 'G18', 'G19', 'K1', 'A90', 'B5', 'G5', 'G33', 'G68 X0 Y0 R45', 'IF[#1GT3]GOTO5', 'G100', 'M99',
] as const;

/** A program with a few of its bytes changed, moved, doubled, cut or spiced. */
export function mutate(program: Uint8Array, seed: number): Uint8Array {
  const random = randomNumbers(seed);
  let bytes = Array.from(program);
  const changes = 1 + random(12);
  for (let change = 0; change < changes; change++) {
    const at = random(bytes.length + 1);
    const length = random(30);
    switch (random(6)) {
      case 0:
        bytes[Math.min(at, bytes.length - 1)] = random(256);
        break;
      case 1:
        bytes.splice(at, length);
        break;
      case 2:
        bytes.splice(at, 0, ...bytes.slice(at, at + length));
        break;
      case 3:
        bytes.splice(at, 0, ...new TextEncoder().encode(PIECES[random(PIECES.length)]!));
        break;
      case 4: {
        const moved = bytes.splice(at, length);
        bytes.splice(random(bytes.length + 1), 0, ...moved);
        break;
      }
      default:
        if (random(8) === 0) bytes = bytes.slice(0, at);
    }
    if (bytes.length === 0) bytes = [10];
  }
  return Uint8Array.from(bytes);
}
