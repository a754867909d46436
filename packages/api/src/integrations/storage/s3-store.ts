import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  NoSuchKey,
  NotFound,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3';
import type { FileStore } from './storage.ts';
import { checkedKey } from './storage.ts';

export interface S3Place {
  bucket: string;
  region: string;
  /** For services that speak S3 elsewhere; the bucket is then named in the path. */
  endpoint: string | null;
  /** Left out: what the SDK finds by itself. */
  credentials: { accessKeyId: string; secretAccessKey: string } | null;
}

/** Files in a private bucket; the bucket must refuse the public. */
export function s3Store({ bucket, region, endpoint, credentials }: S3Place): FileStore {
  const client = new S3Client({
    region,
    ...(endpoint && { endpoint, forcePathStyle: true }),
    ...(credentials && { credentials }),
  });
  const place = (key: string) => ({ Bucket: bucket, Key: checkedKey(key) });
  return {
    async put(key, content) {
      await client.send(
        new PutObjectCommand({ ...place(key), Body: content, ContentType: 'application/octet-stream' }),
      );
    },
    async get(key) {
      try {
        const { Body } = await client.send(new GetObjectCommand(place(key)));
        return Body ? await Body.transformToByteArray() : null;
      } catch (error) {
        if (error instanceof NoSuchKey) return null;
        throw error;
      }
    },
    async has(key) {
      try {
        await client.send(new HeadObjectCommand(place(key)));
        return true;
      } catch (error) {
        if (error instanceof NotFound) return false;
        throw error;
      }
    },
    async remove(key) {
      await client.send(new DeleteObjectCommand(place(key)));
    },
  };
}
