import { LEDGER_LINES } from '@noonwell/engine';
import { z } from 'zod';
import { scenarioFields, type ScenarioField } from '../scenario/fields.js';
import { RUN_SUMMARY_SHAPE } from '../summary/summary.js';

/** The written reference of scenario and summary, drawn from the schemas and nothing else. */
export function referenceMarkdown(): string {
  return [
    '# Reference: scenario and summary',
    '',
    'Written by `npm run reference -w @noonwell/schema` from the schemas; a test fails when it is out of date.',
    '',
    '## Fields of a scenario',
    '',
    'A scenario is complete: every field is needed, and an unknown one is refused.',
    '',
    '| field | label | unit | range | default | only when | help | source |',
    '| --- | --- | --- | --- | --- | --- | --- | --- |',
    ...scenarioFields()
      .flatMap((field) => [field, ...(field.columns ?? [])])
      .map(fieldRow),
    '',
    '## Figures of a summary',
    '',
    '| key | unit | meaning |',
    '| --- | --- | --- |',
    ...summaryRows(RUN_SUMMARY_SHAPE, ''),
    '',
    '## Lines of the ledger',
    '',
    'All in kWh. Each part balances by itself: what enters minus what leaves and what stays.',
    '',
    '| line | meaning | parts |',
    '| --- | --- | --- |',
    ...LEDGER_LINES.map((line) => row([`\`${line.key}\``, line.label, partsText(line.parts)])),
    '',
  ].join('\n');
}

function row(cells: readonly string[]): string {
  return `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`;
}

function fieldRow(field: ScenarioField): string {
  const range = rangeText(field);
  const when = field.when
    .map(({ path, value }) => `${path.split('.').slice(-2).join('.')} = ${value}`)
    .join(', ');
  const standard = Array.isArray(field.defaultValue)
    ? field.defaultValue.join(' ') || 'none'
    : String(field.defaultValue);
  return row([`\`${field.path}\``, field.label, field.unit, range, standard, when, field.help, field.source]);
}

function rangeText(field: ScenarioField): string {
  switch (field.kind) {
    case 'table':
      return `0 to ${field.mostRows} rows`;
    case 'monthDay':
      return '01-01 to 12-31';
    default:
      return field.choices ? Object.keys(field.choices).join(', ') : `${field.min} to ${field.max}`;
  }
}

function summaryRows(shape: z.ZodObject, path: string): string[] {
  return Object.entries(shape.shape).flatMap(([key, schema]) => {
    const place = path === '' ? key : `${path}.${key}`;
    if (schema instanceof z.ZodObject) return summaryRows(schema, place);
    if (!(schema instanceof z.ZodType)) return [];
    const meta = metaOf(schema);
    return meta ? [row([`\`${place}\``, meta.unit, meta.description])] : [];
  });
}

function metaOf(schema: z.ZodType): { unit: string; description: string } | null {
  const meta =
    schema.meta() ??
    (schema instanceof z.ZodNullable && schema.unwrap() instanceof z.ZodType
      ? z.globalRegistry.get(schema.unwrap())
      : undefined);
  if (!meta?.description) return null;
  return { unit: typeof meta['unit'] === 'string' ? meta['unit'] : '', description: meta.description };
}

function partsText(parts: Readonly<Record<string, string>>): string {
  return Object.entries(parts)
    .map(
      ([part, direction]) =>
        `${direction === 'in' ? 'into' : direction === 'out' ? 'out of' : 'kept in'} ${part}`,
    )
    .join(', ');
}
