import { ApiPropertyOptional } from '@nestjs/swagger';
import type { MarkPolarity } from '@proofplate/imaging';
import { IsIn, IsOptional } from 'class-validator';

const POLARITIES = ['dark on bright', 'bright on dark'] as const;

export class CouponArtworkQuery {
  @ApiPropertyOptional({ enum: POLARITIES, default: 'dark on bright', description: 'What the laser does to the ground' })
  @IsOptional()
  @IsIn(POLARITIES, { message: 'Choose dark on bright, or bright on dark.' })
  polarity: MarkPolarity = 'dark on bright';
}
