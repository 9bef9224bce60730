import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startTestApp, type TestApp } from './support/test-app';

describe('the built web and the headers of every answer', () => {
  let test: TestApp;
  let folder: string;

  beforeAll(async () => {
    folder = mkdtempSync(join(tmpdir(), 'noonwell-web-'));
    mkdirSync(join(folder, 'assets'));
    writeFileSync(join(folder, 'index.html'), '<!doctype html><title>page</title>');
    writeFileSync(join(folder, 'icon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>');
    writeFileSync(join(folder, 'assets', 'index-abc123.js'), 'export {};');
    test = await startTestApp({ webDist: folder });
  });
  afterAll(async () => {
    await test.close();
    rmSync(folder, { recursive: true });
  });

  it.each(['/', '/studies', '/studies/5f1d/side-by-side?week=3', '/weather'])(
    'draws the page %s',
    async (path) => {
      const answer = await test.client().get(path).expect(200).expect('Cache-Control', 'no-cache');
      expect(answer.text).toContain('<title>page</title>');
    },
  );

  it('keeps hashed files for good and asks again for the others', async () => {
    await test
      .client()
      .get('/assets/index-abc123.js')
      .expect(200)
      .expect('Cache-Control', 'public, max-age=31536000, immutable');
    await test.client().get('/icon.svg').expect(200).expect('Cache-Control', 'no-cache');
    await test.client().get('/index.html').expect(200).expect('Cache-Control', 'no-cache');
  });

  it('compresses scripts for who takes it, and leaves the API alone', async () => {
    writeFileSync(join(folder, 'assets', 'long-abc123.js'), `export default '${'sun '.repeat(2000)}';`);
    const script = () => test.client().get('/assets/long-abc123.js');
    await script().set('Accept-Encoding', 'gzip').expect('Content-Encoding', 'gzip');
    const plain = await script().set('Accept-Encoding', 'identity').expect(200);
    expect(plain.headers['content-encoding']).toBeUndefined();
    const api = await test.client().get('/api/openapi.json').set('Accept-Encoding', 'gzip').expect(200);
    expect(api.headers['content-encoding']).toBeUndefined();
  });

  it('has no page where a file is missing or below /api, and nothing from outside its folder', async () => {
    for (const path of ['/assets/index-old.js', '/missing.png', '/api/nothing', '/..%2fsecret.txt']) {
      const answer = await test.client().get(path);
      expect([path, answer.status >= 400, answer.text.includes('<title>page')]).toEqual([path, true, false]);
    }
    await test.client().post('/studies').expect(404);
    const outside = await test.client().get('/..%2f..%2f..%2f..%2f..%2fetc%2fpasswd');
    expect(outside.text).not.toContain('root:');
  });

  it.each(['/', '/api/health', '/api/studies', '/api/nothing'])(
    'sends the security headers with %s',
    async (path) => {
      const { headers } = await test.client().get(path);
      const policy = new Map(
        (headers['content-security-policy'] ?? '').split(';').map((rule) => {
          const [name = '', ...sources] = rule.trim().split(' ');
          return [name, sources.join(' ')];
        }),
      );
      expect(policy.get('default-src')).toBe("'none'");
      // Neither inline nor evaluated text runs as code.
      expect(policy.get('script-src')).toBe("'self'");
      expect(policy.get('object-src')).toBe("'none'");
      expect(policy.get('frame-ancestors')).toBe("'none'");
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['referrer-policy']).toBe('no-referrer');
      expect(headers['x-powered-by']).toBeUndefined();
    },
  );

  it('lets no cache keep an answer of the API', async () => {
    await test.client().get('/api/health').expect('Cache-Control', 'no-store');
  });

  it('does not start without the page it is told to serve', async () => {
    await expect(startTestApp({ webDist: join(folder, 'assets') })).rejects.toThrow('NOONWELL_WEB_DIST');
  });
});
