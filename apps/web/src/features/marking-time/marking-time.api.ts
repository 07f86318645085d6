import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];
export type LoggedTime = Schemas['LoggedTimeDto'];
export type MachineTimes = Schemas['MachineMarkingTimeDto'];
export type RunTimes = Schemas['RunTimesDto'];
export type CouponTimes = Schemas['CouponTimesDto'];
export type SettingTiming = Schemas['SettingTimingDto'];
export type Correction = Schemas['CorrectLoggedTimeDto'];

const ofMachine = (id: string) => `/api/machines/${encodeURIComponent(id)}/logged-times`;
const ofRun = (id: string) => `/api/runs/${encodeURIComponent(id)}/logged-times`;
const ofCoupon = (id: string) => `/api/coupons/${encodeURIComponent(id)}/logged-times`;

export const useMachineTimes = (machineId: string): SWRResponse<MachineTimes, ProblemError> => useRead<MachineTimes>(ofMachine(machineId));
export const useRunTimes = (runId: string): SWRResponse<RunTimes, ProblemError> => useRead<RunTimes>(ofRun(runId));
export const useCouponTimes = (couponId: string): SWRResponse<CouponTimes, ProblemError> => useRead<CouponTimes>(ofCoupon(couponId));
export const useSettingTiming = (revisionId: string): SWRResponse<SettingTiming, ProblemError> =>
  useRead<SettingTiming>(`/api/runs/timing/${encodeURIComponent(revisionId)}`);

export async function logRunTime(runId: string, body: Schemas['LogRunTimeDto'], idempotencyKey: string): Promise<LoggedTime> {
  const logged = await request<LoggedTime>('post', ofRun(runId), { body, idempotencyKey });
  await revalidate(ofRun(runId));
  return logged;
}

export async function logCouponTime(couponId: string, body: Schemas['LogCouponTimeDto'], idempotencyKey: string): Promise<LoggedTime> {
  const logged = await request<LoggedTime>('post', ofCoupon(couponId), { body, idempotencyKey });
  await revalidate(ofCoupon(couponId));
  return logged;
}

export async function correctTime(machineId: string, loggedTimeId: string, body: Correction, idempotencyKey: string): Promise<LoggedTime> {
  const url = `${ofMachine(machineId)}/${encodeURIComponent(loggedTimeId)}/corrections`;
  const corrected = await request<LoggedTime>('post', url, { body, idempotencyKey });
  await revalidate(ofMachine(machineId), '/api/runs/', '/api/coupons/');
  return corrected;
}
