import { isAbsolute, resolve } from 'node:path';
import { z } from 'zod';

const empty = (value: unknown) => (value === '' ? undefined : value);
const set = <T extends z.ZodTypeAny>(schema: T) => z.preprocess(empty, schema);

const Environment = z.object({
  PORT: set(
    z.coerce
      .number({ invalid_type_error: 'PORT must be a number, for example 4321.' })
      .int('PORT must be a whole number.')
      .min(0, 'PORT must be 0 or more.')
      .max(65_535, 'PORT must be 65535 or less.')
      .default(4321),
  ),
  HOST: set(z.string().default('127.0.0.1')),
  DATA_DIR: set(z.string().default('./data')),
  CONTENT_DIR: set(z.string().default('./content')),
  APP_ORIGIN: set(
    z
      .string()
      .url('APP_ORIGIN must be an address with scheme, for example https://book.example.')
      .refine((value) => URL.canParse(value) && new URL(value).origin === value.replace(/\/$/, ''), {
        message: 'APP_ORIGIN must be scheme, host and port only, without a path.',
      })
      .refine((value) => /^https?:/.test(value), 'APP_ORIGIN must begin with http:// or https://.')
      .transform((value) => new URL(value).origin)
      .optional(),
  ),
  DEMO: set(
    z
      .enum(['0', '1'], { errorMap: () => ({ message: 'DEMO must be 1, 0 or empty.' }) })
      .default('0')
      .transform((value) => value === '1'),
  ),
  S3_BUCKET: set(z.string().optional()),
  S3_ENDPOINT: set(
    z.string().url('S3_ENDPOINT must be an address with scheme, for example https://s3.example.').optional(),
  ),
  S3_REGION: set(z.string().default('us-east-1')),
  S3_ACCESS_KEY_ID: set(z.string().optional()),
  S3_SECRET_ACCESS_KEY: set(z.string().optional()),
  S3_FORCE_PATH_STYLE: set(
    z
      .enum(['0', '1'], { errorMap: () => ({ message: 'S3_FORCE_PATH_STYLE must be 1, 0 or empty.' }) })
      .default('0')
      .transform((value) => value === '1'),
  ),
});

/** Where photos lie when they do not lie in the data folder: a bucket of any service that speaks S3. */
export interface Bucket {
  name: string;
  /** Null for Amazon's own. */
  endpoint: string | null;
  region: string;
  /** Null where the environment of the machine gives them, for example its role. */
  keys: { id: string; secret: string } | null;
  /** `endpoint/bucket/key` instead of `bucket.endpoint/key`. */
  pathStyle: boolean;
}

function bucketOf(read: z.output<typeof Environment>): Bucket | null {
  const { S3_BUCKET, S3_ENDPOINT, S3_REGION, S3_ACCESS_KEY_ID: id, S3_SECRET_ACCESS_KEY: secret } = read;
  if ((id === undefined) !== (secret === undefined))
    throw new Error('Set S3_ACCESS_KEY_ID and S3_SECRET_ACCESS_KEY both, or neither.');
  if (S3_BUCKET === undefined) {
    if (S3_ENDPOINT !== undefined || id !== undefined)
      throw new Error('S3_BUCKET is missing: name the bucket for photos.');
    return null;
  }
  return {
    name: S3_BUCKET,
    endpoint: S3_ENDPOINT ?? null,
    region: S3_REGION,
    keys: id === undefined || secret === undefined ? null : { id, secret },
    pathStyle: read.S3_FORCE_PATH_STYLE,
  };
}

export interface Config {
  port: number;
  host: string;
  /** Absolute paths. */
  dataDir: string;
  contentDir: string;
  /** Scheme, host and port that people type; null where the address listened on is used. */
  origin: string | null;
  /** The demonstration network is loaded and its people sign in with one press. */
  demo: boolean;
  /** Where photos are kept; null for the data folder. */
  bucket: Bucket | null;
}

/** Reads the settings once. Throws an error whose message says, a line each, what to set right. */
export function readConfig(env: Record<string, string | undefined> = process.env): Config {
  const read = Environment.safeParse(env);
  if (!read.success) throw new Error(read.error.issues.map((issue) => issue.message).join('\n'));
  const { PORT, HOST, DATA_DIR, CONTENT_DIR, APP_ORIGIN, DEMO } = read.data;
  const absolute = (path: string) => (isAbsolute(path) ? path : resolve(process.cwd(), path));
  return {
    port: PORT,
    host: HOST,
    dataDir: absolute(DATA_DIR),
    contentDir: absolute(CONTENT_DIR),
    origin: APP_ORIGIN ?? null,
    demo: DEMO,
    bucket: bucketOf(read.data),
  };
}
