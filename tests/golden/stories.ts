import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { setupSchema } from '#contracts';
import { checkProgram, type Report } from '#engine';

const PROGRAMS = join(import.meta.dirname, '..', '..', 'fixtures', 'programs');

/** Every folder below fixtures/programs: a program, the setup it is held against, the report it must give. */
export function storyNames(): string[] {
  return readdirSync(PROGRAMS).filter((name) => existsSync(join(PROGRAMS, name, 'program.nc')));
}

export function storyFile(name: string, file: string): string {
  return join(PROGRAMS, name, file);
}

export function checkStory(name: string): Report {
  const setup = setupSchema.parse(JSON.parse(readFileSync(storyFile(name, 'setup.json'), 'utf8')));
  return checkProgram(readFileSync(storyFile(name, 'program.nc')), setup, 'program.nc');
}
