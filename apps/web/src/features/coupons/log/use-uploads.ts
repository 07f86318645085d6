import { useCallback, useEffect, useRef, useState } from 'react';
import { ProblemError } from '../../../lib/api';
import { photosPath, readPhotosAgain } from './log.api';
import { uploadPhoto } from './photo-upload';

export type Upload = {
  key: number;
  name: string;
  /** Share of the bytes that went out, 0 to 1. */
  share: number;
  problem: ProblemError | undefined;
};

const LARGEST_BYTES = 25 * 1024 * 1024;
const TOO_LARGE = new ProblemError({
  type: '/problems/too-large',
  status: 413,
  code: 'too-large',
  title: 'This is too large',
  detail: 'A photo may have 25 MB at most. Set the camera to a smaller size, or save the photo as JPEG, and send it again.',
  errors: [],
});

let lastKey = 0;

/** Uploads of a coupon, one after the other, each with its progress; a refused one stays until it is put away or another photo arrived. */
export function useUploads(couponId: string) {
  const [uploads, setUploads] = useState<readonly Upload[]>([]);
  const controllers = useRef(new Map<number, AbortController>());
  const chain = useRef(Promise.resolve());
  const change = useCallback(
    (key: number, part: Partial<Upload>) => setUploads((all) => all.map((each) => (each.key === key ? { ...each, ...part } : each))),
    [],
  );
  const drop = useCallback((key: number) => {
    controllers.current.get(key)?.abort();
    controllers.current.delete(key);
    setUploads((all) => all.filter((each) => each.key !== key));
  }, []);

  const sendOne = useCallback(
    async (key: number, file: File) => {
      const controller = controllers.current.get(key);
      if (controller === undefined) return;
      try {
        await uploadPhoto({ path: photosPath(couponId), file, signal: controller.signal, onProgress: (share) => change(key, { share }) });
        await readPhotosAgain(couponId);
        drop(key);
        // the good photo answers the failed one before it; its words would stand beside what is mended
        setUploads((all) => all.filter((each) => each.problem === undefined || each.key > key));
      } catch (error) {
        if (error instanceof ProblemError) change(key, { problem: error });
        else if (!(error instanceof DOMException && error.name === 'AbortError')) throw error;
      }
    },
    [couponId, change, drop],
  );

  const add = useCallback(
    (files: readonly File[]) => {
      for (const file of files) {
        lastKey += 1;
        const key = lastKey;
        const isTooLarge = file.size > LARGEST_BYTES;
        setUploads((all) => [...all, { key, name: file.name, share: 0, problem: isTooLarge ? TOO_LARGE : undefined }]);
        if (isTooLarge) continue;
        controllers.current.set(key, new AbortController());
        chain.current = chain.current.then(() => sendOne(key, file));
      }
    },
    [sendOne],
  );

  useEffect(() => {
    const running = controllers.current;
    return () => {
      for (const controller of running.values()) controller.abort();
    };
  }, []);
  return { uploads, add, drop };
}
