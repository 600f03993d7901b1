import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import S3rver from 's3rver';

/** A store that speaks S3, on this machine and a free port. */
export interface BucketServer {
  /** Settings that lead to its bucket, as the environment names them. */
  environment: Record<string, string>;
  close(): Promise<void>;
}

/** Starts one with an empty bucket in a folder of its own. */
export async function startBucketServer(): Promise<BucketServer> {
  const directory = mkdtempSync(join(tmpdir(), 'underseam-bucket-'));
  const server = new S3rver({
    address: '127.0.0.1',
    port: 0,
    silent: true,
    directory,
    configureBuckets: [{ name: 'photos' }],
  });
  const { port } = await server.run();
  return {
    environment: {
      UNDERSEAM_S3_ENDPOINT: `http://127.0.0.1:${port}`,
      UNDERSEAM_S3_BUCKET: 'photos',
      UNDERSEAM_S3_REGION: 'local',
      // The one pair that this server knows, told in its own guide.
      UNDERSEAM_S3_KEY_ID: 'S3RVER',
      UNDERSEAM_S3_SECRET: 'S3RVER',
    },
    close: async () => {
      await server.close();
      rmSync(directory, { recursive: true, force: true });
    },
  };
}
