import { readFileSync } from 'node:fs';

/** One worked example of the language sheet; lengths of the setup are in the row's own units. */
export interface Row {
  readonly id: string;
  readonly covers: string;
  readonly source: string;
  readonly dialect: 'ngc' | 'macro-b' | 'o-word' | 'router';
  readonly program: string;
  readonly note?: string;
  readonly setup: {
    readonly units: 'mm' | 'inch';
    readonly paramUnits?: 'inch';
    readonly toolTable: readonly {
      readonly pocket: number;
      readonly id: number;
      readonly length: number;
      readonly diameter: number;
    }[];
    readonly wcs: Readonly<Record<string, { x: number; y: number; z: number }>>;
    readonly params: Readonly<Record<string, number>>;
    readonly blockDelete: boolean;
    readonly toolInSpindle: number;
    readonly rotary?: boolean;
    readonly dialectFlags?: Readonly<Record<string, unknown>>;
  };
  readonly expected: {
    readonly motions?: readonly RowMotion[];
    readonly extents?: Readonly<Record<'x' | 'y' | 'z', readonly [number, number]>>;
    readonly events?: readonly RowEvent[];
    readonly final?: { readonly end: RowPoint; readonly toolLengthOffset: number };
    readonly params?: Readonly<Record<string, number>>;
    readonly error?: {
      readonly line: number;
      readonly refCode: number;
      readonly violates: string;
    };
  };
}
export interface RowPoint {
  readonly x: number;
  readonly y: number;
  readonly z: number;
}
export interface RowMotion {
  /** Absent where the figures come from a hand-expanded program with other line numbers. */
  readonly line?: number;
  readonly kind: 'rapid' | 'feed' | 'arc' | 'probe';
  readonly end: RowPoint;
  readonly prog: RowPoint;
  readonly progUnits?: 'inch';
  readonly abc?: { readonly a: number };
  /** Units of the program a minute. */
  readonly feed?: number;
  readonly plane?: 'XY' | 'XZ' | 'YZ';
  readonly dir?: 'cw' | 'ccw';
  readonly radius?: number;
  readonly sweepDeg?: number;
  readonly center?: Readonly<Partial<Record<'x' | 'y' | 'z', number>>>;
  readonly extent?: Readonly<Partial<Record<'x' | 'y' | 'z', readonly [number, number]>>>;
}
export interface RowEvent {
  readonly line?: number;
  readonly ev: string;
  readonly dir?: 'cw' | 'ccw' | 'stop';
  readonly s?: number;
  readonly slot?: number;
  readonly text?: string;
  readonly rpm?: number;
  readonly on?: boolean;
  readonly len?: number;
}

const FILE = new URL('../../fixtures/standards/worked-examples.json', import.meta.url);

export function readRows(): readonly Row[] {
  const { examples } = JSON.parse(readFileSync(FILE, 'utf8')) as { examples: readonly Row[] };
  return examples;
}
