import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { languageReference } from './reference';

/** `npm run language:docs`: writes the language reference beside its tables. */
writeFileSync(fileURLToPath(new URL('README.md', import.meta.url)), languageReference());
