import type { ReceiverKind, Role } from '@noonwell/schema';

/** All of the demo is invented: no person, firm or place of it exists. */
export const DEMO_WORKSPACE = 'Noonwell demo';

/** No password opens these accounts, and no mail reaches their addresses. */
export const DEMO_PEOPLE: readonly { readonly role: Role; readonly name: string; readonly email: string }[] =
  [
    { role: 'admin', name: 'Demo administrator', email: 'administrator@demo.invalid' },
    { role: 'engineer', name: 'Demo engineer', email: 'engineer@demo.invalid' },
    { role: 'analyst', name: 'Demo analyst', email: 'analyst@demo.invalid' },
    { role: 'student', name: 'Demo student', email: 'student@demo.invalid' },
  ];

/** Whoever the demo's study and weather years belong to. */
export const DEMO_OWNER: Role = 'engineer';

/** Descriptors of invented places in datasets/synthetic; the study stands on the first. */
export const DEMO_PLACES = ['brackenfold', 'tarn-lane', 'three-alders'] as const;

export const DEMO_STUDY = {
  name: 'Brackenfold Creamery',
  question:
    'The creamery needs 82 °C water for cleaning and power for chilling. What does a dual cell receiver gain in electricity, and how much heat does it give up?',
} as const;

export const DEMO_SCENARIOS: readonly { readonly name: string; readonly receiver: ReceiverKind }[] = [
  { name: 'Present coil receiver', receiver: 'coil' },
  { name: 'Dual cell receiver', receiver: 'cell' },
];
