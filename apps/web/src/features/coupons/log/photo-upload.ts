import { ProblemError } from '../../../lib/api';
import { currentAccessToken, refreshSession } from '../../../lib/session';

export type UploadOptions = {
  path: string;
  file: File;
  /** Share of the bytes that went out, 0 to 1. */
  onProgress: (share: number) => void;
  signal: AbortSignal;
};

/** Sends one photo; XMLHttpRequest, because fetch tells nothing of what went out. @throws ProblemError, or AbortError when cancelled */
export async function uploadPhoto(options: UploadOptions): Promise<void> {
  const first = await send(options);
  if (first.status === 401 && (await refreshSession())) return accept(await send(options));
  return accept(first);
}

type Answer = { status: number; text: string };

function send({ path, file, onProgress, signal }: UploadOptions): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', path);
    const token = currentAccessToken();
    if (token !== undefined) request.setRequestHeader('Authorization', `Bearer ${token}`);
    request.upload.onprogress = ({ loaded, total }) => onProgress(total === 0 ? 0 : loaded / total);
    request.onload = () => resolve({ status: request.status, text: request.responseText });
    request.onerror = () => reject(ProblemError.unreachable());
    request.onabort = () => reject(new DOMException('The upload was cancelled', 'AbortError'));
    signal.addEventListener('abort', () => request.abort(), { once: true });
    const form = new FormData();
    form.append('file', file);
    request.send(form);
  });
}

function accept({ status, text }: Answer): void {
  if (status >= 200 && status < 300) return;
  const body = problemBody(text);
  const words = (key: string, fallback: string) => (typeof body[key] === 'string' ? String(body[key]) : fallback);
  throw new ProblemError(
    {
      type: words('type', 'about:blank'),
      status,
      code: words('type', `http-${status}`).replace('/problems/', ''),
      title: words('title', 'The photo was refused'),
      detail: words('detail', `The answer was ${status}.`),
      errors: [],
    },
    body,
  );
}

function problemBody(text: string): Record<string, unknown> {
  try {
    const body: unknown = JSON.parse(text);
    return typeof body === 'object' && body !== null ? { ...body } : {};
  } catch {
    return {};
  }
}
