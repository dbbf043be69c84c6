import type { Kysely } from "kysely";
import { inOneTransaction } from "./in-one-transaction";

const instant = "TEXT NOT NULL CHECK (length({}) >= 20)";
const at = (column: string) => `${column} ${instant.replace("{}", column)}`;
const length = (name: string) => `${name}_pm INTEGER NOT NULL, ${name}_typed TEXT NOT NULL`;
const optionalLength = (name: string) => `${name}_pm INTEGER, ${name}_typed TEXT`;
const shop = "shop_id TEXT NOT NULL REFERENCES shop (id)";
const version = "version INTEGER NOT NULL DEFAULT 1 CHECK (version >= 1)";

/** A row of this table is a fact: it is written once, and a correction is another row. */
const appendOnly = (table: string) => [
  `CREATE TRIGGER ${table}_never_updated BEFORE UPDATE ON ${table}
   BEGIN SELECT RAISE(ABORT, '${table} is append-only'); END`,
  `CREATE TRIGGER ${table}_never_deleted BEFORE DELETE ON ${table}
   BEGIN SELECT RAISE(ABORT, '${table} is append-only'); END`,
];

const people = [
  `CREATE TABLE shop (
    id TEXT PRIMARY KEY, name TEXT NOT NULL,
    largest_step_pm INTEGER NOT NULL DEFAULT 5080000 CHECK (largest_step_pm > 0),
    least_hours REAL NOT NULL DEFAULT 2 CHECK (least_hours >= 0),
    stop_grade INTEGER NOT NULL DEFAULT 3 CHECK (stop_grade BETWEEN 1 AND 4),
    baseline_runs INTEGER NOT NULL DEFAULT 1 CHECK (baseline_runs BETWEEN 0 AND 10),
    wear_rate_rise REAL NOT NULL DEFAULT 1.5 CHECK (wear_rate_rise > 1),
    ${at("created_at")}, ${version}
  ) STRICT`,
  `CREATE TABLE person (
    id TEXT PRIMARY KEY, email TEXT NOT NULL COLLATE NOCASE UNIQUE, name TEXT NOT NULL,
    password_hash TEXT NOT NULL,
    units TEXT NOT NULL DEFAULT 'inch' CHECK (units IN ('inch', 'metric')),
    theme TEXT NOT NULL DEFAULT 'system' CHECK (theme IN ('system', 'light', 'dark')),
    ${at("created_at")}, ${version}
  ) STRICT`,
  `CREATE TABLE membership (
    id TEXT PRIMARY KEY, ${shop}, person_id TEXT NOT NULL REFERENCES person (id),
    role TEXT NOT NULL CHECK (role IN ('owner', 'builder', 'crew-chief', 'tuner', 'viewer')),
    ${at("created_at")}, ${version},
    UNIQUE (person_id, shop_id)
  ) STRICT`,
  "CREATE INDEX membership_by_shop ON membership (shop_id)",
  `CREATE TABLE session (
    id TEXT PRIMARY KEY, person_id TEXT REFERENCES person (id), shop_id TEXT REFERENCES shop (id),
    data_json TEXT NOT NULL CHECK (json_valid(data_json)), ${at("created_at")}, ${at("expires_at")}
  ) STRICT`,
  "CREATE INDEX session_by_person ON session (person_id)",
  "CREATE INDEX session_by_expiry ON session (expires_at)",
  `CREATE TABLE sign_in_attempt (
    id TEXT PRIMARY KEY, email TEXT NOT NULL COLLATE NOCASE, address TEXT NOT NULL,
    succeeded INTEGER NOT NULL CHECK (succeeded IN (0, 1)), ${at("attempted_at")}
  ) STRICT`,
  "CREATE INDEX sign_in_attempt_by_email ON sign_in_attempt (email, attempted_at)",
  "CREATE INDEX sign_in_attempt_by_address ON sign_in_attempt (address, attempted_at)",
  `CREATE TABLE token (
    id TEXT PRIMARY KEY, ${shop}, person_id TEXT NOT NULL REFERENCES person (id), name TEXT NOT NULL,
    token_hash TEXT NOT NULL UNIQUE, scope TEXT NOT NULL CHECK (scope IN ('read', 'write')),
    ${at("created_at")}, last_used_at TEXT, revoked_at TEXT
  ) STRICT`,
  "CREATE INDEX token_by_person ON token (person_id, shop_id)",
  `CREATE TABLE idempotency (
    id TEXT PRIMARY KEY, ${shop}, person_id TEXT NOT NULL REFERENCES person (id), key TEXT NOT NULL,
    request_hash TEXT NOT NULL, status INTEGER NOT NULL,
    answer_json TEXT NOT NULL CHECK (json_valid(answer_json)), ${at("created_at")},
    UNIQUE (person_id, shop_id, key)
  ) STRICT`,
];

