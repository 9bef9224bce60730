import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { scenarioFields } from '../scenario/fields.js';
import { referenceMarkdown } from './reference.js';

it('the written reference is what the schemas say (else: npm run reference -w @noonwell/schema)', () => {
  expect(readFileSync(new URL('../../docs/reference.md', import.meta.url), 'utf8')).toBe(referenceMarkdown());
});

it('lists every field and the summary’s figures with their units', () => {
  const text = referenceMarkdown();
  for (const field of scenarioFields()) expect(text).toContain(`\`${field.path}\``);
  expect(text).toMatch(/`heatDeliveredKwh` \| kWh \|/);
  expect(text).toMatch(/`cellMaxC` \| °C \|/);
});
