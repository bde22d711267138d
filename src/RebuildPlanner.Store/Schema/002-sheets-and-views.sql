-- Issued sheets as they were, and columns for anyone's SQL.

CREATE TABLE issued (
    entry INTEGER PRIMARY KEY REFERENCES entry (id),
    pdf   BLOB NOT NULL                             -- deflated
) STRICT;

CREATE TRIGGER issued_is_never_changed BEFORE UPDATE ON issued
BEGIN SELECT RAISE(ABORT, 'an entry is never changed'); END;

CREATE TRIGGER issued_is_never_taken_out BEFORE DELETE ON issued
BEGIN SELECT RAISE(ABORT, 'an entry is never taken out'); END;

CREATE VIEW struck AS
    SELECT job, body ->> '$.entry' AS key, body ->> '$.reason' AS reason, min(id) AS id
    FROM entry WHERE kind = 'strike' GROUP BY job, body ->> '$.entry';

CREATE VIEW reading AS
    SELECT job.number AS job, entry.key, entry.at AS written, coalesce(entry.body ->> '$.by', entry.by) AS by,
        entry.body ->> '$.what' AS what, entry.body ->> '$.cylinder' AS cylinder, entry.body ->> '$.piece' AS piece,
        entry.body ->> '$.head' AS head, entry.body ->> '$.bank' AS bank, entry.body ->> '$.at' AS place, entry.body ->> '$.axis' AS axis,
        entry.body ->> '$.valve' AS valve, entry.body ->> '$.clock' AS clock, entry.body ->> '$.value' AS value,
        entry.body ->> '$.from' AS "from", entry.body ->> '$.to' AS "to", entry.body ->> '$.gauge' AS gauge,
        entry.body ->> '$.stage' AS stage, coalesce(struck.reason, entry.body ->> '$.struck') AS struck
    FROM entry JOIN job ON job.id = entry.job LEFT JOIN struck ON struck.job = entry.job AND struck.key = entry.key
    WHERE entry.kind = 'reading';

CREATE VIEW figure AS
    SELECT job.number AS job, entry.key, entry.at AS written, entry.kind, entry.body ->> '$.what' AS what, entry.body ->> '$.value' AS value,
        entry.body ->> '$.cylinder' AS cylinder, entry.body ->> '$.head' AS head, entry.body ->> '$.bank' AS bank,
        entry.body ->> '$.from' AS "from", entry.body ->> '$.stage' AS stage, struck.reason AS struck
    FROM entry JOIN job ON job.id = entry.job LEFT JOIN struck ON struck.job = entry.job AND struck.key = entry.key
    WHERE entry.kind IN ('given', 'assumed');
