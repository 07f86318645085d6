export { cell, cellRating, coupon, couponCorrection, measurement, photo, testGrid } from './coupons';
export { ledgerEvent, ledgerHead } from './ledger';
export { lens, machine, machineLens, machineProfile, powerCalibration } from './machines';
export {
  type CautionScopeRow,
  type CriterionRow,
  caution,
  effect,
  finish,
  material,
  materialGroup,
  materialGroupMaterial,
} from './materials';
export { accountEvent, invitation, member, passwordReset, person, refreshToken, session, signInThrottle, trainingRecord } from './people';
export { recipe, revision, revisionEvidence, revisionNow, signOff } from './recipes';
export { deviation, hold, partSetUp, run, settingRequest } from './runs';
export { codeCounter, idempotencyKey, outbox, type ShopPolicyRow, shop } from './shops';
export { spotMeasurement } from './spots';
export { loggedTime } from './times';
