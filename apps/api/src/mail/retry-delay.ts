/** After an outage of minutes every mail goes out within one of them; a server that is gone for long is asked less often. */
const SHORT_CAP_S = 45;
const LONG_CAP_S = 300;
const PATIENT_AFTER_ATTEMPTS = 60;
const GIVE_UP_AFTER_MS = 48 * 3600 * 1000;

/**
 * Seconds until the next try: doubling from 2 s to the cap, shortened at random so that mails that failed together do not come back together.
 *
 * @param attempts tries so far, >= 1
 * @param random   in [0, 1)
 */
export function retryDelayS(attempts: number, random: number): number {
  const capS = attempts > PATIENT_AFTER_ATTEMPTS ? LONG_CAP_S : SHORT_CAP_S;
  const delayS = Math.min(capS, 2 ** Math.min(attempts, 16));
  return Math.max(1, Math.round(delayS * (0.5 + random / 2)));
}

export function isPastPatience(writtenAt: Date, now: Date): boolean {
  return now.getTime() - writtenAt.getTime() > GIVE_UP_AFTER_MS;
}
