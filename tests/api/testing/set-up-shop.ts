import { readFileSync } from 'node:fs';
import {
  machineDetailsSchema,
  uploadResultSchema,
  type MachineDetails,
  type SetupDocument,
} from '#contracts';
import { expect } from 'vitest';
import type { Client } from './client';

/** The North router of the demo, as its setup file describes it. */
export function northSetup(): SetupDocument {
  const file = new URL('../../../fixtures/machines/north-router.json', import.meta.url);
  return JSON.parse(readFileSync(file, 'utf8')) as SetupDocument;
}

export async function addMachine(lead: Client, name?: string): Promise<MachineDetails> {
  const setup = northSetup();
  const named = name === undefined ? setup : { ...setup, machine: { ...setup.machine, name } };
  const answer = await lead.post('/machines', { setup: named, reason: 'New here' });
  return answer.as(machineDetailsSchema);
}

export const SHORT_PROGRAM =
  '%\nG21 G90 G17\nG53 G0 Z0\nT1 M6\nS12000 M3\nG0 X10 Y10\nM5\nM30\n%\n';

/** Uploads one program and gives the ids it got. */
export async function uploadOne(
  client: Client,
  machineId: string,
  file: { readonly name?: string; readonly content?: string | Buffer } = {},
): Promise<{ programId: string; revisionId: string; checkId: string; revision: number }> {
  const { name = 'door.nc', content = SHORT_PROGRAM } = file;
  const answer = await client.upload(`/programs?machineId=${machineId}`, [{ name, content }]);
  const [outcome] = answer.as(uploadResultSchema).files;
  expect(outcome?.outcome).toBe('stored');
  if (outcome?.outcome !== 'stored') throw new Error('the upload was refused');
  return outcome;
}
