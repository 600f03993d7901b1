import type * as S3 from '@aws-sdk/client-s3';
import type { BucketSettings } from '../config';
import type { PhotoStore } from './photo-store';

type Library = typeof S3;

/** Photos as objects of a bucket in any store that speaks S3. The client is loaded with the first photo, to start quickly. */
export class BucketPhotoStore implements PhotoStore {
  private opened: Promise<{ library: Library; client: S3.S3Client }> | undefined;

  constructor(private readonly settings: BucketSettings) {}

  async put(key: string, bytes: Buffer): Promise<void> {
    const { library, client } = await this.open();
    await client.send(
      new library.PutObjectCommand({
        Bucket: this.settings.bucket,
        Key: key,
        Body: bytes,
        ContentType: 'image/jpeg',
      }),
    );
  }

  async get(key: string): Promise<Buffer | undefined> {
    const { library, client } = await this.open();
    const { bucket } = this.settings;
    try {
      const found = await client.send(new library.GetObjectCommand({ Bucket: bucket, Key: key }));
      return found.Body && Buffer.from(await found.Body.transformToByteArray());
    } catch (error) {
      if (error instanceof library.NoSuchKey) return undefined;
      throw error;
    }
  }

  async remove(key: string): Promise<void> {
    const { library, client } = await this.open();
    await client.send(new library.DeleteObjectCommand({ Bucket: this.settings.bucket, Key: key }));
  }

  /** Lets go of the connections. */
  async close(): Promise<void> {
    if (this.opened) (await this.opened).client.destroy();
  }

  private open(): Promise<{ library: Library; client: S3.S3Client }> {
    this.opened ??= import('@aws-sdk/client-s3').then((library) => ({
      library,
      client: new library.S3Client(clientSettings(this.settings)),
    }));
    return this.opened;
  }
}

function clientSettings({ endpoint, region, keyId, secret }: BucketSettings): object {
  return {
    endpoint,
    region,
    // Not every store gives each bucket a host name of its own.
    forcePathStyle: true,
    credentials: { accessKeyId: keyId, secretAccessKey: secret },
    // Stores that are not the original often do not know its newer checksums.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    requestHandler: { connectionTimeout: 5_000, requestTimeout: 30_000 },
  };
}
