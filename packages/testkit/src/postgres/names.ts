import { randomBytes } from 'node:crypto';

/** Names only ever come from here and are checked again where they enter SQL, which cannot bind identifiers. */
const IDENTIFIER = /^[a-z][a-z0-9_]{0,62}$/;

/** Quotes a database or role name for SQL text. */
export function identifier(name: string): string {
  if (!IDENTIFIER.test(name))
    throw new Error(`"${name}" is not a name the test kit would give a role or database.`);
  return `"${name}"`;
}

/** Quotes a generated password for SQL text: hexadecimal only, so nothing can need escaping. */
export function passwordLiteral(password: string): string {
  if (!/^[0-9a-f]+$/.test(password)) throw new Error('Test passwords are hexadecimal.');
  return `'${password}'`;
}

export function randomName(prefix: string): string {
  return `${prefix}_${randomBytes(6).toString('hex')}`;
}

export function randomPassword(): string {
  return randomBytes(16).toString('hex');
}
