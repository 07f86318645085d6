import { Global, Module } from '@nestjs/common';
import { APP_GUARD } from '@nestjs/core';
import { JwtModule } from '@nestjs/jwt';
import { RoleGuard } from '../common/guards/role.guard';
import { PasswordCheck } from '../common/password-check';
import { LedgerModule } from '../ledger/ledger.module';
import { MailModule } from '../mail/mail.module';
import { MembersModule } from '../members/members.module';
import { ShopsModule } from '../shops/shops.module';
import { AcceptanceService } from './acceptance.service';
import { AccessTokens } from './access-tokens';
import { AccountsRepository } from './accounts.repository';
import { AuthController } from './auth.controller';
import { AuthGuard } from './auth.guard';
import { CredentialsService } from './credentials.service';
import { PasswordHasher } from './hashing/password-hasher';
import { LinksController } from './links.controller';
import { OwnAccountController } from './own-account.controller';
import { OwnAccountService } from './own-account.service';
import { PasswordResetService } from './password-reset.service';
import { PeopleService } from './people.service';
import { RefreshCookie } from './refresh-cookie';
import { SessionController } from './session.controller';
import { SessionsService } from './sessions.service';
import { ShopFounding } from './shop-founding';
import { SignInService } from './sign-in.service';
import { SignUpService } from './sign-up.service';
import { ThrottleRepository } from './throttle.repository';
import { ThrottleService } from './throttle.service';

/** Global for one provider alone: `PasswordCheck`, which signed acts of lower rows ask for too. */
@Global()
@Module({
  imports: [JwtModule.register({}), LedgerModule, MailModule, MembersModule, ShopsModule],
  controllers: [AuthController, LinksController, OwnAccountController, SessionController],
  providers: [
    { provide: APP_GUARD, useClass: AuthGuard },
    { provide: APP_GUARD, useClass: RoleGuard },
    { provide: PasswordCheck, useExisting: CredentialsService },
    AcceptanceService,
    AccessTokens,
    AccountsRepository,
    CredentialsService,
    OwnAccountService,
    PasswordHasher,
    PasswordResetService,
    PeopleService,
    RefreshCookie,
    SessionsService,
    ShopFounding,
    SignInService,
    SignUpService,
    ThrottleRepository,
    ThrottleService,
  ],
  exports: [PasswordCheck],
})
export class AuthModule {}
