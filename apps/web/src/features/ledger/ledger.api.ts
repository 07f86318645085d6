import type { components } from '@proofplate/api-client';
import { useCallback } from 'react';
import type { SWRResponse } from 'swr';
import useSWRInfinite from 'swr/infinite';
import { api, type ProblemError, type Query, request } from '../../lib/api';
import { saveTextFile } from '../../lib/save-file';
import { useRead } from '../../lib/swr';
import type { LedgerFilters } from './ledger-filters';

type Schemas = components['schemas'];

export type LedgerEvent = Schemas['LedgerEventDto'];
export type LedgerActor = Schemas['LedgerActorDto'];
export type Verification = Schemas['LedgerVerificationDto'];
type LedgerPage = Schemas['LedgerPageDto'];

const LEDGER = '/api/ledger';
const PAGE_SIZE = 50;

/** Events newest first, in pages that are added one after the other. */
export function useLedger(filters: LedgerFilters) {
  const {
    data,
    error,
    isValidating,
    mutate: again,
    size,
    setSize,
  } = useSWRInfinite<LedgerPage, ProblemError>(
    (index: number, before: LedgerPage | null) => {
      if (before?.nextCursor === null) return null;
      return [LEDGER, { ...filters, limit: PAGE_SIZE, cursor: index === 0 ? undefined : before?.nextCursor }];
    },
    ([path, query]: [string, Query]) => request<LedgerPage>('get', path, { query }),
    { revalidateFirstPage: false },
  );
  const showMore = useCallback(() => void setSize(size + 1), [setSize, size]);
  const hasMore = typeof data?.at(-1)?.nextCursor === 'string';
  return { pages: data, error, isValidating, retry: () => void again(), showMore, hasMore };
}

export function useLedgerActors(): SWRResponse<Schemas['LedgerActorsDto'], ProblemError> {
  return useRead<Schemas['LedgerActorsDto']>(`${LEDGER}/actors`);
}

export function verifyChain(): Promise<Verification> {
  return request<Verification>('post', `${LEDGER}/verify`);
}

/** Plain links carry no session, so the file is fetched with it and handed to the browser. */
export async function downloadLedger(form: 'csv' | 'json', filters: LedgerFilters): Promise<void> {
  const query = Object.fromEntries(Object.entries(filters).filter(([, value]) => value !== undefined));
  if (form === 'csv') {
    const { data = '' } = await api.GET('/api/ledger/export.csv', { params: { query }, parseAs: 'text' });
    return saveTextFile('ledger.csv', data);
  }
  const { data = '' } = await api.GET('/api/ledger/export.json', { params: { query }, parseAs: 'text' });
  return saveTextFile('ledger.json', data, 'application/json;charset=utf-8');
}
