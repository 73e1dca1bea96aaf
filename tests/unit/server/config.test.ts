import { isAbsolute } from 'node:path';
import { expect, test } from 'vitest';
import { readConfig } from '@/server/config';

test('nothing set gives the values of .env.example', () => {
  const config = readConfig({ PORT: '', DEMO: '' });
  expect(config).toMatchObject({ port: 4321, host: '127.0.0.1', origin: null, demo: false });
  expect(isAbsolute(config.dataDir) && config.dataDir.endsWith('data')).toBe(true);
});

test('what is set is taken', () => {
  expect(
    readConfig({ PORT: '8080', HOST: '::', DATA_DIR: '/srv/book', APP_ORIGIN: 'https://book.example/', DEMO: '1' }),
  ).toMatchObject({ port: 8080, host: '::', dataDir: '/srv/book', origin: 'https://book.example', demo: true });
});

test.each([
  [{ PORT: 'many' }, 'PORT must be a number, for example 4321.'],
  [{ PORT: '70000' }, 'PORT must be 65535 or less.'],
  [{ DEMO: 'yes' }, 'DEMO must be 1, 0 or empty.'],
  [{ APP_ORIGIN: 'book.example' }, 'APP_ORIGIN must be an address with scheme, for example https://book.example.'],
  [{ APP_ORIGIN: 'https://book.example/book' }, 'APP_ORIGIN must be scheme, host and port only, without a path.'],
  [{ APP_ORIGIN: 'ftp://book.example' }, 'APP_ORIGIN must begin with http:// or https://.'],
])('%j is refused: %s', (env, sentence) => expect(() => readConfig(env)).toThrow(sentence));
