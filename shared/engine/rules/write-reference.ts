import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { RULES } from './catalogue';
import { ruleReference } from './reference';

/** `npm run rules:docs`: writes the rule reference beside the rules. */
writeFileSync(fileURLToPath(new URL('README.md', import.meta.url)), ruleReference(RULES));
