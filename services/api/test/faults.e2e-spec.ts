import { problemSchema } from '@noonwell/schema';
import { z } from 'zod';
import { queryAsAdmin } from './support/admin-query';
import { addTenant, PASSWORD, signIn } from './support/people';
import { startTestApp } from './support/test-app';

const tokenSchema = z.object({ accessToken: z.string() });

describe('faults of ours', () => {
  it('answer with a reference into the log and no detail', async () => {
    const test = await startTestApp();
    const { people } = await addTenant(test.em, 'Copper');
    const engineer = await signIn(test, people.engineer);
    await queryAsAdmin(test.database, 'alter table studies rename to studies_hidden');
    const answer = await engineer
      .get('/api/studies')
      .expect(500)
      .expect('Content-Type', /^application\/problem\+json/);
    const problem = problemSchema.parse(answer.body);
    expect(problem.reference).toMatch(/^[0-9a-f-]{36}$/);
    expect(answer.text).not.toMatch(/studies_hidden|relation|select|at .*\.ts/);
    await test.close();
  });

  it('keep the API from starting as a role that row-level security does not hold', async () => {
    const test = await startTestApp();
    for (const databaseUrl of [test.database.adminUrl, test.database.ownerUrl]) {
      await expect(startTestApp({ databaseUrl })).rejects.toThrow(/can pass row-level security/);
    }
    await test.close();
  });
});

describe('the log', () => {
  it('names sign-ins and refusals, and holds no password, token, cookie, address or value of a statement', async () => {
    const lines: string[] = [];
    const logTo = { write: (line: string) => void lines.push(line) };
    const test = await startTestApp({ logLevel: 'trace' }, logTo);
    const { people } = await addTenant(test.em, 'Copper');
    const { email, userId } = people.student;
    await test.client().post('/api/auth/sign-in').send({ email, password: 'a guess that fails' }).expect(401);
    const signedIn = await test
      .client()
      .post('/api/auth/sign-in')
      .send({ email, password: PASSWORD })
      .expect(200);
    const { accessToken } = tokenSchema.parse(signedIn.body);
    const student = await signIn(test, people.student);
    await student.get('/api/workspace/members').query({ page: '1' }).expect(403);
    await queryAsAdmin(test.database, 'alter table studies drop column question');
    await student.post('/api/studies').send({ name: 'Confidential question' }).expect(500);
    await test.close();

    const log = lines.join('');
    const said = (message: string, part: object) => {
      expect(lines.map((line) => JSON.parse(line) as unknown)).toContainEqual(
        expect.objectContaining({ msg: message, ...part }),
      );
    };
    said('sign-in refused', { userId });
    said('signed in', { userId });
    said('refused', { userId, role: 'student', route: 'GET /api/workspace/members' });
    said('request failed', { err: expect.objectContaining({ code: '42703' }) as unknown });
    const cookie = /=([\w-]{43});/.exec(String(signedIn.headers['set-cookie']))?.[1];
    for (const secret of [
      PASSWORD,
      'a guess that fails',
      accessToken,
      cookie,
      email,
      '$argon2',
      'Confidential question',
    ]) {
      expect([secret, log.includes(secret ?? '?')]).toEqual([secret, false]);
    }
  });
});
