import { Global, Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { Settings } from '../config/settings';
import { databaseOptions } from './database-options';
import { SeedRegistry } from './seed-registry';
import { WriteQueue } from './write-queue';

/** Models arrive through each feature's `SequelizeModule.forFeature`; tables only through migrations. */
@Global()
@Module({
  imports: [
    SequelizeModule.forRootAsync({
      inject: [Settings],
      useFactory: (settings: Settings) => ({
        ...databaseOptions(settings.databaseFile),
        autoLoadModels: true,
        synchronize: false,
        retryAttempts: 0,
      }),
    }),
  ],
  providers: [WriteQueue, SeedRegistry],
  exports: [WriteQueue, SeedRegistry],
})
export class DatabaseModule {}
