import { Injectable, Logger, type OnModuleDestroy } from '@nestjs/common';
import { UnavailableError } from '../common/errors/domain-error';
import { HealthRepository } from './health.repository';

@Injectable()
export class HealthService implements OnModuleDestroy {
  private readonly logger = new Logger(HealthService.name);
  private isStopping = false;

  constructor(private readonly repository: HealthRepository) {}

  /** The first thing of a shutdown: whoever balances the load sends nothing more here while requests in flight finish. */
  onModuleDestroy(): void {
    this.isStopping = true;
  }

  /** @throws UnavailableError without details; the reason is logged */
  async requireReady(): Promise<void> {
    if (this.isStopping) throw new UnavailableError('This process is shutting down.');
    const isReady = await this.repository.isAtExpectedLevel().catch((error: unknown) => {
      this.logger.warn({ err: error }, 'readiness: the database does not answer');
      return false;
    });
    if (!isReady) throw new UnavailableError('Not ready yet.');
  }
}
