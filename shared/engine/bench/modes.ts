import { closeSync, createReadStream, openSync, readFileSync, readSync } from 'node:fs';
import { createRequire } from 'node:module';
import { createInterface } from 'node:readline';
import type { Transform } from 'node:stream';
import { Block } from '../blocks/block';
import { groupTables } from '../blocks/code-groups';
import { parseBlock } from '../blocks/parse-block';
import { startCheck } from '../check';
import { LineWords } from '../lexer/line-words';
import { readLine } from '../lexer/read-line';
import { LineSource } from '../source/line-source';
import type { Setup } from '../shop/setup';
import { startTrace } from '../trace';

export const MODES = [
  'count',
  'readline',
  'lex',
  'blocks',
  'walk',
  'check',
  'stream',
  'parser',
] as const;
export type Mode = (typeof MODES)[number];

/** As the worker reads a file. */
const CHUNK = 256 * 1024;

/** Runs one mode over a file and gives a figure that keeps the work from being optimised away. */
export function runMode(mode: Mode, path: string, setup: Setup): number | Promise<number> {
  if (mode === 'count') return countLines(path);
  if (mode === 'readline') return readByReadline(path);
  if (mode === 'stream') return parseStream(path);
  if (mode === 'parser') return parseWhole(path);
  if (mode === 'lex') return readWords(path, false);
  if (mode === 'blocks') return readWords(path, true);
  return mode === 'walk' ? walk(path, setup) : check(path, setup);
}

function readChunks(path: string, take: (chunk: Uint8Array) => void): void {
  const file = openSync(path, 'r');
  const buffer = Buffer.allocUnsafe(CHUNK);
  for (;;) {
    const length = readSync(file, buffer, 0, CHUNK, null);
    if (length === 0) break;
    take(buffer.subarray(0, length));
  }
  closeSync(file);
}

function countLines(path: string): number {
  let lines = 0;
  readChunks(path, (chunk) => {
    for (let at = chunk.indexOf(10); at >= 0; at = chunk.indexOf(10, at + 1)) lines++;
  });
  return lines;
}

function readWords(path: string, sorts: boolean): number {
  const words = new LineWords();
  const block = new Block(words);
  const dialect = { ...groupTables(false), isStrict: false, increment: 0 };
  let count = 0;
  const source = new LineSource({
    readLines(bytes, at, end) {
      words.bytes = bytes;
      while (at < end) {
        at = readLine(bytes, at, words);
        count += words.count;
        if (sorts) parseBlock(words, block, dialect);
      }
    },
    readOverlong: () => count++,
    readLast(bytes, end) {
      this.readLines(bytes, 0, end);
    },
  });
  readChunks(path, (chunk) => source.push(chunk));
  source.end();
  return count;
}

function walk(path: string, setup: Setup): number {
  let length = 0;
  const observer = { motion: (motion: { length: number }) => void (length += motion.length) };
  const trace = startTrace(setup, undefined, { observers: [observer] });
  readChunks(path, (chunk) => trace.push(chunk));
  trace.endOfText();
  return length;
}

function check(path: string, setup: Setup): number {
  const check = startCheck(setup, { digests: false });
  readChunks(path, (chunk) => check.push(chunk));
  while (check.endOfText() === 'read-again') readChunks(path, (chunk) => check.push(chunk));
  const { findings } = check.report({ name: 'bench.nc', sha256: '' });
  return findings.length;
}

/** Node's own cutting of a file into lines, with nothing done to them. */
function readByReadline(path: string): Promise<number> {
  let lines = 0;
  const reading = createInterface({ input: createReadStream(path), crlfDelay: Infinity });
  reading.on('line', () => lines++);
  return new Promise((done) => reading.on('close', () => done(lines)));
}

interface GcodeParser {
  parseFileSync(path: string): unknown[];
  GCodeLineStream: new () => Transform;
}

const loadParser = () => createRequire(process.argv[1]!)('gcode-parser') as GcodeParser;

/** The public parser's streaming path, its results dropped. */
function parseStream(path: string): Promise<number> {
  let lines = 0;
  const parsing = createReadStream(path).pipe(new (loadParser().GCodeLineStream)());
  parsing.on('data', () => lines++);
  return new Promise((done, fail) => {
    parsing.on('end', () => done(lines));
    parsing.on('error', fail);
  });
}

/** What the public parser takes for merely cutting the same file into words. */
function parseWhole(path: string): number {
  return loadParser().parseFileSync(path).length;
}

/** Read here so that the children need no contract to check it again. */
export const readSetupFile = (path: string): Setup =>
  JSON.parse(readFileSync(path, 'utf8')) as Setup;
