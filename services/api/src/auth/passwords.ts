import { hash, verify } from '@node-rs/argon2';
import { z } from 'zod';
import { COMMON_PASSWORDS } from './common-passwords';

/** argon2id (the library's default, held by a test), 19 MiB, two passes, one lane: OWASP's Password Storage Cheat Sheet (values from memory). */
const ARGON2ID = {
  memoryCost: 19_456,
  timeCost: 2,
  parallelism: 1,
  outputLen: 32,
};

export const PASSWORD_MIN = 12;
export const PASSWORD_MAX = 128;

/** A new password: long, and not one that everybody tries first. No rules about kinds of characters. */
export const newPasswordSchema = z
  .string()
  .min(PASSWORD_MIN, { error: `a password has at least ${String(PASSWORD_MIN)} characters` })
  .max(PASSWORD_MAX, { error: `a password has at most ${String(PASSWORD_MAX)} characters` })
  .refine((password) => !isCommon(password), { error: 'this password is one of the first that are tried' });

export function hashPassword(password: string): Promise<string> {
  return hash(password, ARGON2ID);
}

let standIn: Promise<string> | undefined;

/**
 * Whether the password fits. Without a stored hash (no such account, or one that no password opens) the same work
 * is done against a stand-in, so that the time tells nothing.
 */
export async function passwordFits(stored: string | null, password: string): Promise<boolean> {
  standIn ??= hashPassword('stand-in for accounts that do not exist');
  const fits = await verify(stored ?? (await standIn), password);
  return fits && stored !== null;
}

/** Compared without case and without digits and signs at the end, which is how common ones are varied. */
function isCommon(password: string): boolean {
  const lower = password.toLowerCase();
  const stem = lower.replace(/[^a-z]+$/, '');
  return COMMON_PASSWORDS.has(lower) || COMMON_PASSWORDS.has(stem) || isRepeated(lower) || isSequence(lower);
}

/** One to four characters over and over: "aaaaaaaaaaaa", "abcabcabcabc". */
function isRepeated(password: string): boolean {
  return /^(.{1,4})\1+.{0,3}$/su.test(password);
}

const SEQUENCES = [
  'abcdefghijklmnopqrstuvwxyz',
  '01234567890123456789',
  'qwertyuiopasdfghjklzxcvbnm',
  '1qaz2wsx3edc4rfv5tgb',
];

/** Neighbours of the alphabet, the digits or the keyboard only, forwards or backwards. */
function isSequence(password: string): boolean {
  return SEQUENCES.some(
    (row) => row.includes(password) || Array.from(row).reverse().join('').includes(password),
  );
}
