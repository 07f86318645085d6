import { type DynamicModule, Global, Module } from '@nestjs/common';
import { Env } from './env.validation';

/** Makes the checked environment injectable everywhere as `Env`. */
@Global()
@Module({})
export class ConfigModule {
  static register(env: Env): DynamicModule {
    return { module: ConfigModule, providers: [{ provide: Env, useValue: env }], exports: [Env] };
  }
}
