import { Controller, Get } from '@nestjs/common';
import { ApiOkResponse, ApiOperation, ApiProperty, ApiServiceUnavailableResponse, ApiTags } from '@nestjs/swagger';
import { Public } from '../common/decorators/public.decorator';
import { HealthService } from './health.service';

export class HealthDto {
  @ApiProperty({ enum: ['ok'], description: 'Always ok; anything else is an error answer' }) status: 'ok';
}

@ApiTags('health')
@Public()
@Controller('health')
export class HealthController {
  constructor(private readonly health: HealthService) {}

  @Get('live')
  @ApiOperation({ summary: 'The process runs; touches nothing else' })
  @ApiOkResponse({ type: HealthDto })
  live(): HealthDto {
    return { status: 'ok' };
  }

  @Get('ready')
  @ApiOperation({ summary: 'Requests can be served: not shutting down, database reachable at the expected schema level' })
  @ApiOkResponse({ type: HealthDto })
  @ApiServiceUnavailableResponse({ description: 'Not ready; details are in the log only' })
  async ready(): Promise<HealthDto> {
    await this.health.requireReady();
    return { status: 'ok' };
  }
}
