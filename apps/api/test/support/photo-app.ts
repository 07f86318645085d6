import { type CanActivate, type DynamicModule, type ExecutionContext, Injectable, Module } from '@nestjs/common';
import { APP_GUARD, NestFactory } from '@nestjs/core';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import type { FastifyRequest } from 'fastify';
import { configureApp, createAdapter } from '../../src/app.setup';
import type { Actor } from '../../src/common/actor';
import { IS_PUBLIC } from '../../src/common/decorators/public.decorator';
import { UnauthenticatedError } from '../../src/common/errors/domain-error';
import { RoleGuard } from '../../src/common/guards/role.guard';
import { ConfigModule } from '../../src/config/config.module';
import type { Env } from '../../src/config/env.validation';
import { DatabaseModule } from '../../src/database/database.module';
import { PhotosModule } from '../../src/photos/photos.module';
import { PhotosWorkerModule } from '../../src/photos/photos-worker.module';

const callers = new Map<string, Actor>();

/** Request header of a caller; signing in has tests of its own. */
export function calledBy(actor: Actor): { 'x-test-caller': string } {
  callers.set(actor.sessionId, actor);
  return { 'x-test-caller': actor.sessionId };
}

@Injectable()
class CallerGuard implements CanActivate {
  canActivate(context: ExecutionContext): boolean {
    const request = context.switchToHttp().getRequest<FastifyRequest>();
    request.actor = callers.get(String(request.headers['x-test-caller']));
    if (request.actor === undefined && Reflect.getMetadata(IS_PUBLIC, context.getHandler()) !== true)
      throw new UnauthenticatedError('Sign in.');
    return true;
  }
}

@Module({})
class PhotoAppModule {
  static register(env: Env): DynamicModule {
    const guards = [CallerGuard, RoleGuard].map((useClass) => ({ provide: APP_GUARD, useClass }));
    return {
      module: PhotoAppModule,
      imports: [ConfigModule.register(env), DatabaseModule, PhotosModule, PhotosWorkerModule],
      providers: guards,
    };
  }
}

/** The api's photo routes and the worker's photo jobs in one process. */
export async function startPhotoApp(env: Env): Promise<NestFastifyApplication> {
  const app = await NestFactory.create<NestFastifyApplication>(PhotoAppModule.register(env), createAdapter(env), { logger: false });
  await configureApp(app);
  await app.init();
  await app.getHttpAdapter().getInstance().ready();
  return app;
}
