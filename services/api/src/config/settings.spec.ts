import { chmodSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readSettings, SettingsError } from './settings';

const DATABASE_URL = 'postgresql://app:pw@127.0.0.1:5432/noonwell';
const SECRET = 's'.repeat(32);
const PRODUCTION = { DATABASE_URL, NODE_ENV: 'production', NOONWELL_JWT_SECRET: SECRET };

describe('readSettings', () => {
  it('names every variable that is wrong and repeats no value', () => {
    const read = () =>
      readSettings({ DATABASE_URL: 'mysql://x:secret@y', PORT: '70000', NOONWELL_JWT_SECRET: 'short' });
    expect(read).toThrow(SettingsError);
    for (const name of ['DATABASE_URL', 'PORT', 'NOONWELL_JWT_SECRET']) expect(read).toThrow(name);
    expect(read).not.toThrow(/secret@|short/);
  });

  it('keeps the demo off a network unless it is asked for', () => {
    expect(readSettings({ DATABASE_URL }).demo).toBe(true);
    expect(readSettings({ DATABASE_URL, HOST: '0.0.0.0' }).demo).toBe(false);
    // A proxy on the same machine may stand in front.
    expect(readSettings(PRODUCTION).demo).toBe(false);
    expect(readSettings({ ...PRODUCTION, NOONWELL_DEMO: 'on' }).demo).toBe(true);
    expect(readSettings({ ...PRODUCTION, HOST: '0.0.0.0' }).demo).toBe(false);
    expect(readSettings({ ...PRODUCTION, HOST: '0.0.0.0', NOONWELL_DEMO: 'on' }).demo).toBe(true);
    expect(readSettings({ ...PRODUCTION, NOONWELL_DEMO: 'off' }).demo).toBe(false);
    expect(() => readSettings({ ...PRODUCTION, NOONWELL_DEMO: 'yes' })).toThrow('NOONWELL_DEMO');
  });

  it('sends cookies over TLS only, but for loopback where there is none', () => {
    expect(readSettings({ ...PRODUCTION, HOST: '0.0.0.0' }).secureCookies).toBe(true);
    expect(readSettings(PRODUCTION).secureCookies).toBe(false);
    expect(readSettings({ ...PRODUCTION, NOONWELL_TRUSTED_PROXIES: '1' }).secureCookies).toBe(true);
    expect(readSettings({ ...PRODUCTION, NOONWELL_SECURE_COOKIES: 'on' }).secureCookies).toBe(true);
  });

  it('wants a secret in production and makes one up elsewhere', () => {
    expect(() => readSettings({ DATABASE_URL, NODE_ENV: 'production' })).toThrow('NOONWELL_JWT_SECRET');
    const [first, second] = [readSettings({ DATABASE_URL }), readSettings({ DATABASE_URL })];
    expect(first.jwtSecret.length).toBeGreaterThanOrEqual(64);
    expect(first.jwtSecret).not.toBe(second.jwtSecret);
  });

  describe('with a file of secrets', () => {
    let folder: string;
    beforeEach(() => {
      folder = mkdtempSync(join(tmpdir(), 'noonwell-settings-'));
    });
    afterEach(() => {
      rmSync(folder, { recursive: true });
    });
    const withFile = (text: string, mode: number) => {
      const file = join(folder, 'secrets.json');
      writeFileSync(file, text);
      chmodSync(file, mode);
      return () => readSettings({ DATABASE_URL, NODE_ENV: 'production', NOONWELL_SECRETS_FILE: file });
    };

    it('reads it', () => {
      expect(withFile(JSON.stringify({ jwtSecret: SECRET }), 0o600)().jwtSecret).toBe(SECRET);
    });
    it('refuses one that others can read', () => {
      expect(withFile(JSON.stringify({ jwtSecret: SECRET }), 0o644)).toThrow('0600');
    });
    it('refuses one it cannot use, without quoting it', () => {
      const read = withFile('{"jwtSecret": "too short", "x": ', 0o600);
      expect(read).toThrow(SettingsError);
      expect(read).not.toThrow('too short');
    });
  });
});
