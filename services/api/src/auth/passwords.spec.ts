import { hashPassword, newPasswordSchema, passwordFits } from './passwords';

describe('passwords', () => {
  it('are kept with argon2id and the stated parameters', async () => {
    expect(await hashPassword('amber copper violet')).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  it('fit their own hash and no other, and nothing fits an account without one', async () => {
    const stored = await hashPassword('amber copper violet');
    expect(await passwordFits(stored, 'amber copper violet')).toBe(true);
    expect(await passwordFits(stored, 'amber copper viole')).toBe(false);
    expect(await passwordFits(null, 'amber copper violet')).toBe(false);
    expect(await passwordFits(null, 'stand-in for accounts that do not exist')).toBe(false);
  });

  it.each(['amber copper violet', 'тёплая вода в баке', 'aaaaaaaaaaa1 different', '   twelve blanks   '])(
    'may be any long text: %s',
    (password) => {
      expect(newPasswordSchema.safeParse(password).success).toBe(true);
    },
  );

  it.each([
    'elevenchars',
    'Password1234',
    'CHANGEMENOW2024!',
    '123456789012',
    'abcabcabcabc',
    'aaaaaaaaaaaa',
    'mnbvcxzlkjhg',
  ])('are refused when short or tried first: %s', (password) => {
    expect(newPasswordSchema.safeParse(password).success).toBe(false);
  });
});
