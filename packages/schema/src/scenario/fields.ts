import { z } from 'zod';
import { fieldRegistry, type FieldMeta } from '../field.js';
import { scenarioShape } from './scenario.js';

/** One field of a scenario with its place: the form draws itself from these, and so does the reference. */
export interface ScenarioField extends FieldMeta {
  /** Keys joined by dots: "catch.dish.apertureDiameterM", "use.loads.0.setPointC". */
  readonly path: string;
  readonly kind: 'number' | 'integer' | 'numberList' | 'choice' | 'numberChoice';
  /** For a list of numbers. */
  readonly length?: number;
  /** Shown only while each of these choices has the value given. */
  readonly when: readonly { readonly path: string; readonly value: string }[];
}

/** All fields of a scenario in the order of the form, each variant's fields after its choice. */
export function scenarioFields(): readonly ScenarioField[] {
  return ALL_FIELDS;
}

export function scenarioField(path: string): ScenarioField | undefined {
  return ALL_FIELDS.find((field) => field.path === path);
}

const ALL_FIELDS: readonly ScenarioField[] = collect(scenarioShape, '', []);

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
  if (schema instanceof z.ZodArray)
    return [{ ...meta, path, kind: 'numberList', length: listLength(meta), when }];
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
