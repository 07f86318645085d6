import { PartialType } from '@nestjs/swagger';
import { CreateLensDto } from './create-lens.dto';

/** Only what is given changes. */
export class UpdateLensDto extends PartialType(CreateLensDto) {}
