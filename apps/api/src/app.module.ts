import { type DynamicModule, Module } from '@nestjs/common';
import { LoggerModule } from 'nestjs-pino';
import { AuthModule } from './auth/auth.module';
import { logSettings } from './common/http/logging';
import { ProblemsModule } from './common/problems.module';
import { ConfigModule } from './config/config.module';
import { Env } from './config/env.validation';
import { CouponInspectionModule } from './coupons/coupon-inspection.module';
import { CouponsModule } from './coupons/coupons.module';
import { DatabaseModule } from './database/database.module';
import { FinderModule } from './finder/finder.module';
import { HealthModule } from './health/health.module';
import { LedgerModule } from './ledger/ledger.module';
import { LensesModule } from './lenses/lenses.module';
import { MachinesModule } from './machines/machines.module';
import { MarkingTimesModule } from './machines/marking-times.module';
import { MaterialsModule } from './materials/materials.module';
import { MembersModule } from './members/members.module';
import { PhotosModule } from './photos/photos.module';
import { RecipesModule } from './recipes/recipes.module';
import { RunsModule } from './runs/runs.module';
import { ShopsModule } from './shops/shops.module';
import { SignOffsModule } from './sign-offs/sign-offs.module';

/** Every module of the api, lowest row of the import law first. */
@Module({})
export class AppModule {
  static register(env: Env): DynamicModule {
    return {
      module: AppModule,
      imports: [
        ConfigModule.register(env),
        LoggerModule.forRootAsync({ inject: [Env], useFactory: logSettings }),
        DatabaseModule,
        ProblemsModule,
        HealthModule,
        LedgerModule,
        ShopsModule,
        MembersModule,
        AuthModule,
        MachinesModule,
        MarkingTimesModule,
        LensesModule,
        MaterialsModule,
        PhotosModule,
        CouponsModule,
        CouponInspectionModule,
        RecipesModule,
        SignOffsModule,
        RunsModule,
        FinderModule,
      ],
    };
  }
}
