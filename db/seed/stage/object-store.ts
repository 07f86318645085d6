import { CreateBucketCommand, HeadBucketCommand, PutObjectCommand, S3Client } from '@aws-sdk/client-s3';

export type ObjectStoreSettings = {
  readonly endpoint: string;
  readonly bucket: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
};
export type ObjectStore = { readonly put: (key: string, bytes: Buffer, contentType: string) => Promise<void>; readonly close: () => void };

/** The store that the api reads photos from. Its bucket is made if nobody has made it yet. */
export async function openObjectStore({ endpoint, bucket, ...credentials }: ObjectStoreSettings): Promise<ObjectStore> {
  const client = new S3Client({
    ...{ endpoint, credentials },
    region: 'us-east-1',
    forcePathStyle: true,
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
  const isThere = await client.send(new HeadBucketCommand({ Bucket: bucket })).then(
    () => true,
    () => false,
  );
  if (!isThere) await client.send(new CreateBucketCommand({ Bucket: bucket }));
  return {
    put: async (key, bytes, contentType) => {
      await client.send(
        new PutObjectCommand({ Bucket: bucket, Key: key, Body: bytes, ContentLength: bytes.length, ContentType: contentType }),
      );
    },
    close: () => client.destroy(),
  };
}

/** The api's name for what is kept: the shop and the content's own hash. */
export const keptObjectKey = (shopId: string, sha256: string) => `shop/${shopId}/${sha256}`;
