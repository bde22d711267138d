-- What is written down, and what lists and finds need of it.

CREATE TABLE job (
    id      INTEGER PRIMARY KEY,
    number  TEXT NOT NULL UNIQUE,
    title   TEXT,
    customer TEXT,
    engine  TEXT,
    opened  TEXT,                                   -- the day, as written
    closed  INTEGER NOT NULL CHECK (closed IN (0, 1)),
    entries INTEGER NOT NULL,                       -- how many
    changed TEXT NOT NULL                           -- when the last one was written, UTC
) STRICT;

CREATE INDEX job_by_change ON job (changed DESC, id DESC);

CREATE TABLE entry (
    id   INTEGER PRIMARY KEY,
    job  INTEGER NOT NULL REFERENCES job (id),
    key  TEXT NOT NULL UNIQUE,                      -- the same entry written twice is one
    at   TEXT NOT NULL,                             -- when it was written, UTC
    by   TEXT,
    kind TEXT NOT NULL,
    body TEXT NOT NULL CHECK (json_valid(body))     -- the job file's own element
) STRICT;

CREATE INDEX entry_of_job ON entry (job, id);

CREATE TRIGGER entry_is_never_changed BEFORE UPDATE ON entry
BEGIN SELECT RAISE(ABORT, 'an entry is never changed'); END;

CREATE TRIGGER entry_is_never_taken_out BEFORE DELETE ON entry
BEGIN SELECT RAISE(ABORT, 'an entry is never taken out'); END;

-- The shop's own gauges; of one name the last entry counts. A job copies the one it used.
CREATE TABLE gauge (
    id   INTEGER PRIMARY KEY,
    key  TEXT NOT NULL UNIQUE,
    at   TEXT NOT NULL,
    by   TEXT,
    name TEXT NOT NULL,
    body TEXT NOT NULL CHECK (json_valid(body))
) STRICT;

CREATE INDEX gauge_by_name ON gauge (name, id);

CREATE TRIGGER gauge_is_never_changed BEFORE UPDATE ON gauge
BEGIN SELECT RAISE(ABORT, 'an entry is never changed'); END;

CREATE TRIGGER gauge_is_never_taken_out BEFORE DELETE ON gauge
BEGIN SELECT RAISE(ABORT, 'an entry is never taken out'); END;
