import { Global, Module } from '@nestjs/common';
import { APP_GUARD } from '@nestjs/core';
import { JwtModule } from '@nestjs/jwt';
import { PassportModule } from '@nestjs/passport';
import { CONFIG, type Config } from '../config/config.js';
import { JwtStrategy, jwtKey } from './jwt.strategy.js';
import { PermissionGuard, SessionGuard } from './permission.guard.js';
import { SessionController } from './session.controller.js';
import { SessionsService } from './sessions.service.js';
import { SignInBrake } from './sign-in-brake.js';

@Global()
@Module({
  imports: [
    PassportModule,
    JwtModule.registerAsync({
      inject: [CONFIG],
      useFactory: (config: Config) => ({ secret: jwtKey(config) as unknown as string, signOptions: { algorithm: 'HS256' as const } }),
    }),
  ],
  controllers: [SessionController],
  providers: [SessionsService, SignInBrake, JwtStrategy, { provide: APP_GUARD, useClass: SessionGuard }, { provide: APP_GUARD, useClass: PermissionGuard }],
  exports: [SessionsService],
})
export class AuthModule {}
