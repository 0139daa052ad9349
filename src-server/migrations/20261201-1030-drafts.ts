import { INSTANT, KEY, WORD, tables } from './migration'

export const drafts = tables('20261201-1030-drafts', {
  draft: `
    id ${KEY} NOT NULL PRIMARY KEY,
    commission_id ${KEY} NOT NULL,
    document JSON NOT NULL,
    version INT NOT NULL,
    UNIQUE KEY draft_commission (commission_id),
    CONSTRAINT draft_of_commission FOREIGN KEY (commission_id) REFERENCES commission (id)`,
  draft_edit: `
    id ${KEY} NOT NULL PRIMARY KEY,
    draft_id ${KEY} NOT NULL,
    seq INT NOT NULL,
    name VARCHAR(200) NOT NULL,
    edit JSON NOT NULL,
    inverse JSON NOT NULL,
    state ${WORD} NOT NULL,
    author_id ${KEY} NOT NULL,
    author_name VARCHAR(200) NOT NULL,
    operation_id ${KEY} NOT NULL,
    at ${INSTANT} NOT NULL,
    UNIQUE KEY draft_edit_seq (draft_id, seq),
    KEY draft_edit_operation (operation_id),
    CONSTRAINT draft_edit_of_draft FOREIGN KEY (draft_id) REFERENCES draft (id),
    CONSTRAINT draft_edit_state_known CHECK (state IN ('done', 'undone', 'superseded'))`,
})
