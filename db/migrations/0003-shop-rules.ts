import { times, type Migration } from './migration';

/** What a shop has set for rules of thumb that have no standard behind them, in the unit of the field. */
export const shopRules: Migration = {
  name: '0003-shop-rules',
  up: [
    `CREATE TABLE shopRules (
      id TEXT PRIMARY KEY NOT NULL,
      shopId TEXT NOT NULL REFERENCES shops (id),
      name TEXT NOT NULL CHECK (name GLOB '[a-z]*.[a-z]*' AND length(name) <= 120),
      value REAL NOT NULL CHECK (typeof(value) = 'real' AND abs(value) <= 1e15),
      setById TEXT NOT NULL REFERENCES people (id),${times},
      UNIQUE (shopId, name)
    )`,
  ],
  down: ['DROP TABLE shopRules'],
};
