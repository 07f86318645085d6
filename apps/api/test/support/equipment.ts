import { randomUUID } from 'node:crypto';
import type { LensDto } from '../../src/lenses/dto/lens.dto';
import type { MachineDto } from '../../src/machines/dto/machine.dto';
import type { CautionDto } from '../../src/materials/dto/caution.dto';
import type { EffectDto } from '../../src/materials/dto/effect.dto';
import type { FinishDto } from '../../src/materials/dto/finish.dto';
import type { MaterialDto } from '../../src/materials/dto/material.dto';
import { ShopStarterContent } from '../../src/shops/shop-starter-content';
import type { TestApp } from './app';
import type { TestMember } from './factories';
import { newKey } from './idempotency';

type Given = Readonly<Record<string, unknown>>;
const anyName = (kind: string) => `${kind} ${randomUUID().slice(0, 8)}`;

/** Request body of a fibre machine whose panel shows power, speed, frequency and spacing. */
export const fibreMachine = (given: Given = {}) => ({
  name: anyName('Fibre'),
  serialNumber: 'F-1001',
  warmUpMinutes: 10,
  physical: {
    sourceKind: 'fibre-q-switched',
    wavelengthNm: 1064,
    ratedPowerW: 20,
    m2: 1.5,
    beamDiameterMm: 7,
    frequencyRangeKhz: { from: 20, to: 80 },
    maxPulseEnergyMj: [{ pulseWidthNs: null, energyMj: 1 }],
    topSpeedMmPerS: 7000,
  },
  panel: {
    fields: [
      { parameter: 'powerPercent', label: 'POWER', unit: 'percentFromZero', minimum: 0, maximum: 100, step: 0.5 },
      { parameter: 'speedMmPerS', label: 'SPEED', unit: 'mm/s', minimum: 1, maximum: 7000, step: 1 },
      { parameter: 'frequencyKhz', label: 'FREQ', unit: 'kHz', minimum: 20, maximum: 80, step: 0.1 },
      { parameter: 'lineSpacingUm', label: 'LINE', unit: 'mm', minimum: 0.001, maximum: 1, step: 0.001 },
    ],
  },
  ...given,
});

/** POST as a member; fails the test unless the answer is 201. */
export async function created<Dto>(test: TestApp, member: TestMember, url: string, payload: Given): Promise<Dto> {
  const answer = await test.app.inject({ method: 'POST', url, headers: { ...member.headers, ...newKey() }, payload });
  if (answer.statusCode !== 201) throw new Error(`${url} answered ${answer.statusCode}: ${answer.body}`);
  return answer.json<Dto>();
}

export const makeMachine = (test: TestApp, lead: TestMember, given: Given = {}) =>
  created<MachineDto>(test, lead, '/api/machines', fibreMachine(given));

export const makeLens = (test: TestApp, lead: TestMember, given: Given = {}) =>
  created<LensDto>(test, lead, '/api/lenses', { name: anyName('Lens'), focalLengthMm: 163, fieldSizeMm: 110, ...given });

export const makeMaterial = (test: TestApp, lead: TestMember, given: Given = {}) =>
  created<MaterialDto>(test, lead, '/api/materials', { name: anyName('Sheet'), family: 'stainless steel', ...given });

export const makeFinish = (test: TestApp, lead: TestMember, given: Given = {}) =>
  created<FinishDto>(test, lead, '/api/finishes', { name: anyName('Brushed'), ...given });

/** Puts the shipped cautions and effects into the member's shop, as sign-up does. */
export async function fillStarterContent(test: TestApp, owner: TestMember): Promise<void> {
  const { shopId, id: memberId, personId, printedName, role } = owner;
  const actor = { shopId, memberId, personId, printedName, role };
  await test.unitOfWork.run(actor, (tx) => test.app.get(ShopStarterContent, { strict: false }).fill(tx, actor));
}

export async function effectByKey(test: TestApp, member: TestMember, key: string): Promise<EffectDto> {
  const answer = await test.app.inject({ url: '/api/effects?limit=100', headers: member.headers });
  const found = answer.json<{ items: EffectDto[] }>().items.find((effect) => effect.key === key);
  if (found === undefined) throw new Error(`the shop has no effect ${key}`);
  return found;
}

export async function allCautions(test: TestApp, member: TestMember): Promise<CautionDto[]> {
  const answer = await test.app.inject({ url: '/api/cautions', headers: member.headers });
  return answer.json<{ items: CautionDto[] }>().items;
}

/** Header fields of an edit of that version. */
export const editing = (member: TestMember, version: number) => ({ ...member.headers, 'if-match': `"v${version}"` });
