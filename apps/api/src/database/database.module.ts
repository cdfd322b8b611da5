import { Global, Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { CONFIG, type Config } from '../config/config.js';
import { Transactions } from './transactions.js';

@Global()
@Module({
  imports: [
    SequelizeModule.forRootAsync({
      inject: [CONFIG],
      useFactory: (config: Config) => ({
        dialect: 'mysql' as const,
        host: config.DB_HOST,
        port: config.DB_PORT,
        database: config.DB_NAME,
        username: config.DB_USER,
        password: config.DB_PASSWORD,
        logging: false as const,
        // Rooms list their models with `SequelizeModule.forFeature`; the schema comes from migrations alone.
        autoLoadModels: true,
        synchronize: false,
        timezone: '+00:00',
        pool: { max: config.DB_POOL, min: 1, acquire: 60_000, idle: 10_000 },
        dialectOptions: { supportBigNumbers: true, decimalNumbers: false, charset: 'utf8mb4_unicode_ci' },
        define: { charset: 'utf8mb4', collate: 'utf8mb4_unicode_ci', underscored: true, timestamps: false },
      }),
    }),
  ],
  providers: [Transactions],
  exports: [Transactions, SequelizeModule],
})
export class DatabaseModule {}
