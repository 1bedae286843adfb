import { ConfigError, readConfig, readOwnerDatabaseUrl } from '../../server/config';

const least = { DATABASE_URL: 'postgres://app@127.0.0.1/db', TOKEN_SECRET: 's'.repeat(32) };

test('what is not set has a default', () => {
  expect(readConfig(least)).toMatchObject({
    host: '127.0.0.1',
    port: 8480,
    publicUrl: 'http://127.0.0.1:8480',
    demo: false,
    smtpUrl: null,
    webDir: 'dist/web',
    tls: null,
    workerPort: 8481,
    frameSeconds: 120,
    childMemoryMb: 1500,
  });
});

test('set but empty counts as not set', () => {
  const config = readConfig({ ...least, PUBLIC_URL: '', SMTP_URL: '', TLS_CERT_FILE: '', TLS_KEY_FILE: '', DEMO: '' });
  expect(config).toMatchObject({ publicUrl: 'http://127.0.0.1:8480', smtpUrl: null, tls: null, demo: false });
});

test('the public address follows from host, port and certificate, or is given', () => {
  const tls = { TLS_CERT_FILE: 'cert.pem', TLS_KEY_FILE: 'key.pem' };
  expect(readConfig({ ...least, ...tls, HOST: '::1', PORT: '9000' }).publicUrl).toBe('https://[::1]:9000');
  expect(readConfig({ ...least, PUBLIC_URL: 'https://rings.example/' }).publicUrl).toBe('https://rings.example');
});

test('everything that is wrong is named at once', () => {
  const wrong = { TOKEN_SECRET: 'short', DATABASE_URL: 'mysql://x', PORT: '99999', TLS_CERT_FILE: 'cert.pem' };
  expect(() => readConfig(wrong)).toThrow(ConfigError);
  expect(() => readConfig(wrong)).toThrow(/DATABASE_URL: must begin with postgres/);
  expect(() => readConfig(wrong)).toThrow(/TOKEN_SECRET: must have at least 32 characters/);
  expect(() => readConfig(wrong)).toThrow(/PORT/);
  expect(() => readConfig({ ...least, TLS_CERT_FILE: 'cert.pem' })).toThrow(/together with TLS_KEY_FILE/);
  expect(() => readOwnerDatabaseUrl({})).toThrow(/OWNER_DATABASE_URL/);
});
