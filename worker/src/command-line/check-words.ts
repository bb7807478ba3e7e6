import { parseArgs } from 'node:util';
import { InputRefused } from './input-refused';
import { reasonOf } from './read-setup';

export interface CheckWords {
  readonly setup: string;
  readonly programs: readonly string[];
  readonly json: boolean;
  readonly unattended: boolean;
  readonly blockDelete: boolean;
}

const USAGE =
  'Write: npm run --silent check -- --setup setup.json [--json] [--unattended] [--block-delete on] PROGRAM…';

/**
 * What was asked for.
 * @throws InputRefused with the usage when the words are off.
 */
export function readCheckWords(words: readonly string[]): CheckWords {
  const { values, positionals } = parseWords(words, USAGE);
  const { setup } = values;
  if (setup === undefined) throw new InputRefused(`No setup is given. ${USAGE}`);
  if (positionals.length === 0) throw new InputRefused(`No program is given. ${USAGE}`);
  return {
    setup,
    programs: positionals,
    json: values.json ?? false,
    unattended: values.unattended ?? false,
    blockDelete: values['block-delete'] !== undefined,
  };
}

/** The words every command takes, refused with its usage where they are off. */
export function parseWords(words: readonly string[], usage: string) {
  const parsed = (() => {
    try {
      return parseArgs({
        args: [...words],
        allowPositionals: true,
        options: {
          setup: { type: 'string' },
          json: { type: 'boolean' },
          unattended: { type: 'boolean' },
          'block-delete': { type: 'string' },
        },
      });
    } catch (error) {
      throw new InputRefused(`${reasonOf(error)}. ${usage}`);
    }
  })();
  const blockDelete = parsed.values['block-delete'];
  if (blockDelete !== undefined && blockDelete !== 'on') {
    throw new InputRefused(`--block-delete takes only "on", not "${blockDelete}". ${usage}`);
  }
  return parsed;
}
