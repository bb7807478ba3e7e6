import type { Migration } from './migration';

/** What a finding takes for granted where nothing in the program decides it. */
export const addFindingAssumptions: Migration = {
  name: '20261201-1200-add-finding-assumptions',
  up: ['alter table finding add column assumed json'],
  down: ['alter table finding drop column assumed'],
};
