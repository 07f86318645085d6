import { createHash } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type Readable, Transform, type TransformCallback } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { type PhotoFormat, SNIFF_BYTES, sniffPhotoFormat } from './photo-format';
import { HeicPhotoError, PhotoFileMissingError, PhotoTooLargeError, UnsupportedPhotoError } from './photos.errors';

export type ReceivedFile = {
  readonly path: string;
  readonly sha256: string;
  readonly bytes: number;
  readonly contentType: `image/${PhotoFormat}`;
  readonly discard: () => Promise<void>;
};

/**
 * Writes an upload to a file of its own while hashing it. The first bytes decide: what is no photo is refused before the rest is read.
 *
 * @param isCutOff tells, after the end, whether the limit on bytes cut the stream
 */
export async function receivePhotoFile(upload: Readable, isCutOff: () => boolean): Promise<ReceivedFile> {
  const folder = await mkdtemp(join(tmpdir(), 'upload-'));
  const discard = () => rm(folder, { recursive: true, force: true });
  const path = join(folder, 'received');
  const examiner = new PhotoExaminer();
  try {
    await pipeline(upload, examiner, createWriteStream(path, { flags: 'wx', mode: 0o600 }));
    if (isCutOff()) throw new PhotoTooLargeError();
    return { path, ...examiner.findings(), discard };
  } catch (error) {
    await discard();
    throw error;
  }
}

/** Lets bytes through once their head looks like a photo. */
class PhotoExaminer extends Transform {
  private readonly hash = createHash('sha256');
  private head = Buffer.alloc(0);
  private format: PhotoFormat | undefined;
  private bytes = 0;

  override _transform(chunk: Buffer, _encoding: BufferEncoding, done: TransformCallback): void {
    this.bytes += chunk.length;
    this.hash.update(chunk);
    if (this.format !== undefined) {
      done(null, chunk);
      return;
    }
    this.head = Buffer.concat([this.head, chunk]);
    if (this.head.length < SNIFF_BYTES) done();
    else done(this.judgeHead(), this.head);
  }

  /** A file shorter than the head is judged at its end. */
  override _flush(done: TransformCallback): void {
    if (this.format !== undefined) done();
    else done(this.bytes === 0 ? new PhotoFileMissingError('The file is empty. Send the photo again.') : this.judgeHead(), this.head);
  }

  findings(): { sha256: string; bytes: number; contentType: `image/${PhotoFormat}` } {
    if (this.format === undefined) throw new UnsupportedPhotoError();
    return { sha256: this.hash.digest('hex'), bytes: this.bytes, contentType: `image/${this.format}` };
  }

  /** The refusal, or null when the head is that of a photo. */
  private judgeHead(): Error | null {
    const format = sniffPhotoFormat(this.head.subarray(0, SNIFF_BYTES));
    if (format === 'heic') return new HeicPhotoError();
    if (format === 'other') return new UnsupportedPhotoError();
    this.format = format;
    return null;
  }
}
