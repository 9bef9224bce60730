import { WEATHER_CHANNELS } from '@noonwell/engine';
import { problemSchema, weatherYearSchema, type Problem } from '@noonwell/schema';
import { epwFile, lineOfRow, paddedEpwFile, pdfFile, syntheticYear } from '@noonwell/testkit';
import { WEATHER_FILE_LIMIT_BYTES } from '@noonwell/weather';
import { tableFromIPC } from 'apache-arrow';
import { createHash } from 'node:crypto';
import type { Agent } from 'supertest';
import { queryAsAdmin } from './support/admin-query';
import { addTenant, signIn, type Tenant } from './support/people';
import { startTestApp, type TestApp } from './support/test-app';

describe('weather years', () => {
  let test: TestApp;
  let tenant: Tenant;
  let other: Tenant;
  let analyst: Agent;
  const year = syntheticYear();
  const good = Buffer.from(epwFile(year));

  beforeAll(async () => {
    test = await startTestApp();
    tenant = await addTenant(test.em, 'Copper');
    other = await addTenant(test.em, 'Amber');
    analyst = await signIn(test, tenant.people.analyst);
  });
  afterAll(() => test.close());

  const upload = (who: Agent, bytes: Uint8Array, fileName = 'test-field.epw') =>
    who.post('/api/weather-years').attach('file', Buffer.from(bytes), fileName);
  const add = async () => weatherYearSchema.parse((await upload(analyst, good).expect(201)).body);

  /** Rows that an upload writes, of every workspace. */
  async function saved(): Promise<unknown> {
    return queryAsAdmin(
      test.database,
      `select (select count(*)::int from weather_years) as years, (select count(*)::int from weather_originals) as files,
        (select count(*)::int from weather_columns) as columns`,
    );
  }

  it('saves what it read, with the file as it came', async () => {
    const answer = await upload(analyst, good, 'Brackenfold 2019 – größe.epw')
      .field('name', 'Brackenfold')
      .expect(201);
    const view = weatherYearSchema.parse(answer.body);
    expect(view).toMatchObject({
      name: 'Brackenfold',
      format: 'epw',
      synthetic: true,
      originalFileName: 'Brackenfold 2019 – größe.epw',
      originalBytes: good.length,
      originalSha256: createHash('sha256').update(good).digest('hex'),
      createdByName: tenant.people.analyst.name,
      summary: { records: 8760, intervalMinutes: 60 },
    });
    const original = await analyst
      .get(`/api/weather-years/${view.id}/original`)
      .buffer()
      .parse(toBuffer)
      .expect(200);
    expect(good.equals(bodyOf(original))).toBe(true);
    expect(original.headers['content-disposition']).toContain('attachment');
    expect(original.headers['x-content-type-options']).toBe('nosniff');
    const columns = await analyst
      .get(`/api/weather-years/${view.id}/columns`)
      .buffer()
      .parse(toBuffer)
      .expect(200);
    const table = tableFromIPC(bodyOf(columns));
    expect(table.schema.fields.map(({ name }) => name)).toEqual(['startLocalMs', ...WEATHER_CHANNELS]);
    expect(table.getChild('dniWm2')?.get(12)).toBeCloseTo(year.dniWm2[12]!, 0);
    expect(table.numRows).toBe(8760);
  });

  it("takes the file's own place name where nobody gives one", async () => {
    expect((await add()).name).toBe('Test Field, TF, Nowhere');
  });

  const withDefect = (...defects: NonNullable<Parameters<typeof epwFile>[1]>['defects'] & object) =>
    epwFile(year, { defects });
  const REFUSED: [string, () => Uint8Array, Partial<NonNullable<Problem['errors']>[number]>][] = [
    [
      'a truncated file',
      () => withDefect({ kind: 'truncated', row: 4000, characters: 30 }),
      { line: lineOfRow(4000) },
    ],
    ['8759 rows', () => withDefect({ kind: 'rowMissing', row: 5000 }), { line: lineOfRow(5000) }],
    [
      'text where a number should be',
      () => withDefect({ kind: 'cell', row: 100, cell: 15, text: 'sunny' }),
      { line: lineOfRow(100), column: 15, value: 'sunny' },
    ],
    ['a PDF renamed .epw', pdfFile, { line: null }],
    ['an empty file', () => new Uint8Array(0), { line: null }],
    [
      'NaN',
      () => withDefect({ kind: 'cell', row: 7, cell: 7, text: 'NaN' }),
      { line: lineOfRow(7), column: 7, value: 'NaN' },
    ],
  ];
  it.each(REFUSED)('refuses %s, names the place and saves nothing', async (_, file, place) => {
    const before = await saved();
    const answer = await upload(analyst, file())
      .expect(422)
      .expect('Content-Type', /^application\/problem\+json/);
    const problem = problemSchema.parse(answer.body);
    expect(problem.type).toBe('urn:noonwell:problem:weather-refused');
    expect(problem.errors?.[0]).toMatchObject(place);
    expect(problem.errors?.[0]?.reason).not.toBe('');
    expect(problem.errors?.[0]?.fix).not.toBe('');
    expect(await saved()).toEqual(before);
  });

  it('refuses 65 MiB with 413 and saves nothing', async () => {
    const before = await saved();
    const answer = await upload(analyst, paddedEpwFile(year, 65 * 1024 * 1024)).expect(413);
    const problem = problemSchema.parse(answer.body);
    expect(problem.detail).toContain(`${String(WEATHER_FILE_LIMIT_BYTES / 1024 / 1024)} MiB`);
    expect(await saved()).toEqual(before);
  });

  it('refuses an upload without a file, with two, or with a field it does not know', async () => {
    const before = await saved();
    await analyst.post('/api/weather-years').field('name', 'Nothing').expect(400);
    await analyst.post('/api/weather-years').send({ name: 'Nothing' }).expect(400);
    await upload(analyst, good).attach('file', good, 'second.epw').expect(400);
    await upload(analyst, good).field('workspaceId', other.workspaceId).expect(400);
    await upload(analyst, good).field('name', 'two\nlines').expect(400);
    expect(await saved()).toEqual(before);
  });

  it('keeps a path in the file name from meaning anything', async () => {
    const view = weatherYearSchema.parse((await upload(analyst, good, '../../etc/passwd').expect(201)).body);
    expect(view.originalFileName).toBe('passwd');
  });

  it('pages its list, the newest first', async () => {
    const made = await add();
    const page = await analyst.get('/api/weather-years').query({ pageSize: 1 }).expect(200);
    expect(page.body).toMatchObject({ page: 1, pageSize: 1, items: [{ id: made.id }] });
    await analyst.get('/api/weather-years').query({ pageSize: 1000 }).expect(400);
    await analyst.get('/api/weather-years').query({ sort: 'name' }).expect(400);
  });

  it('lets a student read and not write', async () => {
    const { id } = await add();
    const student = await signIn(test, tenant.people.student);
    await student.get(`/api/weather-years/${id}`).expect(200);
    await upload(student, good).expect(403);
    await student.delete(`/api/weather-years/${id}`).expect(403);
  });

  it('does not exist for another workspace', async () => {
    const { id } = await add();
    const stranger = await signIn(test, other.people.admin);
    for (const path of ['', '/original', '/columns'])
      await stranger.get(`/api/weather-years/${id}${path}`).expect(404);
    await stranger.delete(`/api/weather-years/${id}`).expect(404);
    expect((await stranger.get('/api/weather-years').expect(200)).body).toMatchObject({
      items: [],
      total: 0,
    });
    await analyst.get(`/api/weather-years/${id}`).expect(200);
  });

  it('removes a year with its file and columns', async () => {
    const before = await saved();
    const { id } = await add();
    await analyst.delete(`/api/weather-years/${id}`).expect(204);
    expect(await saved()).toEqual(before);
    await analyst.get(`/api/weather-years/${id}`).expect(404);
  });
});

type BinaryParser = Parameters<ReturnType<Agent['get']>['parse']>[0];

const toBuffer: BinaryParser = (response, done) => {
  const chunks: Buffer[] = [];
  response.on('data', (chunk: string) => chunks.push(Buffer.from(chunk)));
  response.on('end', () => {
    done(null, Buffer.concat(chunks));
  });
};

function bodyOf(answer: { body: unknown }): Buffer {
  if (!Buffer.isBuffer(answer.body)) throw new TypeError('The answer was not read as bytes.');
  return answer.body;
}