const engines = [
  `CREATE TABLE engine (
    id TEXT PRIMARY KEY, ${shop}, name TEXT NOT NULL,
    form TEXT NOT NULL CHECK (form IN ('inline', 'V', 'flat')),
    cylinders INTEGER NOT NULL CHECK (cylinders BETWEEN 1 AND 16),
    mains INTEGER NOT NULL CHECK (mains BETWEEN 1 AND 17),
    valves_per_cylinder INTEGER NOT NULL CHECK (valves_per_cylinder BETWEEN 2 AND 6),
    ${length("bore")}, ${length("stroke")}, ${length("rod_length")},
    rev_limit_rpm REAL NOT NULL CHECK (rev_limit_rpm > 0), duty TEXT NOT NULL DEFAULT '',
    environment TEXT NOT NULL CHECK (environment IN ('clean', 'dusty')),
    ${at("created_at")}, ${version},
    UNIQUE (shop_id, name)
  ) STRICT`,
  `CREATE TABLE engine_assignment (
    id TEXT PRIMARY KEY, ${shop}, engine_id TEXT NOT NULL REFERENCES engine (id),
    person_id TEXT NOT NULL REFERENCES person (id), ${at("created_at")},
    UNIQUE (engine_id, person_id)
  ) STRICT`,
  "CREATE INDEX engine_assignment_by_person ON engine_assignment (person_id, shop_id)",
  `CREATE TABLE fit (
    id TEXT PRIMARY KEY, ${shop}, engine_id TEXT NOT NULL REFERENCES engine (id),
    kind TEXT NOT NULL, sort_order INTEGER NOT NULL,
    ${length("nominal")}, ${optionalLength("length")}, ${length("usual")},
    ${length("least")}, ${length("most")}, limits_source TEXT NOT NULL, ${length("tolerance")},
    bore_material TEXT NOT NULL, journal_material TEXT NOT NULL,
    ${optionalLength("bore_finish")}, ${optionalLength("journal_finish")},
    coating TEXT, coated_since_build INTEGER,
    method TEXT NOT NULL DEFAULT 'absolute' CHECK (method IN ('absolute', 'comparative')),
    ${at("created_at")}, ${version},
    UNIQUE (engine_id, kind),
    CHECK (nominal_pm > 0), CHECK (least_pm <= usual_pm AND usual_pm <= most_pm), CHECK (tolerance_pm > 0)
  ) STRICT`,
  `CREATE TABLE position (
    id TEXT PRIMARY KEY, ${shop}, fit_id TEXT NOT NULL REFERENCES fit (id),
    number INTEGER NOT NULL CHECK (number >= 1), retired_at TEXT,
    UNIQUE (fit_id, number)
  ) STRICT`,
  `CREATE TABLE gauge (
    id TEXT PRIMARY KEY, ${shop}, name TEXT NOT NULL, kind TEXT NOT NULL, serial TEXT NOT NULL DEFAULT '',
    ${length("resolution")}, ${length("calibration")}, ${length("repeatability")}, due_on TEXT,
    ${at("created_at")}, ${version}, UNIQUE (shop_id, name)
  ) STRICT`,
  `CREATE TABLE oil (
    id TEXT PRIMARY KEY, ${shop}, name TEXT NOT NULL, grade TEXT NOT NULL,
    kv40 REAL NOT NULL CHECK (kv40 > 0), kv100 REAL NOT NULL CHECK (kv100 > 0 AND kv100 < kv40),
    density15 REAL CHECK (density15 > 0), hths_pa_s REAL CHECK (hths_pa_s > 0),
    note TEXT NOT NULL DEFAULT '', ${at("created_at")}, ${version}, UNIQUE (shop_id, name)
  ) STRICT`,
];

