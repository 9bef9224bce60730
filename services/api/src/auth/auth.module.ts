import { Module } from '@nestjs/common';
import { JwtModule } from '@nestjs/jwt';
import { PassportModule } from '@nestjs/passport';
import { SETTINGS, type Settings } from '../config/settings';
import { AccessTokens, SIGN_OPTIONS } from './access-tokens';
import { AccountsService } from './accounts.service';
import { AuthController } from './auth.controller';
import { JwtStrategy } from './jwt.strategy';
import { LocalStrategy } from './local.strategy';
import { SessionsService } from './sessions.service';

@Module({
  imports: [
    PassportModule,
    JwtModule.registerAsync({
      inject: [SETTINGS],
      useFactory: ({ jwtSecret }: Settings) => ({ secret: jwtSecret, signOptions: SIGN_OPTIONS }),
    }),
  ],
  controllers: [AuthController],
  providers: [AccessTokens, AccountsService, JwtStrategy, LocalStrategy, SessionsService],
  exports: [JwtStrategy],
})
export class AuthModule {}
