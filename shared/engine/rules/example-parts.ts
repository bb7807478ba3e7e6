/** Parts of setups that the example programs of several rules need; a plain tool, a plain rack. */

/** A 6 mm end mill in an ISO30 holder, with what is stated changed. */
export function exampleTool(number: number, change: object = {}): object {
  return {
    number,
    name: 'end mill',
    kind: 'end-mill',
    diameter: 6,
    shank: 6,
    stickOut: 40,
    fluteLength: 25,
    gaugeLength: 92,
    holder: { taper: 'ISO30', diameter: 50, above: 72 },
    maxRpm: 24000,
    turns: 'cw',
    ...change,
  };
}

/** Two pockets along the back edge, each loaded with the tool of its number; the first one changed. */
export function exampleRack(change: object): { readonly rack: object; readonly loading: object } {
  const pocket = (number: number) => ({
    number,
    grip: { x: 100 + number * 150, y: 2560, z: -125 },
    opens: '-y',
    largestDiameter: 50,
    longest: 190,
    taper: 'ISO30',
  });
  return {
    rack: { pockets: [{ ...pocket(1), ...change }, pocket(2)] },
    loading: { pockets: [1, 2].map((number) => ({ pocket: number, tool: number })) },
  };
}
