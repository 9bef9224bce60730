import { z } from 'zod';
import { fieldRegistry } from '../field.js';
import { variantName } from './fields.js';
import { receiverDefinition, type ReceiverKind } from './receivers/index.js';
import { scenarioSchema, scenarioShape, type Scenario } from './scenario.js';

/** The default machine of the given receiver, complete, with the pump settings that suit it. */
export function newScenario(receiver: ReceiverKind = 'coil'): Scenario {
  const scenario = scenarioShape.parse(defaultsOf(scenarioShape, new Map([['receiver', receiver]]), ''));
  Object.assign(scenario.carryAndKeep.pump, receiverDefinition(receiver).pumpDefaults);
  return scenarioSchema.parse(scenario);
}

function defaultsOf(schema: z.core.$ZodType, chosen: ReadonlyMap<string, string>, key: string): unknown {
  const meta = fieldRegistry.get(schema);
  if (schema instanceof z.ZodDiscriminatedUnion) {
    const wanted = chosen.get(key) ?? meta?.defaultValue;
    const discriminator = schema.def.discriminator;
    const option = schema.options.find(
      (candidate) => candidate instanceof z.ZodObject && variantName(candidate, discriminator) === wanted,
    );
    if (!option) throw new TypeError(`no variant ${String(wanted)} of ${key}`);
    return defaultsOf(option, chosen, key);
  }
  if (schema instanceof z.ZodObject) {
    return Object.fromEntries(
      Object.entries<z.core.$ZodType>(schema.shape).map(([name, child]) => [
        name,
        defaultsOf(child, chosen, name),
      ]),
    );
  }
  if (meta) return meta.defaultValue;
  if (schema instanceof z.ZodArray) return [defaultsOf(schema.element, chosen, key)];
  if (schema instanceof z.ZodLiteral) return schema.value;
  throw new TypeError(`field ${key} has no default`);
}

/** The defaults of one variant of a choice, for a form that switches it: `defaultVariant("catch.receiver", "cell")`. */
export function defaultVariant(path: string, variant: string): unknown {
  const keys = path.split('.');
  let schema: z.core.$ZodType = scenarioShape;
  for (const key of keys) schema = childOf(schema, key);
  const last = keys.at(-1) ?? '';
  return defaultsOf(schema, new Map([[last, variant]]), last);
}

function childOf(schema: z.core.$ZodType, key: string): z.core.$ZodType {
  if (schema instanceof z.ZodObject) {
    const child: unknown = schema.shape[key];
    if (child instanceof z.ZodType) return child;
  }
  if (schema instanceof z.ZodArray) return schema.element;
  if (schema instanceof z.ZodDiscriminatedUnion) {
    for (const option of schema.options) {
      if (option instanceof z.ZodObject && key in option.shape) return childOf(option, key);
    }
  }
  throw new TypeError(`no field ${key}`);
}
