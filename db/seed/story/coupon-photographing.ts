import { schema } from '@proofplate/db';
import type { PhysicalProfile } from '@proofplate/recipe-model';
import { raw } from 'bwip-js/node';
import type { MarkKind } from '../photos/mark-kinds';
import { groundOfMark, modelMark } from '../photos/mark-model';
import { seededRandom, seedOf } from '../photos/noise';
import { type CouponPhotoTruth, renderCouponPhoto } from '../photos/render-coupon-photo';
import { type DevelopedPhoto, developPhoto } from '../stage/develop-photo';
import { sha256 } from '../stage/ledger-writer';
import { keptObjectKey } from '../stage/object-store';
import { authored, minutesAfter, type Stage, type Turn } from '../stage/stage';
import { exposureOf } from './exposure';
import type { CouponRecord } from './records';

const { photo } = schema;

const JPEG = 'image/jpeg';
const SERVER = { memberId: null, name: 'Proofplate' };

/** What the process model says that each cell became. */
export function burn(record: CouponRecord, kind: MarkKind, physical: PhysicalProfile): void {
  const random = seededRandom(seedOf(record.code));
  for (const cell of record.cells) cell.mark = modelMark(kind, exposureOf(cell.parameters, physical), random);
}

/** Takes the picture of a burnt plate, stores it as the api would and lays its corners on. */
export async function photograph(turn: Turn, stage: Stage, record: CouponRecord, kind: MarkKind): Promise<void> {
  const { layout, code, cells } = record;
  const picture = await renderCouponPhoto({
    ...{ layout, code, seed: seedOf(code), view: stage.pictureSize, ground: groundOfMark(kind) },
    cells: cells.flatMap(({ address, mark }) => (mark === undefined ? [] : [{ address, lab: mark.lab, texture: mark.texture }])),
    dataMatrixModules: dataMatrixModules(layout.reference),
  });
  const developed = await developPhoto(picture.jpeg);
  for (const { bytes, sha256: name } of [developed.master, developed.large, developed.small]) {
    await stage.store.put(keptObjectKey(turn.shopId, name), bytes, JPEG);
  }
  record.photoId = await storePhoto(turn, record, { received: picture.jpeg, developed, corners: picture.truth.corners });
  record.truth = picture.truth;
}

type Taken = { readonly received: Buffer; readonly developed: DevelopedPhoto; readonly corners: CouponPhotoTruth['corners'] };

async function storePhoto(turn: Turn, { id: couponId, code }: CouponRecord, { received, developed, corners }: Taken): Promise<string> {
  const id = turn.newId();
  const { master, large, small } = developed;
  const file = { receivedSha256: sha256(received), receivedBytes: received.length, receivedType: JPEG };
  const kept = {
    ...{ masterSha256: master.sha256, masterBytes: master.bytes.length, largeSha256: large.sha256, smallSha256: small.sha256 },
    ...{ widthPx: master.widthPx, heightPx: master.heightPx, colourProfile: null },
  };
  const points = corners.map(({ x, y }) => ({ x, y }));
  const [developedAt, corneredAt] = [minutesAfter(turn.at, 1), minutesAfter(turn.at, 3)];
  await turn.tx.insert(photo).values({
    ...{ ...authored(turn), id, couponId, ...file, ...kept, state: 'ready', capturedAt: turn.at, processedAt: developedAt },
    ...{ corners: points, cornersFoundBy: 'render', lightNotes: 'Rendered picture, invented', version: 3 },
  });
  const subject = { subjectType: 'photo', subjectId: id, subjectCode: code };
  await turn.tell({ action: 'photo.uploaded', ...subject, after: { couponId, ...file } });
  await turn.tell(
    { action: 'photo.developed', ...subject, after: { ...kept, receivedSha256: file.receivedSha256 } },
    { at: developedAt, by: SERVER },
  );
  const laid = { before: { corners: null, foundBy: null }, after: { corners: points, foundBy: 'render' } };
  await turn.tell({ action: 'photo.corners-set', ...subject, ...laid }, { at: corneredAt });
  return id;
}

/** Modules of a square Data Matrix, true = dark, without quiet zone. */
function dataMatrixModules(text: string): boolean[][] {
  const [symbol] = raw({ bcid: 'datamatrix', text });
  if (symbol === undefined || !('pixs' in symbol)) throw new Error('the Data Matrix could not be made');
  const { pixs, pixx, pixy } = symbol;
  return Array.from({ length: pixy }, (_, row) => Array.from({ length: pixx }, (__, column) => pixs[row * pixx + column] === 1));
}
