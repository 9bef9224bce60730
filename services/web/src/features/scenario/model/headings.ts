import type { ScenarioField } from '@noonwell/schema';

interface HeadingDefinition {
  readonly key: string;
  readonly label: string;
  readonly purpose: string;
  /** Branches of the scenario document that stand under it. */
  readonly branches: readonly string[];
}

/** The five headings of the editor. A heading without a field is not shown until the schema gives it one. */
export const HEADINGS = [
  {
    key: 'place',
    label: 'Place',
    purpose: 'Weather year, what stands around the dish, and how finely the year is worked through',
    branches: ['place', 'simulation'],
  },
  { key: 'catch', label: 'Catch', purpose: 'Dish, tracker and receiver', branches: ['catch'] },
  {
    key: 'carryAndKeep',
    label: 'Carry and keep',
    purpose: 'Pump, pipe and tank',
    branches: ['carryAndKeep'],
  },
  { key: 'use', label: 'Use', purpose: 'Who uses heat and electricity, and the backup', branches: ['use'] },
  { key: 'worth', label: 'Worth', purpose: 'Costs and tariffs', branches: ['worth'] },
] as const satisfies readonly HeadingDefinition[];
export type HeadingKey = (typeof HEADINGS)[number]['key'];

export interface FieldGroup {
  /** Where the group stands in the document: "catch.dish", "use.loads.0". */
  readonly path: string;
  readonly label: string;
  readonly fields: readonly ScenarioField[];
}

export interface Heading {
  readonly key: HeadingKey;
  readonly label: string;
  readonly purpose: string;
  readonly groups: readonly FieldGroup[];
}

/** Fields in the schema's order under their headings, by the part of the machine they belong to. */
export function headingsOf(fields: readonly ScenarioField[]): Heading[] {
  return HEADINGS.map(({ key, label, purpose, branches }) => ({
    key,
    label,
    purpose,
    groups: groupsOf(fields.filter(({ path }) => (branches as readonly string[]).includes(branchOf(path)))),
  })).filter(({ groups }) => groups.length > 0);
}

/** Heading under which a field stands, for links from the list of errors. */
export function headingOf(path: string): HeadingKey {
  const branch = branchOf(path);
  return HEADINGS.find(({ branches }) => (branches as readonly string[]).includes(branch))?.key ?? 'place';
}

function branchOf(path: string): string {
  return path.split('.')[0] ?? '';
}

function groupsOf(fields: readonly ScenarioField[]): FieldGroup[] {
  const groups = new Map<string, ScenarioField[]>();
  for (const field of fields) {
    const path = groupPath(field.path);
    groups.set(path, [...(groups.get(path) ?? []), field]);
  }
  return [...groups].map(([path, members]) => ({ path, label: groupLabel(path), fields: members }));
}

/** The branch and the part below it, with the position where the part is a list. */
function groupPath(path: string): string {
  const [branch = '', part = '', position = ''] = path.split('.');
  if (branch === 'simulation') return branch;
  return /^\d+$/.test(position) ? `${branch}.${part}.${position}` : `${branch}.${part}`;
}

/** "chargeInlet" → "Charge inlet": the document's own words. */
function groupLabel(path: string): string {
  const word = path.split('.').findLast((key) => !/^\d+$/.test(key)) ?? path;
  const spaced = word.replaceAll(/[A-Z]/g, (capital) => ` ${capital.toLowerCase()}`);
  return spaced.charAt(0).toUpperCase() + spaced.slice(1);
}
