import { type DynamicModule, Module } from '@nestjs/common';
import { LoggerModule } from 'nestjs-pino';
import { logSettings } from './common/http/logging';
import { ConfigModule } from './config/config.module';
import { Env } from './config/env.validation';
import { DatabaseModule } from './database/database.module';
import { JobsModule } from './jobs/jobs.module';
import { MailWorkerModule } from './mail/mail-worker.module';
import { PhotosWorkerModule } from './photos/photos-worker.module';
import { RecipesWorkerModule } from './recipes/recipes-worker.module';
import { WorkerProcess } from './worker-process';

/** What the worker process is made of: no routes, no members. */
@Module({})
export class WorkerModule {
  static register(env: Env): DynamicModule {
    return {
      module: WorkerModule,
      imports: [
        ConfigModule.register(env),
        LoggerModule.forRootAsync({ inject: [Env], useFactory: logSettings }),
        DatabaseModule,
        JobsModule,
        MailWorkerModule,
        PhotosWorkerModule,
        RecipesWorkerModule,
      ],
      providers: [WorkerProcess],
    };
  }
}
