import type { Raw } from '#server/database/connection'

export default {
  up(raw: Raw) {
    // the bytes of a notice that was printed or handed over, as its leaf names them by hash
    raw.exec('create table notice_paper (notice_id text primary key references notice, pdf blob not null, content_hash text not null, at text not null) strict')
  },
}
