import type { Sequelize } from 'sequelize';

/** Pressures are gauge kPa between vacuum's edge and 1400, the engine's own range. */
const pressure = (column: string, least = 0) =>
  `${column} double precision NOT NULL CHECK (${column} >= ${least} AND ${column} <= 1400)`;

const tables = `
CREATE TABLE users (
  id uuid PRIMARY KEY,
  email text NOT NULL UNIQUE CHECK (email = lower(email) AND email LIKE '%_@_%'),
  name text NOT NULL DEFAULT '',
  pressure_unit text NOT NULL DEFAULT 'psi' CHECK (pressure_unit IN ('psi', 'kPa', 'bar')),
  created_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE sign_in_challenges (
  id uuid PRIMARY KEY,
  email text NOT NULL,
  code_hmac text NOT NULL,
  client text NOT NULL,
  tries integer NOT NULL DEFAULT 0 CHECK (tries >= 0),
  created_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL,
  used_at timestamptz
);
CREATE INDEX sign_in_challenges_by_email ON sign_in_challenges (email, created_at);
CREATE INDEX sign_in_challenges_by_client ON sign_in_challenges (client, created_at);

CREATE TABLE login_sessions (
  id uuid PRIMARY KEY,
  token_hash text NOT NULL UNIQUE,
  user_id uuid NOT NULL REFERENCES users ON DELETE CASCADE,
  user_agent text NOT NULL DEFAULT '',
  created_at timestamptz NOT NULL DEFAULT now(),
  seen_at timestamptz NOT NULL DEFAULT now(),
  expires_at timestamptz NOT NULL,
  ended_at timestamptz
);
CREATE INDEX login_sessions_by_user ON login_sessions (user_id);

CREATE TABLE coaches (
  id uuid PRIMARY KEY,
  name text NOT NULL CHECK (length(name) BETWEEN 1 AND 80),
  layout text NOT NULL CHECK (layout IN ('two-axles', 'with-tag')),
  ${pressure('tolerance_kpa', 1)},
  lower_by text[] NOT NULL DEFAULT '{}' CHECK (lower_by <@ ARRAY['pedal', 'drain']),
  created_at timestamptz NOT NULL DEFAULT now(),
  deleted_at timestamptz
);

CREATE TABLE memberships (
  id uuid PRIMARY KEY,
  user_id uuid NOT NULL REFERENCES users ON DELETE CASCADE,
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  role text NOT NULL CHECK (role IN ('owner', 'driver', 'helper', 'viewer')),
  valid_from timestamptz NOT NULL DEFAULT now(),
  valid_until timestamptz
);
CREATE UNIQUE INDEX memberships_one_in_force ON memberships (user_id, coach_id)
  WHERE valid_until IS NULL;

CREATE TABLE axles (
  id uuid PRIMARY KEY,
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  kind text NOT NULL CHECK (kind IN ('steer', 'drive', 'tag')),
  UNIQUE (coach_id, kind)
);

CREATE TABLE axle_targets (
  id uuid PRIMARY KEY,
  axle_id uuid NOT NULL REFERENCES axles ON DELETE CASCADE,
  ${pressure('target_kpa', 100)},
  source text NOT NULL CHECK (source IN ('typed')),
  set_by uuid REFERENCES users ON DELETE SET NULL,
  set_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX axle_targets_newest ON axle_targets (axle_id, set_at DESC);

CREATE TABLE tires (
  id uuid PRIMARY KEY,
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  size text NOT NULL CHECK (length(size) BETWEEN 1 AND 40),
  ${pressure('sidewall_limit_kpa', 100)},
  volume_l double precision NOT NULL CHECK (volume_l BETWEEN 5 AND 1000),
  volume_source text NOT NULL CHECK (volume_source IN ('estimated', 'typed')),
  created_at timestamptz NOT NULL DEFAULT now()
);

CREATE TABLE fittings (
  id uuid PRIMARY KEY,
  tire_id uuid NOT NULL REFERENCES tires ON DELETE CASCADE,
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  position text NOT NULL CHECK (position IN (
    'steer-left', 'steer-right', 'drive-left-outer', 'drive-left-inner',
    'drive-right-inner', 'drive-right-outer', 'tag-left', 'tag-right')),
  wheel_limit_kpa double precision NOT NULL CHECK (wheel_limit_kpa BETWEEN 100 AND 1400),
  fitted_from timestamptz NOT NULL DEFAULT now(),
  fitted_until timestamptz CHECK (fitted_until >= fitted_from)
);
CREATE UNIQUE INDEX fittings_one_at_a_position ON fittings (coach_id, position)
  WHERE fitted_until IS NULL;
CREATE UNIQUE INDEX fittings_one_place_for_a_tire ON fittings (tire_id)
  WHERE fitted_until IS NULL;

CREATE TABLE rigs (
  id uuid PRIMARY KEY,
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  hose text NOT NULL CHECK (length(hose) BETWEEN 1 AND 60),
  chuck text NOT NULL CHECK (length(chuck) BETWEEN 1 AND 60),
  gauge text NOT NULL CHECK (length(gauge) BETWEEN 1 AND 60),
  gauge_place text NOT NULL
    CHECK (gauge_place IN ('at-chuck', 'above-valve', 'below-valve', 'dash-only')),
  has_valve boolean NOT NULL,
  step_kpa double precision NOT NULL CHECK (step_kpa > 0 AND step_kpa <= 100),
  created_at timestamptz NOT NULL DEFAULT now(),
  retired_at timestamptz
);
CREATE UNIQUE INDEX rigs_one_in_use ON rigs (coach_id) WHERE retired_at IS NULL;

CREATE TABLE fitting_tests (
  id uuid PRIMARY KEY,
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  outcome text NOT NULL CHECK (outcome IN ('follows-supply', 'accessory-tank', 'no-air')),
  tested_at timestamptz NOT NULL DEFAULT now(),
  tested_by uuid REFERENCES users ON DELETE SET NULL
);
CREATE INDEX fitting_tests_newest ON fitting_tests (coach_id, tested_at DESC);

CREATE TABLE rounds (
  id uuid PRIMARY KEY,
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  started_by uuid REFERENCES users ON DELETE SET NULL,
  device_id uuid NOT NULL,
  place text NOT NULL CHECK (length(place) <= 120),
  altitude_m double precision NOT NULL CHECK (altitude_m BETWEEN -500 AND 5000),
  ambient_c double precision NOT NULL CHECK (ambient_c BETWEEN -50 AND 60),
  time_zone text NOT NULL CHECK (length(time_zone) BETWEEN 1 AND 60),
  with_helper boolean NOT NULL,
  started_at timestamptz NOT NULL,
  cautions_at timestamptz,
  closed_at timestamptz,
  afterwards text[] NOT NULL DEFAULT '{}',
  received_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX rounds_newest ON rounds (coach_id, started_at DESC);

CREATE TABLE cold_readings (
  id uuid PRIMARY KEY,
  round_id uuid NOT NULL REFERENCES rounds ON DELETE CASCADE,
  tire_id uuid NOT NULL REFERENCES tires ON DELETE CASCADE,
  position text NOT NULL,
  ${pressure('pressure_kpa')},
  ${pressure('target_kpa', 100)},
  warm boolean NOT NULL,
  read_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL DEFAULT now()
);
CREATE INDEX cold_readings_by_round ON cold_readings (round_id, tire_id, read_at);
CREATE INDEX cold_readings_by_tire ON cold_readings (tire_id, read_at DESC);

CREATE TABLE runs (
  id uuid PRIMARY KEY,
  kind text NOT NULL CHECK (kind IN ('fill')),
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  round_id uuid NOT NULL REFERENCES rounds ON DELETE CASCADE,
  tire_id uuid NOT NULL REFERENCES tires ON DELETE CASCADE,
  position text NOT NULL,
  setup jsonb NOT NULL,
  engine_version text NOT NULL,
  rig_key text NOT NULL,
  started_by uuid REFERENCES users ON DELETE SET NULL,
  device_id uuid NOT NULL,
  started_at timestamptz NOT NULL,
  received_at timestamptz NOT NULL DEFAULT now(),
  last_seq integer NOT NULL DEFAULT 0 CHECK (last_seq >= 0),
  ended_seq integer CHECK (ended_seq BETWEEN 1 AND last_seq),
  overlapping boolean NOT NULL DEFAULT false
);
CREATE UNIQUE INDEX runs_one_open_fill ON runs (coach_id)
  WHERE kind = 'fill' AND ended_seq IS NULL AND NOT overlapping;
CREATE INDEX runs_by_round ON runs (round_id, started_at);

CREATE TABLE run_events (
  run_id uuid NOT NULL REFERENCES runs ON DELETE CASCADE,
  seq integer NOT NULL CHECK (seq >= 1),
  id uuid NOT NULL,
  type text NOT NULL,
  at_ms integer NOT NULL CHECK (at_ms BETWEEN 0 AND 86400000),
  body jsonb NOT NULL,
  side text NOT NULL CHECK (side IN ('wheel', 'cab')),
  actor_id uuid REFERENCES users ON DELETE SET NULL,
  device_id uuid NOT NULL,
  device_seq integer NOT NULL CHECK (device_seq >= 0),
  device_time timestamptz NOT NULL,
  offset_ms integer,
  suspect boolean NOT NULL DEFAULT false,
  received_at timestamptz NOT NULL DEFAULT now(),
  PRIMARY KEY (run_id, seq),
  UNIQUE (run_id, id)
);

CREATE TABLE run_results (
  id uuid PRIMARY KEY,
  run_id uuid NOT NULL REFERENCES runs ON DELETE CASCADE,
  engine_version text NOT NULL,
  last_seq integer NOT NULL,
  result jsonb NOT NULL,
  computed_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (run_id, engine_version, last_seq)
);

CREATE TABLE air_profiles (
  id uuid PRIMARY KEY,
  coach_id uuid NOT NULL REFERENCES coaches ON DELETE CASCADE,
  rig_key text NOT NULL,
  run_id uuid REFERENCES runs ON DELETE CASCADE,
  schema_version integer NOT NULL,
  engine_version text NOT NULL,
  profile jsonb NOT NULL,
  learned_at timestamptz NOT NULL DEFAULT now(),
  UNIQUE (run_id)
);
CREATE INDEX air_profiles_newest ON air_profiles (coach_id, rig_key, learned_at DESC);
`;

export async function up({ context }: { context: Sequelize }): Promise<void> {
  await context.query(tables);
}
