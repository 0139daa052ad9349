import { DIGEST, INSTANT, KEY, WORD, tables } from './migration'

export const trail = tables('20261201-1040-trail', {
  trail: `
    id ${KEY} NOT NULL PRIMARY KEY,
    commission_id ${KEY} NOT NULL,
    seq INT NOT NULL,
    at ${INSTANT} NOT NULL,
    actor_id ${KEY} NOT NULL,
    actor_name VARCHAR(200) NOT NULL,
    act VARCHAR(64) NOT NULL,
    says MEDIUMTEXT NOT NULL,
    document JSON NOT NULL,
    prev_hash ${DIGEST} NULL,
    hash ${DIGEST} NOT NULL,
    UNIQUE KEY trail_seq (commission_id, seq),
    CONSTRAINT trail_of_commission FOREIGN KEY (commission_id) REFERENCES commission (id)`,
  operation: `
    operation_id ${KEY} NOT NULL PRIMARY KEY,
    actor_id ${KEY} NOT NULL,
    request_sha256 ${DIGEST} NOT NULL,
    answer JSON NULL,
    at ${INSTANT} NOT NULL`,
  job: `
    id ${KEY} NOT NULL PRIMARY KEY,
    kind ${WORD} NOT NULL,
    document JSON NOT NULL,
    state ${WORD} NOT NULL DEFAULT 'queued',
    progress INT NOT NULL DEFAULT 0,
    says MEDIUMTEXT NULL,
    due ${INSTANT} NOT NULL,
    claimed_by ${KEY} NULL,
    claimed_until ${INSTANT} NULL,
    tries INT NOT NULL DEFAULT 0,
    created_at ${INSTANT} NOT NULL,
    KEY job_due (state, due),
    CONSTRAINT job_state_known CHECK (state IN ('queued', 'done', 'failed'))`,
})
