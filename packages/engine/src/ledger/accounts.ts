import { LEDGER_LINES, type LedgerLine } from './lines.js';

/** Energies kept beside the ledger because people ask for them; each is part of lines that stand there. */
export const EXTRA_ACCOUNTS = [
  { key: 'powerAc', label: 'Electricity behind the inverter' },
  { key: 'ownUse', label: 'Electricity from the dish used on the site' },
  { key: 'boilerFuel', label: 'Fuel energy burned by the boiler' },
] as const;
export type Account = LedgerLine | (typeof EXTRA_ACCOUNTS)[number]['key'];

/** The ledger's lines come first, so that an accounts array is a ledger array with more behind it. */
export const ACCOUNTS: readonly Account[] = [
  ...LEDGER_LINES.map((line) => line.key),
  ...EXTRA_ACCOUNTS.map((account) => account.key),
];
export const ACCOUNT_INDEX = Object.fromEntries(ACCOUNTS.map((key, index) => [key, index])) as Readonly<
  Record<Account, number>
>;
