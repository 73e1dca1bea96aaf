import { join } from 'node:path';
import { Disk } from 'flydrive';
import { FSDriver } from 'flydrive/drivers/fs';
import type { Bucket, Config } from '../config';
import { app } from '../context';
import { Refusal } from '../refusal';

/**
 * Where pictures lie: in the data folder, or in a bucket. Nothing else knows which. Files are only ever handed out by our own
 * server, after it asked whether somebody may see them.
 */

async function inBucket({ name, endpoint, region, keys, pathStyle }: Bucket): Promise<Disk> {
  // Loaded only where it is used: the client is larger than all else that the server loads.
  const { S3Driver } = await import('flydrive/drivers/s3');
  return new Disk(
    new S3Driver({
      bucket: name,
      region,
      ...(endpoint === null ? {} : { endpoint }),
      ...(keys === null ? {} : { credentials: { accessKeyId: keys.id, secretAccessKey: keys.secret } }),
      forcePathStyle: pathStyle,
      visibility: 'private',
      // What may be seen is decided by us; many services have no access lists at all.
      supportsACL: false,
      // The newer checksums are unknown to many services, and some store them as part of the file.
      requestChecksumCalculation: 'WHEN_REQUIRED',
      responseChecksumValidation: 'WHEN_REQUIRED',
      maxAttempts: 2,
      requestHandler: { connectionTimeout: 3000, requestTimeout: 20_000 },
    }),
  );
}

const inFolder = (dataDir: string): Disk =>
  new Disk(new FSDriver({ location: join(dataDir, 'files'), visibility: 'private' }));

const disks = new WeakMap<Config, Promise<Disk>>();

async function disk(): Promise<Disk> {
  const { config } = await app();
  const made =
    disks.get(config) ?? (config.bucket ? inBucket(config.bucket) : Promise.resolve(inFolder(config.dataDir)));
  disks.set(config, made);
  return made;
}

/** The store fails or cannot be reached. Nothing was kept; trying again may help. */
export const storeFails = (cause: unknown) =>
  new Refusal(
    503,
    'photo-storage',
    'Photos cannot be kept now',
    'Photos cannot be stored or fetched at the moment. What you typed is kept: try again in a minute, or send it without photos.',
    { headers: { 'Retry-After': '30' }, cause },
  );

async function reach<T>(act: (to: Disk) => Promise<T>): Promise<T> {
  try {
    return await act(await disk());
  } catch (error) {
    throw storeFails(error);
  }
}

/** Puts a file under a key of ours. Refuses 503 where the store fails. */
export const putFile = (key: string, bytes: Uint8Array, contentType: string): Promise<void> =>
  reach((to) => to.put(key, bytes, { contentType }));

/** The bytes of a file. Refuses 503 where the store fails or has lost it. */
export const readFile = (key: string): Promise<Uint8Array> => reach((from) => from.getBytes(key));

/** Deletes files; one that is not there counts as deleted. Refuses 503 where the store fails. */
export const deleteFiles = (keys: readonly string[]): Promise<void> =>
  reach(async (from) => {
    for (const key of keys) await from.delete(key);
  });
