import { Injectable } from '@nestjs/common';
import { couponArtworkSvg, couponLayout, type MarkPolarity } from '@proofplate/imaging';
import { PANEL_UNITS } from '@proofplate/physics';
import { FILL_LABELS, PARAMETER_KEYS, PARAMETERS, type ParameterSet } from '@proofplate/recipe-model';
import { stringify } from 'csv-stringify/sync';
import type { Actor } from '../common/actor';
import { UnitOfWork } from '../database/unit-of-work';
import { cellDose } from './cell-dose';
import { CouponNotFoundError } from './coupons.errors';
import { CouponsService } from './coupons.service';
import { dataMatrixModules } from './data-matrix';

export type Download = { readonly fileName: string; readonly body: string };

@Injectable()
export class CouponArtworkService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsService,
  ) {}

  /** The plate as SVG in millimetres: corner marks, letters, code and cells in run order. */
  async artwork(actor: Actor, couponId: string, polarity: MarkPolarity): Promise<Download> {
    const { view, grids, cells } = await this.unitOfWork.read(actor, (tx) => this.coupons.getWhole(tx, actor.shopId, couponId));
    const [grid] = grids;
    if (grid === undefined) throw new CouponNotFoundError();
    const { code, id } = view.coupon;
    const { rows, columns, cellMm, gapMm } = grid;
    const layout = couponLayout({ rows, columns, cellMm, gapMm, reference: plateReference(code, id) });
    const own = cells.filter(({ gridId }) => gridId === grid.id);
    const body = couponArtworkSvg({ layout, cells: own, code, dataMatrixModules: dataMatrixModules(layout.reference), polarity });
    return { fileName: `${code}.svg`, body };
  }

  /** Every cell with what the panel shows, in run order. */
  async cells(actor: Actor, couponId: string): Promise<Download> {
    const { view, cells } = await this.unitOfWork.read(actor, (tx) => this.coupons.getWhole(tx, actor.shopId, couponId));
    const labelOf = new Map(view.profile.panel.fields.map(({ parameter, label }) => [parameter, label]));
    const used = PARAMETER_KEYS.filter((key) => cells.some(({ parameters }) => parameters.values[key] !== undefined));
    const header = ['run order', 'cell', ...used.flatMap((key) => [labelOf.get(key) ?? PARAMETERS[key].label, 'unit']), ...LATER_COLUMNS];
    const inOrder = [...cells].sort((a, b) => a.runOrder - b.runOrder);
    const rows = inOrder.map(({ runOrder, address, parameters, actualParameters, markState, markNote }) => {
      const set = actualParameters ?? parameters;
      return [
        runOrder,
        address,
        ...used.flatMap((key) => enteredColumns(set, key)),
        FILL_LABELS[set.fill],
        set.power.watts,
        cellDose(set, view.coupon.unknownFields).value,
        markState,
        markNote,
      ];
    });
    return { fileName: `${view.coupon.code}-cells.csv`, body: stringify([header, ...rows], { bom: true, escape_formulas: true }) };
  }
}

const LATER_COLUMNS = ['fill', 'power at the work W', 'dose J/mm2', 'mark', 'note'];
const ID_DIGITS = 8;

/**
 * What the Data Matrix on the plate says: the code that people read, and enough of the id that a plate of another shop with the same code
 * is not taken for this one.
 */
export const plateReference = (code: string, id: string): string => `${code}.${id.replaceAll('-', '').slice(-ID_DIGITS)}`;

function enteredColumns({ values }: ParameterSet, key: (typeof PARAMETER_KEYS)[number]): (string | number)[] {
  const value = values[key];
  return value === undefined ? ['', ''] : [value.entered.value, PANEL_UNITS[value.entered.unit].symbol];
}
