import { startTrace } from '#engine';
import { parseWords } from './check-words';
import { InputRefused, runCommand } from './input-refused';
import { readProgram } from './read-program';
import { readSetup } from './read-setup';

/** `npm run --silent trace`: every motion of one program, one JSON line each. */
const USAGE = 'Write: npm run --silent trace -- --setup setup.json [--block-delete on] PROGRAM';
/** Lines are written together: one write a motion would cost more than the walk. */
const WRITE_AT = 64 * 1024;

runCommand((words) => {
  const { values, positionals } = parseWords(words, USAGE);
  const [program, ...more] = positionals;
  if (values.setup === undefined) throw new InputRefused(`No setup is given. ${USAGE}`);
  if (program === undefined || more.length > 0) {
    throw new InputRefused(`Give exactly one program. ${USAGE}`);
  }
  let waiting = '';
  const flush = () => {
    process.stdout.write(waiting);
    waiting = '';
  };
  const trace = startTrace(
    readSetup(values.setup),
    (motion) => {
      waiting += `${JSON.stringify(motion)}\n`;
      if (waiting.length >= WRITE_AT) flush();
    },
    { blockDelete: values['block-delete'] === undefined ? undefined : 'on' },
  );
  do readProgram(program, (bytes) => trace.push(bytes));
  while (trace.endOfText() === 'read-again');
  flush();
  return 0;
});
