import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import {
  FOCUS_ALLOWANCES,
  FOCUS_PLACES,
  type FocusAllowance,
  type FocusPlace,
  LENGTH_UNITS,
  type LengthUnit,
  PART_SHAPES,
  PART_SIDES,
  type PartShape,
  type PartSide,
} from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import { IsIn, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';

/** Only what no part can have is refused here; what fits the shape is said by the same function as in the browser. */
const LARGEST = 1e6;

export class EnteredLengthDto {
  @ApiProperty({ description: 'The number as typed' })
  @NumberBetween(-LARGEST, LARGEST, { what: 'The length' })
  value: number;

  @ApiProperty({ enum: LENGTH_UNITS, enumName: 'LengthUnit', description: 'Unit that it was typed in' })
  @IsIn(LENGTH_UNITS, { message: 'A length is typed in mm or in.' })
  unit: LengthUnit;
}

function TypedLength(description: string): PropertyDecorator {
  return (target, property) => {
    ApiPropertyOptional({ type: EnteredLengthDto, description })(target, property);
    MayBeAbsent()(target, property);
    ValidateNested()(target, property);
    Type(() => EnteredLengthDto)(target, property);
  };
}

/** A round part as a person describes it. Numbers that follow from it are worked out on the server, whatever the device showed. */
export class SavePartSetUpDto {
  @ApiProperty({ enum: PART_SHAPES, enumName: 'PartShape', description: 'Shape of the part' })
  @IsIn(PART_SHAPES, { message: 'Choose the shape of the part.' })
  shape: PartShape;

  @ApiProperty({ enum: PART_SIDES, enumName: 'PartSide', description: 'Surface that is marked' })
  @IsIn(PART_SIDES, { message: 'Choose the outside or the inside.' })
  side: PartSide;

  @TypedLength('Outside diameter of a cylinder, ring or tube') diameter?: EnteredLengthDto;
  @TypedLength('Wall of a ring or tube') wall?: EnteredLengthDto;
  @TypedLength('Diameter of the marked surface at the small end of a cone') smallDiameter?: EnteredLengthDto;
  @TypedLength('Diameter of the marked surface at the large end of a cone') largeDiameter?: EnteredLengthDto;
  @TypedLength('Length along the axis') length?: EnteredLengthDto;
  @TypedLength('Height of the artwork along the surface') artworkHeight?: EnteredLengthDto;
  @TypedLength('Width of the artwork round the part; absent: a whole turn') artworkWidth?: EnteredLengthDto;
  @TypedLength('Seam of a whole turn: overlap above zero, gap below; absent: edge to edge') seam?: EnteredLengthDto;

  @ApiProperty({ enum: FOCUS_ALLOWANCES, enumName: 'FocusAllowance', description: 'What may be lost towards the edge of a strip' })
  @IsIn(FOCUS_ALLOWANCES, { message: 'Choose what may be lost towards the edge.' })
  allowance: FocusAllowance;

  @ApiProperty({ description: 'How much of it, %' })
  @NumberBetween(-LARGEST, LARGEST, { what: 'The allowance', unit: '%' })
  allowancePercent: number;

  @ApiProperty({ enum: FOCUS_PLACES, enumName: 'FocusPlace', description: 'Where the focus is set' })
  @IsIn(FOCUS_PLACES, { message: 'Choose where the focus is set.' })
  focusAt: FocusPlace;

  @ApiPropertyOptional({ description: 'Steepest angle between beam and normal at the edge of a strip, degrees; absent: no limit' })
  @MayBeAbsent()
  @NumberBetween(-LARGEST, LARGEST, { what: 'The steepest angle', unit: '°' })
  steepestEdgeDeg?: number;

  @ApiPropertyOptional({ description: 'Index steps asked for; absent: the least number' })
  @MayBeAbsent()
  @NumberBetween(-LARGEST, LARGEST, { what: 'Index steps' })
  indexSteps?: number;

  @ApiPropertyOptional({ description: 'Motor steps of one turn of the rotary, gear included' })
  @MayBeAbsent()
  @NumberBetween(-1e9, 1e9, { what: 'Motor steps of one turn' })
  stepsPerTurn?: number;

  @ApiProperty({ enum: LENGTH_UNITS, enumName: 'LengthUnit', description: 'Unit of the machine’s control, in which the results are read' })
  @IsIn(LENGTH_UNITS, { message: 'Choose mm or in.' })
  shownIn: LengthUnit;
}