const builds = [
  `CREATE TABLE build (
    id TEXT PRIMARY KEY, ${shop}, engine_id TEXT NOT NULL REFERENCES engine (id),
    number INTEGER NOT NULL CHECK (number >= 1),
    state TEXT NOT NULL CHECK (state IN ('measuring', 'assembled', 'running', 'torn-down', 'reviewed')),
    oil_id TEXT REFERENCES oil (id), note TEXT NOT NULL DEFAULT '',
    ${at("created_at")}, created_by TEXT NOT NULL REFERENCES person (id), torn_down_at TEXT, ${version},
    UNIQUE (engine_id, number)
  ) STRICT`,
  "CREATE INDEX build_by_shop_and_state ON build (shop_id, state)",
  `CREATE TABLE reading (
    id TEXT PRIMARY KEY, ${shop}, build_id TEXT NOT NULL REFERENCES build (id),
    fit_id TEXT NOT NULL REFERENCES fit (id), position_id TEXT NOT NULL REFERENCES position (id),
    stage TEXT NOT NULL CHECK (stage IN ('assembly', 'teardown')),
    feature TEXT NOT NULL CHECK (feature IN ('bore', 'journal')),
    plane TEXT NOT NULL CHECK (plane IN ('front', 'middle', 'rear')),
    axis TEXT NOT NULL CHECK (axis IN ('vertical', 'plus45', 'minus45', 'horizontal', 'a', 'b')),
    repeat INTEGER NOT NULL CHECK (repeat BETWEEN 1 AND 20),
    state TEXT NOT NULL CHECK (state IN ('measured', 'not-measured', 'not-accessible', 'withdrawn')),
    value_pm INTEGER, typed TEXT NOT NULL, unit TEXT, decimals INTEGER, reason TEXT,
    temperature_c REAL CHECK (temperature_c BETWEEN -40 AND 200), gauge_id TEXT REFERENCES gauge (id),
    warnings_json TEXT NOT NULL CHECK (json_valid(warnings_json)),
    supersedes_id TEXT UNIQUE REFERENCES reading (id),
    person_id TEXT NOT NULL REFERENCES person (id), ${at("taken_at")},
    CHECK ((state = 'measured') = (value_pm IS NOT NULL))
  ) STRICT`,
  "CREATE INDEX reading_of_build ON reading (build_id, stage, fit_id)",
  "CREATE INDEX reading_of_fit ON reading (fit_id, taken_at)",
  // A box starts once; every later value names the one it takes the place of, so two people cannot both win.
  `CREATE UNIQUE INDEX reading_first_of_box ON reading
    (build_id, stage, position_id, feature, plane, axis, repeat) WHERE supersedes_id IS NULL`,
  ...appendOnly("reading"),
  `CREATE TABLE sheet_signature (
    id TEXT PRIMARY KEY, ${shop}, build_id TEXT NOT NULL REFERENCES build (id),
    stage TEXT NOT NULL CHECK (stage IN ('assembly', 'teardown')), content_hash TEXT NOT NULL,
    person_id TEXT NOT NULL REFERENCES person (id), ${at("signed_at")}, UNIQUE (build_id, stage)
  ) STRICT`,
  ...appendOnly("sheet_signature"),
  `CREATE TRIGGER reading_after_signature BEFORE INSERT ON reading
   WHEN EXISTS (SELECT 1 FROM sheet_signature s WHERE s.build_id = NEW.build_id AND s.stage = NEW.stage)
   BEGIN SELECT RAISE(ABORT, 'the sheet is signed'); END`,
  `CREATE TABLE run (
    id TEXT PRIMARY KEY, ${shop}, build_id TEXT NOT NULL REFERENCES build (id), kind TEXT NOT NULL,
    ${at("started_at")}, hours REAL NOT NULL CHECK (hours >= 0 AND hours <= 10000),
    laps INTEGER CHECK (laps >= 0), starts INTEGER CHECK (starts >= 0), top_speed_rpm REAL CHECK (top_speed_rpm > 0),
    oil_id TEXT NOT NULL REFERENCES oil (id), oil_temperature_c REAL CHECK (oil_temperature_c BETWEEN -40 AND 200),
    pressure_idle_pa REAL CHECK (pressure_idle_pa >= 0), pressure_at_speed_pa REAL CHECK (pressure_at_speed_pa >= 0),
    pressure_at_speed_rpm REAL CHECK (pressure_at_speed_rpm > 0),
    events_json TEXT NOT NULL CHECK (json_valid(events_json)), note TEXT NOT NULL DEFAULT '',
    person_id TEXT NOT NULL REFERENCES person (id), ${at("created_at")}
  ) STRICT`,
  "CREATE INDEX run_of_build ON run (build_id, started_at)",
  ...appendOnly("run"),
  `CREATE TABLE finding (
    id TEXT PRIMARY KEY, ${shop}, build_id TEXT NOT NULL REFERENCES build (id),
    fit_id TEXT NOT NULL REFERENCES fit (id), position_id TEXT NOT NULL REFERENCES position (id),
    grade INTEGER NOT NULL CHECK (grade BETWEEN 0 AND 4), damage TEXT, place TEXT NOT NULL DEFAULT '',
    area_share REAL CHECK (area_share BETWEEN 0 AND 1), cause TEXT NOT NULL DEFAULT '', coating_state TEXT,
    note TEXT NOT NULL DEFAULT '', supersedes_id TEXT UNIQUE REFERENCES finding (id),
    person_id TEXT NOT NULL REFERENCES person (id), ${at("found_at")}
  ) STRICT`,
  `CREATE UNIQUE INDEX finding_first_of_position ON finding (build_id, position_id) WHERE supersedes_id IS NULL`,
  "CREATE INDEX finding_of_fit ON finding (fit_id, found_at)",
  `CREATE TRIGGER finding_after_signature BEFORE INSERT ON finding
   WHEN EXISTS (SELECT 1 FROM sheet_signature s WHERE s.build_id = NEW.build_id AND s.stage = 'teardown')
   BEGIN SELECT RAISE(ABORT, 'the sheet is signed'); END`,
  ...appendOnly("finding"),
];

