import {
  defaultVariant,
  scenarioField,
  scenarioFields,
  type Scenario,
  type ScenarioField,
} from '@noonwell/schema';

/** A branch of the document while it is edited: numbers are the text that was typed. */
export type DraftValue = string | DraftValue[] | { [key: string]: DraftValue };
export type Draft = Record<string, DraftValue>;

const NUMERIC: ReadonlySet<ScenarioField['kind'] | undefined> = new Set<ScenarioField['kind']>([
  'number',
  'integer',
  'numberChoice',
]);

/** The document as text, ready for the form. */
export function toDraft(document: Scenario): Draft {
  const draft = textOf(document);
  if (typeof draft === 'string' || Array.isArray(draft)) throw new TypeError('a scenario is an object');
  return draft;
}

/** A variant's defaults as text: what a choice is switched to. */
export function variantDraft(path: string, variant: string): DraftValue {
  return textOf(defaultVariant(path, variant));
}

function textOf(value: unknown): DraftValue {
  if (Array.isArray(value)) return value.map(textOf);
  if (typeof value === 'object' && value !== null) {
    return Object.fromEntries(Object.entries(value).map(([key, child]) => [key, textOf(child)]));
  }
  return String(value);
}

/**
 * The typed text as a document for the schema to judge: text where a number belongs becomes that number, and
 * stays text where it is none, so that the schema names the field and the unit.
 */
export function fromDraft(draft: unknown): unknown {
  return valueAt(draft, []);
}

function valueAt(value: unknown, path: readonly string[]): unknown {
  if (Array.isArray(value)) return value.map((child, index) => valueAt(child, [...path, String(index)]));
  if (typeof value === 'object' && value !== null) {
    return Object.fromEntries(
      Object.entries(value).map(([key, child]) => [key, valueAt(child, [...path, key])]),
    );
  }
  return typeof value === 'string' && isNumeric(path) ? parseNumber(value) : value;
}

function isNumeric(path: readonly string[]): boolean {
  const joined = path.join('.');
  // Format version is the document's own and no field of the form; entries of a list stand one key below it.
  return (
    joined === 'formatVersion' ||
    NUMERIC.has(scenarioField(joined)?.kind) ||
    scenarioField(path.slice(0, -1).join('.'))?.kind === 'numberList'
  );
}

/** A number as people type it ("0.6", "1e-3", a true minus sign, spaces between thousands); anything else stays text. */
export function parseNumber(text: string): number | string {
  const plain = text.replaceAll(/[\s\u00a0\u202f]/gu, '').replaceAll('\u2212', '-');
  return /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i.test(plain) ? Number(plain) : text;
}

/** Numbers out of a spreadsheet's cells or a line of text: one entry a cell. */
export function pastedNumbers(text: string): string[] {
  return text
    .trim()
    .split(/[\s,;]+/)
    .filter((entry) => entry !== '');
}

/** The value of a choice by its path, for the conditions of other fields. */
export function draftText(draft: DraftValue | undefined, path: string): string | undefined {
  let at: DraftValue | undefined = draft;
  for (const key of path.split('.')) {
    if (at === undefined || typeof at === 'string') return undefined;
    at = Array.isArray(at) ? at[Number(key)] : at[key];
  }
  return typeof at === 'string' ? at : undefined;
}

/** Whether a field's variant is the chosen one. @param chosen value of a choice by its path */
export function isShown(
  field: Pick<ScenarioField, 'when'>,
  chosen: (path: string) => string | undefined,
): boolean {
  return field.when.every(({ path, value }) => chosen(path) === value);
}

/** Choices that other fields depend on. */
export const DECIDING_PATHS: readonly string[] = [
  ...new Set(scenarioFields().flatMap(({ when }) => when.map(({ path }) => path))),
];
