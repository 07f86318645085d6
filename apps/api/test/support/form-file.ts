import { Readable } from 'node:stream';

const BOUNDARY = '----------------------------proofplate';

/** One file as form data, the way a browser sends it. `isStreamed`: without a content length, so only the stream shows its size. */
export function formFile(bytes: Buffer, { field = 'file', name = 'plate.jpg', type = 'image/jpeg', isStreamed = false } = {}) {
  const head = `--${BOUNDARY}\r\nContent-Disposition: form-data; name="${field}"; filename="${name}"\r\nContent-Type: ${type}\r\n\r\n`;
  const body = Buffer.concat([Buffer.from(head), bytes, Buffer.from(`\r\n--${BOUNDARY}--\r\n`)]);
  return { payload: isStreamed ? Readable.from([body]) : body, headers: { 'content-type': `multipart/form-data; boundary=${BOUNDARY}` } };
}
