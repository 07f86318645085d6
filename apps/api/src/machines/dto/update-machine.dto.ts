import { PartialType } from '@nestjs/swagger';
import { CreateMachineDto } from './create-machine.dto';

/** Only what is given changes. A changed profile becomes the next profile number; the earlier ones stay. */
export class UpdateMachineDto extends PartialType(CreateMachineDto) {}
