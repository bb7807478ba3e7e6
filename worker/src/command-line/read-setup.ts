import { readFileSync } from 'node:fs';
import { setupSchema, wrongFields, type ValidSetup } from '#contracts';
import { InputRefused } from './input-refused';

/**
 * The setup file, validated.
 * @throws InputRefused naming each wrong path, what was expected and an example.
 */
export function readSetup(path: string): ValidSetup {
  const document = parseDocument(path, readText(path));
  const read = setupSchema.safeParse(document);
  if (read.success) return read.data;
  const fields = wrongFields(read.error.issues, document);
  const lines = fields.map(({ path: field, message }) => `  ${field}: ${message}`);
  throw new InputRefused(
    `The setup ${path} cannot be used; ${fields.length} of its fields are wrong:\n${lines.join('\n')}`,
  );
}

function readText(path: string): string {
  try {
    return readFileSync(path, 'utf8');
  } catch (error) {
    throw new InputRefused(`The setup ${path} cannot be read: ${reasonOf(error)}.`);
  }
}

function parseDocument(path: string, text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (error) {
    throw new InputRefused(`The setup ${path} is not JSON: ${reasonOf(error)}.`);
  }
}

/** What the system says of a file that cannot be opened or parsed, without its own error code in front. */
export function reasonOf(error: unknown): string {
  const message = error instanceof Error ? error.message : String(error);
  return message.replace(/^[A-Z]+: /, '').replace(/, (open|read|stat).*$/, '');
}
