import { expect, test } from 'vitest';
import { programName } from './program-name';

test.each([
  ['door.nc', 'door.nc'],
  ['../../etc/passwd', 'passwd'],
  ['C:\\posted\\door panel.nc', 'door panel.nc'],
  ['  door.nc  ', 'door.nc'],
  ['plâque ø.nc', 'plâque ø.nc'],
  ['door\u0000\u202e\n.nc', 'door.nc'],
  ['..\\..\\', 'unnamed'],
  ['', 'unnamed'],
  ['é'.repeat(300), 'é'.repeat(200)],
])('calls a file sent as %j %j', (sent, called) => {
  expect(programName(sent)).toBe(called);
});
