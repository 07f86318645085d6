import { ApiProperty } from '@nestjs/swagger';
import { Equals, IsBoolean, IsInt, IsNumber, Max, Min } from 'class-validator';
import type { ShopPolicy } from '../shop-policy';

const MAX_CONFIRMATION_MARKS = 100;
const MAX_DAYS = 3_650;
const MAX_POWER_SHIFT_PERCENT = 50;
/** A policy that asks for what nobody can give would stop all signing. */
const NO_SECOND_FACTOR = 'Leave this off: accounts have no second factor yet. Signing asks for the password.';

export class ShopPolicyDto implements ShopPolicy {
  @ApiProperty({ minimum: 1, maximum: MAX_CONFIRMATION_MARKS, description: 'Marks that a confirmation needs at least' })
  @IsInt()
  @Min(1)
  @Max(MAX_CONFIRMATION_MARKS)
  minimumConfirmationMarks: number;

  @ApiProperty({ description: 'True: authors may sign their own revisions, and every print says so' })
  @IsBoolean()
  authorMaySign: boolean;

  @ApiProperty({ minimum: 1, maximum: MAX_DAYS, description: 'Days after which an approved setting is due for review' })
  @IsInt()
  @Min(1)
  @Max(MAX_DAYS)
  reviewEveryDays: number;

  @ApiProperty({ description: 'True: an overdue review blocks runs; false: it is only shown' })
  @IsBoolean()
  overdueBlocks: boolean;

  @ApiProperty({ description: 'True: approval needs a photo of the evidence' })
  @IsBoolean()
  photoRequired: boolean;

  @ApiProperty({ minimum: 1, maximum: MAX_DAYS, description: 'Days for which a power calibration counts as fresh' })
  @IsInt()
  @Min(1)
  @Max(MAX_DAYS)
  calibrationAgeDays: number;

  @ApiProperty({
    minimum: 0,
    maximum: MAX_POWER_SHIFT_PERCENT,
    description: 'Shift of the calibrated power, %, beyond which recipes are check due',
  })
  @IsNumber()
  @Min(0)
  @Max(MAX_POWER_SHIFT_PERCENT)
  powerShiftPercent: number;

  @ApiProperty({ description: 'Always false: accounts have no second factor yet, and true is refused' })
  @IsBoolean()
  @Equals(false, { message: NO_SECOND_FACTOR })
  secondFactorForSigning: boolean;
}
