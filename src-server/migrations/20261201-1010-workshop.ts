import { INSTANT, KEY, tables } from './migration'

export const workshop = tables('20261201-1010-workshop', {
  mill_card: `
    id ${KEY} NOT NULL PRIMARY KEY,
    mill_id ${KEY} NOT NULL,
    no INT NOT NULL,
    document JSON NOT NULL,
    by_id ${KEY} NOT NULL,
    at ${INSTANT} NOT NULL,
    UNIQUE KEY mill_card_no (mill_id, no),
    CONSTRAINT mill_card_of_mill FOREIGN KEY (mill_id) REFERENCES mill (id)`,
  saw_card: `
    id ${KEY} NOT NULL PRIMARY KEY,
    name VARCHAR(200) NOT NULL,
    no INT NOT NULL,
    document JSON NOT NULL,
    by_id ${KEY} NOT NULL,
    at ${INSTANT} NOT NULL,
    UNIQUE KEY saw_card_no (name, no)`,
  setting: `
    \`key\` VARCHAR(64) NOT NULL PRIMARY KEY,
    value JSON NOT NULL,
    version INT NOT NULL DEFAULT 0`,
  counter: `
    series VARCHAR(64) NOT NULL PRIMARY KEY,
    value INT NOT NULL`,
})
