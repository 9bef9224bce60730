import { z } from 'zod';
import { fieldRegistry, type FieldMeta } from '../field.js';
import { scenarioShape } from './scenario.js';

/** One field of a scenario with its place: the form draws itself from these, and so does the reference. */
export interface ScenarioField extends FieldMeta {
  /** Keys joined by dots: "catch.dish.apertureDiameterM", "use.loads.0.setPointC". */
  readonly path: string;
  readonly kind: 'number' | 'integer' | 'numberList' | 'choice' | 'numberChoice' | 'table' | 'monthDay';
  /** For a list of numbers. */
  readonly length?: number;
  /** Of a table, in the order of its columns; their paths stand in its first row. */
  readonly columns?: readonly ScenarioField[];
  /** Shown only while each of these choices has the value given. */
  readonly when: readonly { readonly path: string; readonly value: string }[];
}

/** All fields of a scenario in the order of the form, each variant's fields after its choice. */
export function scenarioFields(): readonly ScenarioField[] {
  return ALL_FIELDS;
}

/** A field, or a column of a table, by its path in any row. */
export function scenarioField(path: string): ScenarioField | undefined {
  return BY_PATH.get(path.replace(/\.\d+\./g, '.0.'));
}

const ALL_FIELDS: readonly ScenarioField[] = collect(scenarioShape, '', []);
/** Variants share paths; the first one that has a field speaks for it. */
const BY_PATH = new Map(
  ALL_FIELDS.flatMap((field) => [field, ...(field.columns ?? [])])
    .map((field) => [field.path, field] as const)
    .toReversed(),
);

function collect(schema: z.core.$ZodType, path: string, when: ScenarioField['when']): ScenarioField[] {
  const meta = fieldRegistry.get(schema);
  if (schema instanceof z.ZodDiscriminatedUnion) {
    const discriminator = `${path}.${schema.def.discriminator}`;
    const choice: ScenarioField[] = meta ? [{ ...meta, path: discriminator, kind: 'choice', when }] : [];
    const variants = schema.options.flatMap((option) => {
      if (!(option instanceof z.ZodObject)) return [];
      return collect(option, path, [
        ...when,
        { path: discriminator, value: variantName(option, schema.def.discriminator) },
      ]);
    });
    return [...choice, ...variants];
  }
  if (schema instanceof z.ZodObject) {
    return Object.entries<z.core.$ZodType>(schema.shape).flatMap(([key, child]) =>
      collect(child, path === '' ? key : `${path}.${key}`, when),
    );
  }
  if (schema instanceof z.ZodArray && !meta) return collect(schema.element, `${path}.0`, when);
  if (!meta) return [];
  if (schema instanceof z.ZodArray && schema.element instanceof z.ZodObject)
    return [{ ...meta, path, kind: 'table', columns: collect(schema.element, `${path}.0`, when), when }];
  if (schema instanceof z.ZodArray)
    return [{ ...meta, path, kind: 'numberList', length: listLength(meta), when }];
  if (schema instanceof z.ZodString) return [{ ...meta, path, kind: 'monthDay', when }];
  if (schema instanceof z.ZodEnum) return [{ ...meta, path, kind: 'choice', when }];
  if (schema instanceof z.ZodLiteral) return [{ ...meta, path, kind: 'numberChoice', when }];
  return [
    {
      ...meta,
      path,
      kind: schema instanceof z.ZodNumber && schema.format === 'safeint' ? 'integer' : 'number',
      when,
    },
  ];
}

export function variantName(option: z.ZodObject, discriminator: string): string {
  const literal: unknown = option.shape[discriminator];
  if (!(literal instanceof z.ZodLiteral)) throw new TypeError(`variant without a literal ${discriminator}`);
  return String(literal.value);
}

function listLength(meta: FieldMeta): number {
  return Array.isArray(meta.defaultValue) ? meta.defaultValue.length : 0;
}
