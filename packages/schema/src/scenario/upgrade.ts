import { SCENARIO_FORMAT } from './scenario-format.js';

/**
 * Brings a document of an older format version to the newest, so that what was stored or exported long ago still
 * runs and gives the same numbers. Anything else comes back as it is, for the schema to judge.
 *
 * Stored versions never change: this happens each time one is read.
 *
 * - Version 1 knew a level horizon, exposed pipe and no outage; version 2 says so.
 */
export function upgradeScenario(document: unknown): unknown {
  if (!isObject(document) || document['format'] !== SCENARIO_FORMAT) return document;
  return document['formatVersion'] === 1 ? fromVersion1(document) : document;
}

function fromVersion1(document: JsonObject): JsonObject {
  const { catch: caught, carryAndKeep } = document;
  return {
    ...document,
    formatVersion: 2,
    // A file with the old number and the new fields was edited by hand: what it says is not thrown away.
    place: document['place'] ?? { horizon: [] },
    catch: isObject(caught) ? { outages: [], ...caught } : caught,
    carryAndKeep:
      isObject(carryAndKeep) && isObject(carryAndKeep['pipe'])
        ? { ...carryAndKeep, pipe: { kind: 'exposed', ...carryAndKeep['pipe'] } }
        : carryAndKeep,
  };
}

type JsonObject = Readonly<Record<string, unknown>>;

function isObject(value: unknown): value is JsonObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
