import { type DynamicModule, Global, Module } from '@nestjs/common';
import { Settings } from './settings';

@Global()
@Module({})
export class ConfigModule {
  static forRoot(settings: Settings): DynamicModule {
    return {
      module: ConfigModule,
      providers: [{ provide: Settings, useValue: settings }],
      exports: [Settings],
    };
  }
}
