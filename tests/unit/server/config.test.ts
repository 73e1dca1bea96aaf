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

test('a bucket for photos is taken whole, or not at all', () => {
  expect(readConfig({ S3_BUCKET: '' }).bucket).toBeNull();
  expect(readConfig({ S3_BUCKET: 'photos' }).bucket).toEqual({
    name: 'photos',
    endpoint: null,
    region: 'us-east-1',
    keys: null,
    pathStyle: false,
  });
  expect(
    readConfig({
      S3_BUCKET: 'photos',
      S3_ENDPOINT: 'http://localhost:9000',
      S3_REGION: 'eu-north-1',
      S3_ACCESS_KEY_ID: 'a',
      S3_SECRET_ACCESS_KEY: 'b',
      S3_FORCE_PATH_STYLE: '1',
    }).bucket,
  ).toEqual({
    name: 'photos',
    endpoint: 'http://localhost:9000',
    region: 'eu-north-1',
    keys: { id: 'a', secret: 'b' },
    pathStyle: true,
  });
});

test.each([
  [{ PORT: 'many' }, 'PORT must be a number, for example 4321.'],
  [{ PORT: '70000' }, 'PORT must be 65535 or less.'],
  [{ DEMO: 'yes' }, 'DEMO must be 1, 0 or empty.'],
  [{ APP_ORIGIN: 'book.example' }, 'APP_ORIGIN must be an address with scheme, for example https://book.example.'],
  [{ APP_ORIGIN: 'https://book.example/book' }, 'APP_ORIGIN must be scheme, host and port only, without a path.'],
  [{ S3_BUCKET: 'photos', S3_ACCESS_KEY_ID: 'a' }, 'Set S3_ACCESS_KEY_ID and S3_SECRET_ACCESS_KEY both, or neither.'],
  [{ S3_ENDPOINT: 'https://s3.example' }, 'S3_BUCKET is missing: name the bucket for photos.'],
  [{ S3_BUCKET: 'photos', S3_ENDPOINT: 's3' }, 'S3_ENDPOINT must be an address with scheme'],
  [{ S3_FORCE_PATH_STYLE: 'yes' }, 'S3_FORCE_PATH_STYLE must be 1, 0 or empty.'],
  [{ APP_ORIGIN: 'ftp://book.example' }, 'APP_ORIGIN must begin with http:// or https://.'],
])('%j is refused: %s', (env, sentence) => expect(() => readConfig(env)).toThrow(sentence));
