import pg from 'pg'
import { Sequelize } from 'sequelize'

// DATE columns stay the text they are: a day has no time zone.
pg.types.setTypeParser(pg.types.builtins.DATE, value => value)
// Sequences are far below 2^53.
pg.types.setTypeParser(pg.types.builtins.INT8, value => Number(value))

/**
 * Opens a pool of connections.
 * @param url postgres address with the role's name and secret
 */
export function connect(url: string, options: { max?: number, log?: (sql: string) => void } = {}): Sequelize {
  return new Sequelize(url, {
    dialect: 'postgres',
    dialectModule: pg,
    logging: options.log ?? false,
    pool: { max: options.max ?? 10, min: 0, idle: 10_000, acquire: 10_000 },
    define: { underscored: true, timestamps: false },
  })
}
