import { createReadStream } from 'node:fs';
import { join } from 'node:path';
import type { DemoProgram } from '../../../fixtures/demo';

/** Lines joined before they are handed on: fewer, larger pieces are stored several times faster. */
const LINES_AT_ONCE = 2000;

/** The bytes of a demo program: its story's file, or what its generator says. */
export function programText(
  { name, story, lines }: DemoProgram,
  storiesFolder: string,
): AsyncIterable<Uint8Array> {
  if (lines) return generated(lines());
  if (story) return createReadStream(join(storiesFolder, story, 'program.nc'));
  throw new Error(`The demo program ${name} has neither a story nor a generator.`);
}

async function* generated(lines: Iterable<string>): AsyncGenerator<Uint8Array> {
  let held: string[] = [];
  for (const line of lines) {
    held.push(line);
    if (held.length < LINES_AT_ONCE) continue;
    yield Buffer.from(`${held.join('\n')}\n`);
    held = [];
  }
  if (0 < held.length) yield Buffer.from(`${held.join('\n')}\n`);
}
