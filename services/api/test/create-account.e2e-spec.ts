import { AccountError, createAccount, readAccount } from '../src/cli/create-account';
import { startTestApp, type TestApp } from './support/test-app';
import { addTenant } from './support/people';

const PASSWORD = 'long enough, and not the first that is tried';

describe('the command that makes accounts', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await startTestApp();
  });
  afterAll(() => test.close());

  const account = (
    change: Partial<Record<'workspace' | 'name' | 'email' | 'role', string>> = {},
    password = PASSWORD,
  ) => {
    const options = {
      workspace: 'Hearth',
      name: 'First',
      email: 'First@Example.test',
      role: 'admin',
      ...change,
    };
    return readAccount(
      Object.entries(options).flatMap(([key, value]) => [`--${key}`, value]),
      `${password}\n`,
    );
  };

  it('makes a workspace with its first administrator, who can sign in', async () => {
    const { workspaceMade } = await createAccount(test.em, account());
    expect(workspaceMade).toBe(true);
    const body = { email: 'first@example.test', password: PASSWORD };
    const answer = await test.client().post('/api/auth/sign-in').send(body).expect(200);
    expect(answer.body).toMatchObject({
      me: { workspace: { name: 'Hearth', isDemo: false }, role: 'admin' },
    });
  });

  it('adds to a workspace that exists', async () => {
    const first = await createAccount(test.em, account({ workspace: 'Kiln', email: 'a@example.test' }));
    const second = await createAccount(
      test.em,
      account({ workspace: 'Kiln', email: 'b@example.test', role: 'student' }),
    );
    expect(second).toMatchObject({ workspaceId: first.workspaceId, workspaceMade: false });
  });

  it('refuses an address that is taken, and leaves no workspace behind', async () => {
    const taken = account({ workspace: 'Flue', email: 'taken@example.test' });
    await createAccount(test.em, taken);
    await expect(createAccount(test.em, { ...taken, workspace: 'Chimney' })).rejects.toThrow(AccountError);
    const again = await createAccount(test.em, account({ workspace: 'Chimney', email: 'free@example.test' }));
    expect(again.workspaceMade).toBe(true);
  });

  it('puts nobody with a password into the demo workspace', async () => {
    await addTenant(test.em, 'Demo', true);
    await expect(
      createAccount(test.em, account({ workspace: 'Demo', email: 'd@example.test' })),
    ).rejects.toThrow(/demo/);
  });

  it.each([
    ['a short password', {}, 'short'],
    ['a common one', {}, 'PasswordPassword1!'],
    ['a repeated one', {}, 'abcabcabcabcabc'],
    ['a row of keys', {}, 'qwertyuiopas'],
    ['one that is too long', {}, 'x'.repeat(129)],
    ['an unknown role', { role: 'owner' }, PASSWORD],
    ['no address', { email: 'first' }, PASSWORD],
  ])('refuses %s and does not repeat the password', (_, change, password) => {
    const read = () => account(change, password);
    expect(read).toThrow(AccountError);
    expect(read).not.toThrow(new RegExp(password));
  });

  it('names an option it does not know', () => {
    expect(() => readAccount(['--password', 'secret'], PASSWORD)).toThrow(/--password/);
  });
});
