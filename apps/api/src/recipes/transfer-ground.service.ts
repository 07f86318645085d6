import { Injectable } from '@nestjs/common';
import type { TransferPlace } from '@proofplate/recipe-model';
import { InvalidError } from '../common/errors/domain-error';
import type { Tx } from '../database/unit-of-work';
import { CalibrationsService } from '../machines/calibrations.service';
import { asMeasured } from './calibration-checks';
import { RevisionStateError } from './recipes.errors';
import { RevisionRecordsService } from './revision-records.service';
import type { RevisionCalibration, RevisionRecord } from './stored-revision';
import { type PlaceRow, type RecipeThere, TransferPlacesRepository } from './transfer-places.repository';

export type GroundPlace = PlaceRow & { readonly calibrations: readonly RevisionCalibration[] };
export type TransferGround = {
  readonly record: RevisionRecord;
  readonly source: GroundPlace;
  readonly targets: readonly (GroundPlace & { readonly recipes: readonly RecipeThere[] })[];
};

/** Reads from the records what a transfer is worked out from. */
@Injectable()
export class TransferGroundService {
  constructor(
    private readonly records: RevisionRecordsService,
    private readonly places: TransferPlacesRepository,
    private readonly calibrations: CalibrationsService,
  ) {}

  /** @throws RevisionNotFoundError; RevisionStateError for a draft, which may still change */
  async read(tx: Tx, shopId: string, revisionId: string): Promise<TransferGround> {
    const record = await this.records.get(tx, shopId, revisionId);
    if (record.revision.state === 'draft')
      throw new RevisionStateError('A draft still changes. Submit it first: a transfer cites a revision that stays as it is.');
    const { machine, lens, material, finish, effect } = record.recipe;
    const rows = await this.places.places(tx, shopId);
    const machineIds = [...new Set([machine.id, ...rows.map(({ machineId }) => machineId)])];
    const readings = await this.calibrations.readingsOf(tx, shopId, machineIds);
    const recipes = await this.places.recipesOf(tx, shopId, { materialId: material.id, finishId: finish.id, effectId: effect.id });
    const readingsAt = (machineId: string) => readings.filter((reading) => reading.machineId === machineId);
    const { profile, optics, calibration } = record;
    return {
      record,
      source: {
        ...{ machineId: machine.id, machineName: machine.name, lensId: lens.id, lensName: lens.name, ...optics },
        ...{ physical: profile.physical, panel: profile.panel },
        // what was signed rests on the table that it cites; the others only say what it left open
        calibrations: [
          ...(calibration === null ? [] : [calibration]),
          ...readingsAt(machine.id).filter(({ id }) => id !== calibration?.id),
        ],
      },
      targets: rows
        .filter((row) => row.machineId !== machine.id || row.lensId !== lens.id)
        .map((row) => ({
          ...row,
          calibrations: readingsAt(row.machineId),
          recipes: recipes.filter(({ machineId, lensId }) => machineId === row.machineId && lensId === row.lensId),
        })),
    };
  }
}

/** @throws InvalidError where machine and lens are the source's own, or not used together in the shop */
export function targetOf(
  { source, targets }: TransferGround,
  { machineId, lensId }: { readonly machineId: string; readonly lensId: string },
) {
  if (machineId === source.machineId && lensId === source.lensId)
    throw new InvalidError('It is the machine and the lens of the source.', [
      { pointer: '#/lensId', detail: 'Choose another machine or lens, or propose a change of the recipe.' },
    ]);
  const target = targets.find((place) => place.machineId === machineId && place.lensId === lensId);
  if (target !== undefined) return target;
  const isMachine = targets.some((place) => place.machineId === machineId) || machineId === source.machineId;
  throw new InvalidError(
    'One field needs another look.',
    isMachine
      ? [{ pointer: '#/lensId', detail: 'This lens is not used on the machine. Add it to the machine first.' }]
      : [{ pointer: '#/machineId', detail: 'This machine is not in use in the shop. Choose it again.' }],
  );
}

export function asTransferPlace({
  machineName,
  lensName,
  physical,
  panel,
  focalLengthMm,
  measuredSpotUm,
  calibrations,
}: GroundPlace): TransferPlace {
  return {
    ...{ machineName, lensName, profile: physical, panel, focalLengthMm, measuredSpotUm },
    calibrations: calibrations.map((calibration) => ({
      ...asMeasured(calibration),
      id: calibration.id,
      measuredOn: calibration.measuredOn,
    })),
  };
}
