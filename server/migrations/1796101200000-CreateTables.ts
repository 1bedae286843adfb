import type { MigrationInterface, QueryRunner } from 'typeorm';

const statements = [
  `create table laboratory (
    id uuid not null,
    name text not null,
    created_at timestamptz not null default now(),
    constraint pk_laboratory primary key (id)
  )`,
  `create table app_user (
    id uuid not null,
    name text not null,
    email text not null,
    password_hash text not null,
    created_at timestamptz not null default now(),
    constraint pk_app_user primary key (id),
    constraint uq_app_user_email unique (email),
    constraint ck_app_user_email check (email = lower(email))
  )`,
  `create table client (
    id uuid not null,
    laboratory_id uuid not null,
    name text not null,
    address text not null default '',
    created_at timestamptz not null default now(),
    constraint pk_client primary key (id),
    constraint uq_client_laboratory_id unique (laboratory_id, id),
    constraint uq_client_name unique (laboratory_id, name),
    constraint fk_client_laboratory_id foreign key (laboratory_id) references laboratory (id)
  )`,
  `create table membership (
    id uuid not null,
    laboratory_id uuid not null,
    user_id uuid not null,
    role text not null,
    client_id uuid,
    active boolean not null default true,
    created_at timestamptz not null default now(),
    constraint pk_membership primary key (id),
    constraint uq_membership_laboratory_user unique (laboratory_id, user_id),
    constraint uq_membership_laboratory_id unique (laboratory_id, id),
    constraint uq_membership_user_id unique (user_id, id),
    constraint ck_membership_role check (role in ('technician', 'reviewer', 'manager', 'client')),
    constraint ck_membership_client check ((role = 'client') = (client_id is not null)),
    constraint fk_membership_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_membership_user_id foreign key (user_id) references app_user (id),
    constraint fk_membership_client_id
      foreign key (laboratory_id, client_id) references client (laboratory_id, id)
  )`,
  `create index ix_membership_client on membership (client_id)`,
  `create table invitation (
    id uuid not null,
    laboratory_id uuid not null,
    email text not null,
    role text not null,
    client_id uuid,
    token_hash text not null,
    invited_by uuid not null,
    expires_at timestamptz not null,
    accepted_at timestamptz,
    withdrawn_at timestamptz,
    created_at timestamptz not null default now(),
    constraint pk_invitation primary key (id),
    constraint uq_invitation_token_hash unique (token_hash),
    constraint ck_invitation_role check (role in ('technician', 'reviewer', 'manager', 'client')),
    constraint ck_invitation_client check ((role = 'client') = (client_id is not null)),
    constraint ck_invitation_email check (email = lower(email)),
    constraint ck_invitation_end check (accepted_at is null or withdrawn_at is null),
    constraint fk_invitation_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_invitation_client_id
      foreign key (laboratory_id, client_id) references client (laboratory_id, id),
    constraint fk_invitation_invited_by
      foreign key (laboratory_id, invited_by) references membership (laboratory_id, user_id)
  )`,
  `create index ix_invitation_laboratory on invitation (laboratory_id, email)`,
  `create index ix_invitation_client on invitation (client_id)`,
  `create table refresh_session (
    id uuid not null,
    family_id uuid not null,
    user_id uuid not null,
    membership_id uuid not null,
    token_hash text not null,
    spent_at timestamptz,
    revoked_at timestamptz,
    expires_at timestamptz not null,
    created_at timestamptz not null default now(),
    constraint pk_refresh_session primary key (id),
    constraint uq_refresh_session_token_hash unique (token_hash),
    constraint fk_refresh_session_user_id_membership_id
      foreign key (user_id, membership_id) references membership (user_id, id),
    constraint fk_refresh_session_user_id foreign key (user_id) references app_user (id)
  )`,
  `create index ix_refresh_session_family on refresh_session (family_id)`,
  `create index ix_refresh_session_user on refresh_session (user_id)`,
  `create index ix_refresh_session_membership on refresh_session (membership_id)`,
  `create table password_reset (
    id uuid not null,
    user_id uuid not null,
    token_hash text not null,
    expires_at timestamptz not null,
    used_at timestamptz,
    created_at timestamptz not null default now(),
    constraint pk_password_reset primary key (id),
    constraint uq_password_reset_token_hash unique (token_hash),
    constraint fk_password_reset_user_id foreign key (user_id) references app_user (id)
  )`,
  `create index ix_password_reset_user on password_reset (user_id)`,
  `create table mail_message (
    id uuid not null,
    laboratory_id uuid,
    to_address text not null,
    subject text not null,
    body_text text not null,
    kind text not null,
    state text not null default 'waiting',
    attempts integer not null default 0,
    next_attempt_at timestamptz not null default now(),
    last_error text,
    sent_at timestamptz,
    created_at timestamptz not null default now(),
    constraint pk_mail_message primary key (id),
    constraint ck_mail_message_kind check (kind in ('invitation', 'password-reset', 'password-changed')),
    constraint ck_mail_message_state check (state in ('waiting', 'sent', 'failed')),
    constraint ck_mail_message_sent check ((state = 'sent') = (sent_at is not null)),
    constraint fk_mail_message_laboratory_id foreign key (laboratory_id) references laboratory (id)
  )`,
  `create index ix_mail_message_waiting on mail_message (next_attempt_at) where state = 'waiting'`,
  `create index ix_mail_message_laboratory on mail_message (laboratory_id)`,
  `create table laser (
    id uuid not null,
    laboratory_id uuid not null,
    name text not null,
    serial text not null default '',
    wavelength_nm double precision not null,
    wavelength_uncertainty_nm double precision not null,
    laser_class text not null,
    power_mw double precision,
    note text not null default '',
    created_at timestamptz not null default now(),
    constraint pk_laser primary key (id),
    constraint uq_laser_laboratory_id unique (laboratory_id, id),
    constraint uq_laser_name unique (laboratory_id, name),
    constraint ck_laser_wavelength check (wavelength_nm > 0 and wavelength_nm < 'infinity'),
    constraint ck_laser_wavelength_uncertainty
      check (wavelength_uncertainty_nm >= 0 and wavelength_uncertainty_nm < 'infinity'),
    constraint ck_laser_class check (laser_class in ('1', '1M', '2', '2M', '3R', '3B', '4')),
    constraint ck_laser_power check (power_mw > 0 and power_mw < 'infinity'),
    constraint fk_laser_laboratory_id foreign key (laboratory_id) references laboratory (id)
  )`,
  `create table camera (
    id uuid not null,
    laboratory_id uuid not null,
    name text not null,
    serial text not null default '',
    pixel_pitch_um double precision not null,
    pixel_pitch_uncertainty_um double precision not null,
    width_px integer not null,
    height_px integer not null,
    bit_depth integer not null,
    electrons_per_count double precision,
    read_noise_electrons double precision,
    black_count double precision,
    white_count double precision,
    cover_glass_mm double precision,
    cover_glass_index double precision,
    note text not null default '',
    created_at timestamptz not null default now(),
    constraint pk_camera primary key (id),
    constraint uq_camera_laboratory_id unique (laboratory_id, id),
    constraint uq_camera_name unique (laboratory_id, name),
    constraint ck_camera_pixel_pitch check (pixel_pitch_um > 0 and pixel_pitch_um < 'infinity'),
    constraint ck_camera_pixel_pitch_uncertainty
      check (pixel_pitch_uncertainty_um >= 0 and pixel_pitch_uncertainty_um < 'infinity'),
    constraint ck_camera_dimensions
      check (width_px > 0 and height_px > 0 and bit_depth >= 1 and bit_depth <= 16),
    constraint ck_camera_gain check (electrons_per_count > 0 and electrons_per_count < 'infinity'),
    constraint ck_camera_read_noise check (read_noise_electrons >= 0 and read_noise_electrons < 'infinity'),
    constraint ck_camera_levels check (black_count >= 0 and white_count > 0 and white_count > black_count),
    constraint ck_camera_cover_glass
      check (cover_glass_mm >= 0 and (cover_glass_mm = 0 or cover_glass_index is not null)),
    constraint ck_camera_cover_glass_index check (cover_glass_index >= 1 and cover_glass_index <= 3),
    constraint fk_camera_laboratory_id foreign key (laboratory_id) references laboratory (id)
  )`,
  `create table bench (
    id uuid not null,
    laboratory_id uuid not null,
    name text not null,
    created_at timestamptz not null default now(),
    constraint pk_bench primary key (id),
    constraint uq_bench_laboratory_id unique (laboratory_id, id),
    constraint uq_bench_name unique (laboratory_id, name),
    constraint fk_bench_laboratory_id foreign key (laboratory_id) references laboratory (id)
  )`,
  `create table bench_revision (
    id uuid not null,
    laboratory_id uuid not null,
    bench_id uuid not null,
    revision integer not null,
    laser_id uuid not null,
    camera_id uuid not null,
    distance_mm double precision not null,
    distance_uncertainty_mm double precision not null,
    illumination_kind text not null,
    source_distance_mm double precision,
    beam_radius_um double precision,
    note text not null default '',
    created_by uuid not null,
    created_at timestamptz not null default now(),
    constraint pk_bench_revision primary key (id),
    constraint uq_bench_revision_laboratory_id unique (laboratory_id, id),
    constraint uq_bench_revision_revision unique (bench_id, revision),
    constraint ck_bench_revision_revision check (revision >= 1),
    constraint ck_bench_revision_distance check (distance_mm > 0 and distance_mm < 'infinity'),
    constraint ck_bench_revision_distance_uncertainty
      check (distance_uncertainty_mm >= 0 and distance_uncertainty_mm < 'infinity'),
    constraint ck_bench_revision_illumination_kind
      check (illumination_kind in ('plane', 'diverging', 'gaussian')),
    constraint ck_bench_revision_source
      check ((illumination_kind = 'diverging') = (source_distance_mm is not null)),
    constraint ck_bench_revision_beam check ((illumination_kind = 'gaussian') = (beam_radius_um is not null)),
    constraint ck_bench_revision_source_distance
      check (source_distance_mm > 0 and source_distance_mm < 'infinity'),
    constraint ck_bench_revision_beam_radius check (beam_radius_um > 0 and beam_radius_um < 'infinity'),
    constraint fk_bench_revision_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_bench_revision_bench_id
      foreign key (laboratory_id, bench_id) references bench (laboratory_id, id),
    constraint fk_bench_revision_laser_id
      foreign key (laboratory_id, laser_id) references laser (laboratory_id, id),
    constraint fk_bench_revision_camera_id
      foreign key (laboratory_id, camera_id) references camera (laboratory_id, id),
    constraint fk_bench_revision_created_by
      foreign key (laboratory_id, created_by) references membership (laboratory_id, user_id)
  )`,
  `create index ix_bench_revision_laser on bench_revision (laser_id)`,
  `create index ix_bench_revision_camera on bench_revision (camera_id)`,
  `create table lot (
    id uuid not null,
    laboratory_id uuid not null,
    number text not null,
    client_id uuid not null,
    order_reference text not null default '',
    due_on date,
    note text not null default '',
    created_at timestamptz not null default now(),
    constraint pk_lot primary key (id),
    constraint uq_lot_laboratory_id unique (laboratory_id, id),
    constraint uq_lot_number unique (laboratory_id, number),
    constraint fk_lot_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_lot_client_id foreign key (laboratory_id, client_id) references client (laboratory_id, id)
  )`,
  `create index ix_lot_client on lot (client_id)`,
  `create table aperture (
    id uuid not null,
    laboratory_id uuid not null,
    lot_id uuid not null,
    serial text not null,
    kind text not null,
    nominal_size_um double precision not null,
    tolerance_um double precision,
    note text not null default '',
    created_at timestamptz not null default now(),
    constraint pk_aperture primary key (id),
    constraint uq_aperture_laboratory_id unique (laboratory_id, id),
    constraint uq_aperture_serial unique (lot_id, serial),
    constraint ck_aperture_kind check (kind in ('pinhole', 'slit', 'wire', 'edge', 'beam')),
    constraint ck_aperture_nominal_size check (nominal_size_um > 0 and nominal_size_um < 'infinity'),
    constraint ck_aperture_tolerance check (tolerance_um >= 0 and tolerance_um < 'infinity'),
    constraint fk_aperture_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_aperture_lot_id foreign key (laboratory_id, lot_id) references lot (laboratory_id, id)
  )`,
  `create table capture (
    id uuid not null,
    laboratory_id uuid not null,
    aperture_id uuid not null,
    bench_revision_id uuid not null,
    note text not null default '',
    created_by uuid not null,
    created_at timestamptz not null default now(),
    constraint pk_capture primary key (id),
    constraint uq_capture_laboratory_id unique (laboratory_id, id),
    constraint fk_capture_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_capture_aperture_id
      foreign key (laboratory_id, aperture_id) references aperture (laboratory_id, id),
    constraint fk_capture_bench_revision_id
      foreign key (laboratory_id, bench_revision_id) references bench_revision (laboratory_id, id),
    constraint fk_capture_created_by
      foreign key (laboratory_id, created_by) references membership (laboratory_id, user_id)
  )`,
  `create index ix_capture_aperture on capture (aperture_id)`,
  `create index ix_capture_bench_revision on capture (bench_revision_id)`,
  `create index ix_capture_created_at on capture (laboratory_id, created_at)`,
  `create table frame (
    id uuid not null,
    laboratory_id uuid not null,
    sha256 text,
    byte_size integer not null default 0,
    chunk_count integer not null default 0,
    state text not null default 'storing',
    problem text,
    format text,
    width_px integer,
    height_px integer,
    bit_depth integer,
    exposure_ms double precision,
    black_count double precision,
    white_count double precision,
    peak_counts double precision,
    peak_fraction double precision,
    clipped_fraction double precision,
    noise_counts double precision,
    attempts integer not null default 0,
    lease_until timestamptz,
    lease_owner text,
    created_at timestamptz not null default now(),
    constraint pk_frame primary key (id),
    constraint uq_frame_laboratory_id unique (laboratory_id, id),
    constraint uq_frame_sha256 unique (laboratory_id, sha256),
    constraint ck_frame_sha256 check (sha256 ~ '^[0-9a-f]{64}$'),
    constraint ck_frame_stored
      check (state = 'storing' or (sha256 is not null and byte_size > 0 and chunk_count > 0)),
    constraint ck_frame_state check (state in ('storing', 'stored', 'ready', 'unusable')),
    constraint ck_frame_problem check ((state = 'unusable') = (problem is not null)),
    constraint ck_frame_sizes
      check (byte_size >= 0 and chunk_count >= 0 and width_px > 0 and height_px > 0 and bit_depth > 0),
    constraint ck_frame_ready
      check (state <> 'ready' or (
        format is not null and width_px is not null and height_px is not null and bit_depth is not null
      )),
    constraint ck_frame_attempts check (attempts >= 0),
    constraint ck_frame_lease check ((lease_owner is null) = (lease_until is null)),
    constraint fk_frame_laboratory_id foreign key (laboratory_id) references laboratory (id)
  )`,
  `create index ix_frame_stored on frame (lease_until) where state = 'stored'`,
  `create table frame_chunk (
    frame_id uuid not null,
    position integer not null,
    bytes bytea not null,
    constraint pk_frame_chunk primary key (frame_id, position),
    constraint ck_frame_chunk_position check (position >= 0),
    constraint ck_frame_chunk_bytes check (octet_length(bytes) >= 1 and octet_length(bytes) <= 1048576),
    constraint fk_frame_chunk_frame_id foreign key (frame_id) references frame (id) on delete cascade
  )`,
  `create table capture_frame (
    id uuid not null,
    laboratory_id uuid not null,
    capture_id uuid not null,
    frame_id uuid not null,
    kind text not null,
    name text not null,
    left_out boolean not null default false,
    created_by uuid not null,
    created_at timestamptz not null default now(),
    constraint pk_capture_frame primary key (id),
    constraint uq_capture_frame_laboratory_id unique (laboratory_id, id),
    constraint uq_capture_frame_capture_id unique (laboratory_id, capture_id, id),
    constraint uq_capture_frame_frame unique (capture_id, frame_id),
    constraint ck_capture_frame_kind check (kind in ('light', 'dark', 'flat')),
    constraint fk_capture_frame_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_capture_frame_capture_id
      foreign key (laboratory_id, capture_id) references capture (laboratory_id, id),
    constraint fk_capture_frame_frame_id
      foreign key (laboratory_id, frame_id) references frame (laboratory_id, id),
    constraint fk_capture_frame_created_by
      foreign key (laboratory_id, created_by) references membership (laboratory_id, user_id)
  )`,
  `create index ix_capture_frame_frame on capture_frame (frame_id)`,
  `create table measurement (
    id uuid not null,
    laboratory_id uuid not null,
    capture_id uuid not null,
    capture_frame_id uuid not null,
    state text not null default 'waiting',
    stage text,
    settings jsonb not null,
    inputs jsonb,
    result jsonb,
    size_um double precision,
    standard_uncertainty_um double precision,
    fit_uncertainty_um double precision,
    expanded_uncertainty_um double precision,
    coverage_factor double precision,
    reason text,
    message text,
    flags text[] not null default '{}',
    dark_count integer not null default 0,
    attempts integer not null default 0,
    lease_until timestamptz,
    lease_owner text,
    created_by uuid not null,
    started_at timestamptz,
    finished_at timestamptz,
    created_at timestamptz not null default now(),
    constraint pk_measurement primary key (id),
    constraint uq_measurement_laboratory_id unique (laboratory_id, id),
    constraint ck_measurement_state check (state in ('waiting', 'measuring', 'measured', 'refused', 'failed')),
    constraint ck_measurement_stage check (stage in ('decode', 'calibrate', 'centre', 'profile', 'fit')),
    constraint ck_measurement_reason_word
      check (reason in (
        'no-pattern', 'two-patterns', 'wrong-pattern', 'too-few-rings', 'clipped', 'under-sampled',
        'centre-not-found', 'low-signal', 'unreadable', 'unsupported', 'too-large', 'timed-out', 'bad-case'
      )),
    constraint ck_measurement_finished
      check ((state in ('measured', 'refused', 'failed')) = (finished_at is not null)),
    constraint ck_measurement_reason check ((state in ('refused', 'failed')) = (reason is not null)),
    constraint ck_measurement_result check ((state in ('measured', 'refused', 'failed')) = (result is not null)),
    constraint ck_measurement_size_state check (size_um is null or state = 'measured'),
    constraint ck_measurement_size check (size_um > 0 and size_um < 'infinity'),
    constraint ck_measurement_standard_uncertainty
      check (standard_uncertainty_um >= 0 and standard_uncertainty_um < 'infinity'),
    constraint ck_measurement_fit_uncertainty
      check (fit_uncertainty_um >= 0 and fit_uncertainty_um < 'infinity'),
    constraint ck_measurement_expanded_uncertainty
      check (expanded_uncertainty_um >= 0 and expanded_uncertainty_um < 'infinity'),
    constraint ck_measurement_coverage_factor check (coverage_factor > 0 and coverage_factor < 'infinity'),
    constraint ck_measurement_counts check (dark_count >= 0 and attempts >= 0),
    constraint ck_measurement_lease check ((lease_owner is null) = (lease_until is null)),
    constraint fk_measurement_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_measurement_capture_id_capture_frame_id
      foreign key (laboratory_id, capture_id, capture_frame_id) references capture_frame (laboratory_id, capture_id, id),
    constraint fk_measurement_created_by
      foreign key (laboratory_id, created_by) references membership (laboratory_id, user_id)
  )`,
  `create index ix_measurement_capture_frame on measurement (capture_frame_id, created_at)`,
  `create index ix_measurement_capture on measurement (capture_id)`,
  `create index ix_measurement_created_at on measurement (laboratory_id, created_at)`,
  `create index ix_measurement_unfinished on measurement (lease_until) where state in ('waiting', 'measuring')`,
  `create table rendition (
    id uuid not null,
    laboratory_id uuid not null,
    frame_id uuid,
    measurement_id uuid,
    kind text not null,
    width_px integer not null,
    height_px integer not null,
    encoding text not null,
    bytes bytea not null,
    created_at timestamptz not null default now(),
    constraint pk_rendition primary key (id),
    constraint uq_rendition_frame_kind unique (frame_id, kind),
    constraint uq_rendition_measurement_kind unique (measurement_id, kind),
    constraint ck_rendition_kind check (kind in ('thumbnail', 'plane', 'misfit')),
    constraint ck_rendition_owner
      check ((kind = 'misfit') = (measurement_id is not null) and num_nonnulls(frame_id, measurement_id) = 1),
    constraint ck_rendition_dimensions check (width_px > 0 and height_px > 0),
    constraint fk_rendition_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_rendition_frame_id foreign key (laboratory_id, frame_id) references frame (laboratory_id, id),
    constraint fk_rendition_measurement_id
      foreign key (laboratory_id, measurement_id) references measurement (laboratory_id, id)
  )`,
  `create table profile (
    id uuid not null,
    laboratory_id uuid not null,
    measurement_id uuid not null,
    radius_mm double precision[] not null,
    mean_counts double precision[] not null,
    standard_error_counts double precision[] not null,
    pixel_count integer[] not null,
    model_counts double precision[] not null,
    created_at timestamptz not null default now(),
    constraint pk_profile primary key (id),
    constraint uq_profile_measurement unique (measurement_id),
    constraint ck_profile_lengths
      check (
        cardinality(mean_counts) = cardinality(radius_mm)
        and cardinality(standard_error_counts) = cardinality(radius_mm)
        and cardinality(pixel_count) = cardinality(radius_mm)
        and cardinality(model_counts) = cardinality(radius_mm)
      ),
    constraint fk_profile_laboratory_id foreign key (laboratory_id) references laboratory (id),
    constraint fk_profile_measurement_id
      foreign key (laboratory_id, measurement_id) references measurement (laboratory_id, id)
  )`,
];

const tablesInOrder = [...statements.join('\n').matchAll(/^create table (\w+)/gm)].map((match) => match[1]);

/** Every table with its constraints and indexes. */
export class CreateTables1796101200000 implements MigrationInterface {
  name = 'CreateTables1796101200000';

  async up(queryRunner: QueryRunner): Promise<void> {
    for (const statement of statements) await queryRunner.query(statement);
  }

  async down(queryRunner: QueryRunner): Promise<void> {
    for (const table of tablesInOrder.toReversed()) await queryRunner.query(`drop table ${table}`);
  }
}