const decisions = [
  `CREATE TABLE proposal (
    id TEXT PRIMARY KEY, ${shop}, fit_id TEXT NOT NULL REFERENCES fit (id),
    build_id TEXT NOT NULL REFERENCES build (id), action TEXT NOT NULL, subject TEXT NOT NULL,
    step_pm INTEGER NOT NULL, target_pm INTEGER NOT NULL,
    answer_json TEXT NOT NULL CHECK (json_valid(answer_json)),
    history_json TEXT NOT NULL CHECK (json_valid(history_json)), history_hash TEXT NOT NULL,
    person_id TEXT NOT NULL REFERENCES person (id), ${at("proposed_at")}
  ) STRICT`,
  "CREATE INDEX proposal_of_fit ON proposal (fit_id, build_id, proposed_at)",
  "CREATE INDEX proposal_of_build ON proposal (build_id)",
  ...appendOnly("proposal"),
  `CREATE TABLE sign_off (
    id TEXT PRIMARY KEY, ${shop}, proposal_id TEXT NOT NULL UNIQUE REFERENCES proposal (id),
    fit_id TEXT NOT NULL REFERENCES fit (id), build_id TEXT NOT NULL REFERENCES build (id),
    decision TEXT NOT NULL CHECK (decision IN ('accept', 'change', 'decline')),
    target_pm INTEGER NOT NULL, target_typed TEXT NOT NULL, reason TEXT NOT NULL DEFAULT '',
    content_hash TEXT NOT NULL,
    person_id TEXT NOT NULL REFERENCES person (id), ${at("signed_at")},
    UNIQUE (build_id, fit_id), CHECK (decision = 'accept' OR length(reason) > 0)
  ) STRICT`,
  "CREATE INDEX sign_off_of_fit ON sign_off (fit_id)",
  ...appendOnly("sign_off"),
  `CREATE TABLE target (
    id TEXT PRIMARY KEY, ${shop}, build_id TEXT NOT NULL REFERENCES build (id),
    fit_id TEXT NOT NULL REFERENCES fit (id),
    least_pm INTEGER NOT NULL, aim_pm INTEGER NOT NULL, most_pm INTEGER NOT NULL, coating TEXT,
    sign_off_id TEXT REFERENCES sign_off (id), ${at("created_at")},
    UNIQUE (build_id, fit_id), CHECK (least_pm <= aim_pm AND aim_pm <= most_pm)
  ) STRICT`,
  ...appendOnly("target"),
  `CREATE TABLE history (
    id TEXT PRIMARY KEY, ${shop}, engine_id TEXT REFERENCES engine (id),
    person_id TEXT NOT NULL REFERENCES person (id), subject_kind TEXT NOT NULL, subject_id TEXT NOT NULL,
    what TEXT NOT NULL, from_json TEXT CHECK (from_json IS NULL OR json_valid(from_json)),
    to_json TEXT CHECK (to_json IS NULL OR json_valid(to_json)), ${at("happened_at")}
  ) STRICT`,
  "CREATE INDEX history_of_shop ON history (shop_id, happened_at)",
  "CREATE INDEX history_of_subject ON history (subject_id, happened_at)",
  "CREATE INDEX history_of_engine ON history (engine_id, happened_at)",
  ...appendOnly("history"),
];

/** Shops, people, engines, the builds of their loop, what was measured, found, proposed and signed. */
export const theLoop = {
  up: (database: Kysely<unknown>) =>
    inOneTransaction(database, [...people, ...engines, ...builds, ...decisions]),
};
