import { ApiProperty } from '@nestjs/swagger';
import { HeadOverheadsDto, MarkTimeDto } from '../../machines/dto/marking-time.dto';
import { DoseCautionDto, DoseDto, GridFactorDto, PlateSizeDto } from './coupon.dto';
import { ParameterSetDto } from './parameter-set.dto';

export class PreviewCellDto {
  @ApiProperty({ description: 'Row letter and column number' }) address: string;
  @ApiProperty({ description: 'Row from 0' }) rowIndex: number;
  @ApiProperty({ description: 'Column from 0' }) columnIndex: number;
  @ApiProperty({ description: 'Place in the order of marking, from 1' }) runOrder: number;
  @ApiProperty({ type: DoseDto, description: 'Areal dose' }) dose: DoseDto;
}

export class PlanWarningDto {
  @ApiProperty({
    description: 'dose, lines-apart, spots-apart, pulse-energy, out-of-range, no-dose, plate-too-large, no-labels, slow',
  })
  code: string;
  @ApiProperty({ description: 'What the matter is' }) title: string;
  @ApiProperty({ description: 'Why, and the way out' }) detail: string;
  @ApiProperty({ type: [String], description: 'Cells that it is about; empty: the whole plate' }) addresses: string[];
}

export class PlanCautionDto {
  @ApiProperty({ format: 'uuid', description: 'Id of the caution' }) id: string;
  @ApiProperty({ description: 'What to do' }) subject: string;
  @ApiProperty({ description: 'Why' }) text: string;
  @ApiProperty({ description: 'Where it comes from' }) source: string;
}

export class PlanTimeDto extends MarkTimeDto {
  @ApiProperty({ type: Number, nullable: true, description: 'Time of the quickest cell, s' }) quickestCellS: number | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Time of the slowest cell, s' }) slowestCellS: number | null;
  @ApiProperty({ type: HeadOverheadsDto, description: 'Overheads of the scan head that the times rest on' }) overheads: HeadOverheadsDto;
}

/** What a plan would give. Nothing is stored. */
export class CouponPreviewDto {
  @ApiProperty({ description: 'Rows of cells' }) rows: number;
  @ApiProperty({ description: 'Columns of cells' }) columns: number;
  @ApiProperty({ type: GridFactorDto, nullable: true, description: 'What varies down the rows' }) rowFactor: GridFactorDto | null;
  @ApiProperty({ type: GridFactorDto, nullable: true, description: 'What varies across the columns' }) columnFactor: GridFactorDto | null;
  @ApiProperty({ type: ParameterSetDto, description: 'The same in every cell' }) baseSetting: ParameterSetDto;
  @ApiProperty({ type: [PreviewCellDto], description: 'Cells, row by row' }) cells: PreviewCellDto[];
  @ApiProperty({ type: PlateSizeDto, description: 'Size of the plate' }) plate: PlateSizeDto;
  @ApiProperty({ type: PlanTimeDto, description: 'Marking time of all cells, labels not counted' }) markingTime: PlanTimeDto;
  @ApiProperty({ enum: ['calibration', 'not calibrated', 'mixed', 'unknown'], description: 'Where the watts come from' })
  powerBasis: 'calibration' | 'not calibrated' | 'mixed' | 'unknown';
  @ApiProperty({ type: Number, nullable: true, description: 'Spot on the work in the base setting, µm' }) spotUm: number | null;
  @ApiProperty({ type: DoseCautionDto, nullable: true, description: 'Dose that is flagged' }) doseCaution: DoseCautionDto | null;
  @ApiProperty({ type: [PlanWarningDto], description: 'What to look at before marking' }) warnings: PlanWarningDto[];
  @ApiProperty({ type: [PlanCautionDto], description: 'Cautions for this work, to be read before it' }) cautions: PlanCautionDto[];
}
