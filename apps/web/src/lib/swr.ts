import useSWR, { mutate, type SWRConfiguration, type SWRResponse } from 'swr';
import { ProblemError, type Query, request } from './api';

/** Cache key of a read: path and query. */
export type ReadKey = readonly [path: string, query?: Query];

/** Reads `path` with `query` and keeps it fresh; `null` reads nothing. */
export function useRead<T>(path: string | null, query?: Query, options?: SWRConfiguration<T, ProblemError>): SWRResponse<T, ProblemError> {
  return useSWR<T, ProblemError, ReadKey | null>(
    path === null ? null : [path, query],
    ([from, by]) => request<T>('get', from, { query: by }),
    options,
  );
}

/** Reads again everything below one of the paths, whatever the query. */
export async function revalidate(...pathPrefixes: readonly string[]): Promise<void> {
  await mutate((key) => Array.isArray(key) && typeof key[0] === 'string' && pathPrefixes.some((prefix) => key[0].startsWith(prefix)));
}

/** Forgets everything that was read: the next person at this screen must see nothing of the last one's. */
export async function forgetAllReads(): Promise<void> {
  await mutate(() => true, undefined, { revalidate: false });
}

export const swrDefaults: SWRConfiguration = {
  // A refusal will not change by asking again; a lost connection may.
  shouldRetryOnError: (error: unknown) => !(error instanceof ProblemError) || error.status === 0 || error.status >= 500,
  errorRetryCount: 3,
  revalidateOnFocus: true,
  keepPreviousData: true,
};
