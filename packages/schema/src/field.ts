import { z } from 'zod';

/**
 * What every scenario field states about itself. The form, the command line's help, the API document and
 * the written reference all read this and nothing else.
 */
export interface FieldMeta {
  /** Short name as it stands on the form. */
  readonly label: string;
  /** Unit as it is printed; "1" for a pure number; empty for a choice or a text. */
  readonly unit: string;
  /** One or two sentences: what it is, what it does. */
  readonly help: string;
  /** Where the default or the relation comes from. */
  readonly source: string;
  /** Value of a new scenario. */
  readonly defaultValue: unknown;
  /** Lowest and highest value of a number field (of each entry, for a list of numbers). */
  readonly min?: number;
  readonly max?: number;
  /** Most rows of a table of any length. */
  readonly mostRows?: number;
  /** Labels of a choice field's values. */
  readonly choices?: Readonly<Record<string, string>>;
}

export const fieldRegistry = z.registry<FieldMeta>();

export const INVENTED = 'invented default of the demo machine';
export const COMMON_PRACTICE = 'common practice, no source';

interface NumberField {
  label: string;
  unit: string;
  min: number;
  max: number;
  defaultValue: number;
  help: string;
  source: string;
}

/** A number with unit, range, default, help and source. NaN and infinities are refused. */
export function numberField(meta: NumberField) {
  return z
    .number({ error: `${meta.label} must be a number${meta.unit === '1' ? '' : ` in ${meta.unit}`}` })
    .min(meta.min, { error: `${meta.label} must be at least ${meta.min} ${unitText(meta.unit)}`.trim() })
    .max(meta.max, { error: `${meta.label} must be at most ${meta.max} ${unitText(meta.unit)}`.trim() })
    .register(fieldRegistry, meta);
}

/** A whole number with unit, range, default, help and source. */
export function integerField(meta: NumberField) {
  return z
    .int({ error: `${meta.label} must be a whole number` })
    .min(meta.min, { error: `${meta.label} must be at least ${meta.min} ${unitText(meta.unit)}`.trim() })
    .max(meta.max, { error: `${meta.label} must be at most ${meta.max} ${unitText(meta.unit)}`.trim() })
    .register(fieldRegistry, meta);
}

interface ListField extends Omit<NumberField, 'defaultValue'> {
  length: number;
  defaultValue: readonly number[];
}

/** A list of numbers of one length, for schedules. */
export function numberListField(meta: ListField) {
  return z
    .array(z.number().min(meta.min).max(meta.max), { error: `${meta.label} must be a list of numbers` })
    .length(meta.length, { error: `${meta.label} needs ${meta.length} numbers` })
    .register(fieldRegistry, meta);
}

function unitText(unit: string): string {
  return unit === '1' ? '' : unit;
}
