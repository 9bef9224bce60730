import { writeFileSync } from 'node:fs';
import { referenceMarkdown } from '../src/reference/reference.ts';

writeFileSync(new URL('../docs/reference.md', import.meta.url), referenceMarkdown());
