import {
  accessSchema,
  newScenario,
  scenarioViewSchema,
  studySchema,
  weatherYearSchema,
  type Access,
  type Role,
  type ScenarioView,
  type StudyView,
  type WeatherYearView,
} from '@noonwell/schema';

/** A valid identifier that ends in the given number. */
export function id(number: number): string {
  return `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;
}

const NOW = '2026-03-01T09:30:00.000Z';

// Each is parsed by the contract's own schema, so that a fixture cannot fall behind it.

export function access(role: Role = 'engineer', token = 'token-1'): Access {
  return accessSchema.parse({
    accessToken: token,
    expiresInSeconds: 600,
    me: {
      user: { id: id(1), name: 'Ines Hollander', email: 'ines@demo.invalid' },
      workspace: { id: id(2), name: 'Demo workspace', isDemo: true },
      role,
    },
  });
}

export function weatherYear(over: Partial<WeatherYearView> = {}): WeatherYearView {
  return weatherYearSchema.parse({
    id: id(30),
    name: 'Brackenfold',
    format: 'epw',
    synthetic: true,
    latitudeDeg: 52.3,
    longitudeDeg: -2.1,
    altitudeM: 120,
    utcOffsetHours: 0,
    originalFileName: 'brackenfold.epw',
    originalBytes: 1_700_000,
    originalSha256: 'ab'.repeat(32),
    warnings: [],
    summary: {
      records: 8760,
      intervalMinutes: 60,
      dniKwhM2: 1043,
      ghiKwhM2: 1021,
      dhiKwhM2: 540,
      dryBulbMinC: -6,
      dryBulbMaxC: 29,
      dryBulbMeanC: 9.8,
      windMeanMs: 4.1,
      monthlyDniKwhM2: Array.from({ length: 12 }, (_, month) => 50 + month),
      monthlyGhiKwhM2: Array.from({ length: 12 }, (_, month) => 40 + month),
      monthlyDryBulbMeanC: Array.from({ length: 12 }, (_, month) => month),
      flaggedRecords: 0,
    },
    createdAt: NOW,
    createdByName: 'Ines Hollander',
    ...over,
  });
}

export function scenario(over: Partial<ScenarioView> = {}): ScenarioView {
  return scenarioViewSchema.parse({
    id: id(20),
    studyId: id(10),
    name: 'Present coil receiver',
    position: 0,
    version: 1,
    versionId: id(21),
    document: newScenario('coil'),
    weatherYearId: id(30),
    weatherYearName: 'Brackenfold',
    updatedAt: NOW,
    latestRun: null,
    ...over,
  });
}

export function study(over: Partial<StudyView> = {}): StudyView {
  return studySchema.parse({
    id: id(10),
    name: 'Brackenfold Creamery',
    question: 'Is a dual cell receiver worth its price?',
    sandbox: false,
    ownerName: 'Ines Hollander',
    scenarioCount: 1,
    weatherYears: [{ id: id(30), name: 'Brackenfold', synthetic: true }],
    activeRuns: 0,
    lastRunFinishedAt: null,
    updatedAt: NOW,
    mayWrite: true,
    scenarios: [scenario()],
    ...over,
  });
}

export function page<Item>(items: readonly Item[]) {
  return { items, page: 1, pageSize: 20, total: items.length };
}
