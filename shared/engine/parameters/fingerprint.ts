import { isBounds, type Value } from '../expressions/value';
import type { ParameterKey } from './parameter-name';

/** Odd constants with well-mixed bits, as hash functions use them. */
const SPREAD = 0x9e3779b1;
const MIX = 0x85ebca6b;
const NULL_MARK = 0x27d4eb2f;

/**
 * A number of 32 bits that stands for all that is stored: each value adds its own, so that storing one and
 * putting the old one back comes out the same. Loops that change nothing are known by it.
 */
export class Fingerprint {
  private readonly double = new Float64Array(1);
  private readonly halves = new Uint32Array(this.double.buffer);

  of(key: ParameterKey, value: Value | undefined): number {
    if (value === undefined) return 0;
    let hash = typeof key === 'number' ? Math.imul(key, SPREAD) : this.ofText(key);
    if (value === null) hash ^= NULL_MARK;
    else if (isBounds(value)) hash = this.mix(this.mix(hash, value.least), value.greatest);
    else hash = this.mix(hash, value);
    hash = Math.imul(hash ^ (hash >>> 15), MIX);
    return hash ^ (hash >>> 13);
  }

  private mix(hash: number, value: number): number {
    this.double[0] = value;
    hash = Math.imul(hash ^ this.halves[0]!, MIX);
    return Math.imul((hash ^ (hash >>> 16)) + this.halves[1]!, SPREAD);
  }

  private ofText(text: string): number {
    let hash = MIX;
    for (let at = 0; at < text.length; at++) hash = Math.imul(hash ^ text.charCodeAt(at), SPREAD);
    return hash;
  }
}
