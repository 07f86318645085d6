import { hasEssentialChange, type MarkStep } from '@proofplate/recipe-model';
import type { PhotoUrlsDto } from '../photos/dto/photo.dto';
import { isSameWork } from './approval-facts';
import { confirmationOf } from './confirmation';
import type { EvidenceCellDto, EvidencePhotoDto, EvidenceRunDto } from './dto/evidence.dto';
import { criterionResults, essentialDifferences, meetsAll } from './evidence-judgement';
import type { EvidenceCell, EvidencePhoto, EvidenceRun, RevisionRecord } from './stored-revision';

export type MapPhoto = (photo: EvidencePhoto) => PhotoUrlsDto | null;

export function toEvidenceCellDto(cell: EvidenceCell, steps: readonly MarkStep[], photoUrls: MapPhoto): EvidenceCellDto {
  const { cellId, address, rowIndex, columnIndex, coupon, parameters, meanRating, plate } = cell;
  const criteria = criterionResults(coupon.criteria ?? [], cell.measurements);
  return {
    ...{ cellId, address, rowIndex, columnIndex, parameters, meanRating, plate },
    couponId: coupon.id,
    couponCode: coupon.code,
    couponState: coupon.state,
    lot: coupon.lot,
    markedAt: isoOf(coupon.markedAt),
    sealedAt: isoOf(coupon.sealedAt),
    essentialDifferences: essentialDifferences(parameters, steps, coupon.unknownFields),
    measurements: cell.measurements.map((measurement) => ({
      ...measurement,
      measuredAt: new Date(measurement.measuredAt).toISOString(),
    })),
    criteria,
    meets: meetsAll(criteria),
    photo: toEvidencePhotoDto(cell.photo, photoUrls),
  };
}

export function toEvidencePhotoDto(photo: EvidencePhoto | null, photoUrls: MapPhoto): EvidencePhotoDto | null {
  if (photo === null) return null;
  const { id, corners, widthPx, heightPx } = photo;
  return { id, urls: photoUrls(photo), corners, widthPx, heightPx };
}

export function toEvidenceRunDto(run: EvidenceRun, record: RevisionRecord): EvidenceRunDto {
  const { revision, basis } = record;
  const { steps } = revision.content;
  const { marks, counting } = confirmationOf({
    ...{ revisionId: revision.id, steps, basis, confirmation: [], runs: [run] },
    isSameWork: (cell) => isSameWork(cell, record),
  });
  return {
    runId: run.id,
    code: run.code,
    lot: run.lot,
    startedAt: run.startedAt.toISOString(),
    pieceCount: marks.length,
    meetingCount: counting.length,
    isSameSetting: run.steps !== null && !hasEssentialChange(steps, run.steps),
  };
}

const isoOf = (moment: Date | null) => moment?.toISOString() ?? null;
