/**
 * The first schema. Every row of a team carries `team_id`, and every key between two rows of a team is composite with it,
 * so that PostgreSQL itself refuses a row that points into another team.
 */
export const name = '0001-foundation';

export const up = `
create extension if not exists unaccent;
create extension if not exists btree_gist;

-- no stop words: "pull up" keeps its "up"
create text search dictionary coach_stem (template = snowball, language = english);
create text search configuration coach (copy = pg_catalog.english);
alter text search configuration coach alter mapping for asciiword, hword_asciipart with coach_stem;
alter text search configuration coach alter mapping for word, hword_part with unaccent, coach_stem;
alter text search configuration coach drop mapping for asciihword, hword, numhword;

create table people (
  id uuid primary key default gen_random_uuid(),
  email text not null check (email = lower(email) and email like '%_@_%'),
  name text not null,
  password_hash text,
  -- when the first-use notice was read
  notice_read_at timestamptz,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  unique (email)
);

create table teams (
  id uuid primary key default gen_random_uuid(),
  slug text not null unique check (slug ~ '^[a-z0-9]+(-[a-z0-9]+)*$'),
  name text not null,
  time_zone text not null,
  -- bumped with every change of a movement, its names or the kit, so that processes know when their copy is old
  dictionary_version integer not null default 0,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now()
);

create table memberships (
  team_id uuid not null references teams (id) on delete cascade,
  person_id uuid not null references people (id) on delete cascade,
  role text not null check (role in ('owner', 'coach', 'editor', 'member')),
  -- when the person last said what kit they own; tells "nothing" from "not asked yet"
  kit_told_at timestamptz,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (team_id, person_id)
);
create index memberships_of_person on memberships (person_id);

-- links sent by mail: an invitation into a team, or a new password; only a hash of the secret is kept
create table mail_links (
  id uuid primary key default gen_random_uuid(),
  secret_hash text not null unique,
  purpose text not null check (purpose in ('join', 'reset')),
  team_id uuid references teams (id) on delete cascade,
  person_id uuid references people (id) on delete cascade,
  email text not null,
  name text,
  role text check (role in ('owner', 'coach', 'editor', 'member')),
  invited_by_id uuid references people (id) on delete set null,
  expires_at timestamptz not null,
  used_at timestamptz,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  check (case purpose when 'join' then team_id is not null and role is not null else person_id is not null end)
);
create index mail_links_of_team on mail_links (team_id, created_at desc) where used_at is null;

-- connect-pg-simple's table
create table sign_ins (
  sid text primary key,
  sess json not null,
  expire timestamptz not null
);
create index sign_ins_expire on sign_ins (expire);
create index sign_ins_of_person on sign_ins ((sess -> 'passport' ->> 'user'));

-- rate-limiter-flexible's table
create table rate_limits (
  key varchar(255) primary key,
  points integer not null default 0,
  expire bigint
);

create table kit_items (
  team_id uuid not null references teams (id) on delete cascade,
  id uuid not null default gen_random_uuid(),
  name text not null,
  other_names text[] not null default '{}',
  -- how its absence is said: "nothing to hang from"
  without_text text not null,
  load_matters boolean not null default false,
  version integer not null default 1,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id)
);
create unique index kit_items_name on kit_items (team_id, lower(name));

create table member_kit (
  team_id uuid not null,
  person_id uuid not null,
  kit_item_id uuid not null,
  count integer not null check (count between 1 and 50),
  loads_kg numeric(6, 2)[] not null default '{}',
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (team_id, person_id, kit_item_id),
  foreign key (team_id, person_id) references memberships (team_id, person_id) on delete cascade,
  foreign key (team_id, kit_item_id) references kit_items (team_id, id) on delete cascade
);

create table movements (
  team_id uuid not null references teams (id) on delete cascade,
  id uuid not null default gen_random_uuid(),
  name text not null,
  other_names text[] not null default '{}',
  pattern text not null check (pattern in ('squat', 'hinge', 'lunge', 'push', 'pull', 'carry', 'rotation/brace', 'jump', 'locomotion', 'hold/stretch')),
  kit_needed jsonb not null default '[]',
  points text[] not null default '{}',
  faults text[] not null default '{}',
  cautions jsonb not null default '[]',
  picture_name text,
  -- a duplicate that was merged keeps its row, so that old links lead on
  merged_into_id uuid,
  version integer not null default 1,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  foreign key (team_id, merged_into_id) references movements (team_id, id),
  check (merged_into_id is distinct from id)
);
create unique index movements_name on movements (team_id, lower(name)) where merged_into_id is null;

create table substitutions (
  team_id uuid not null references teams (id) on delete cascade,
  id uuid not null default gen_random_uuid(),
  from_movement_id uuid not null,
  to_movement_id uuid not null,
  missing text not null check (missing in ('kit', 'space', 'ability')),
  missing_kit_item_id uuid,
  dose_rule jsonb not null,
  reason text not null,
  version integer not null default 1,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  foreign key (team_id, from_movement_id) references movements (team_id, id) on delete cascade,
  foreign key (team_id, to_movement_id) references movements (team_id, id) on delete cascade,
  foreign key (team_id, missing_kit_item_id) references kit_items (team_id, id),
  check (from_movement_id <> to_movement_id),
  check ((missing = 'kit') = (missing_kit_item_id is not null))
);
create unique index substitutions_once on substitutions (team_id, from_movement_id, to_movement_id, missing, coalesce(missing_kit_item_id, '00000000-0000-0000-0000-000000000000'));
create index substitutions_to on substitutions (team_id, to_movement_id);

create table sessions (
  team_id uuid not null references teams (id) on delete cascade,
  id uuid not null default gen_random_uuid(),
  date date not null,
  title text not null,
  note text not null default '',
  -- the score to aim for, in the coach's words
  aim text not null default '',
  coach_id uuid references people (id) on delete set null,
  state text not null default 'draft' check (state in ('draft', 'published')),
  published_at timestamptz,
  version integer not null default 1,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  check ((state = 'published') = (published_at is not null))
);
create index sessions_by_date on sessions (team_id, date desc, id desc);

create table blocks (
  team_id uuid not null,
  id uuid not null default gen_random_uuid(),
  session_id uuid not null,
  position integer not null check (position >= 0),
  kind text not null check (kind in ('briefing', 'warm-up', 'activation', 'mobility', 'workout', 'accessory', 'cool-down')),
  title text not null default '',
  scheme jsonb,
  note text not null default '',
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  unique (session_id, position) deferrable initially deferred,
  foreign key (team_id, session_id) references sessions (team_id, id) on delete cascade
);

create table block_lines (
  team_id uuid not null,
  id uuid not null default gen_random_uuid(),
  block_id uuid not null,
  position integer not null check (position >= 0),
  movement_id uuid not null,
  dose jsonb not null,
  note text not null default '',
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  unique (block_id, position) deferrable initially deferred,
  foreign key (team_id, block_id) references blocks (team_id, id) on delete cascade,
  foreign key (team_id, movement_id) references movements (team_id, id)
);
create index block_lines_of_movement on block_lines (team_id, movement_id);

create table line_substitutions (
  team_id uuid not null,
  id uuid not null default gen_random_uuid(),
  line_id uuid not null,
  position integer not null check (position >= 0),
  movement_id uuid not null,
  missing text not null check (missing in ('kit', 'space', 'ability')),
  missing_kit_item_id uuid,
  dose jsonb not null,
  reason text not null default '',
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (line_id, position) deferrable initially deferred,
  foreign key (team_id, line_id) references block_lines (team_id, id) on delete cascade,
  foreign key (team_id, movement_id) references movements (team_id, id),
  foreign key (team_id, missing_kit_item_id) references kit_items (team_id, id),
  check ((missing = 'kit') = (missing_kit_item_id is not null))
);
create index line_substitutions_of_movement on line_substitutions (team_id, movement_id);

create table recordings (
  team_id uuid not null references teams (id) on delete cascade,
  id uuid not null default gen_random_uuid(),
  session_id uuid,
  coach_id uuid references people (id) on delete set null,
  title text not null,
  take integer not null default 1 check (take >= 1),
  file_name text not null,
  size_bytes bigint not null check (size_bytes >= 0),
  content_type text not null,
  sha256 text,
  original_key text,
  state text not null default 'uploading' check (state in ('uploading', 'making', 'ready', 'failed')),
  -- { code, message, retry } in a coach's words
  failure jsonb,
  duration_ms integer check (duration_ms > 0),
  width integer,
  height integer,
  fps numeric(8, 4),
  recorded_at timestamptz,
  chapters_version integer not null default 0,
  cues_version integer not null default 0,
  version integer not null default 1,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  foreign key (team_id, session_id) references sessions (team_id, id) on delete set null (session_id),
  check (state <> 'ready' or duration_ms is not null)
);
create index recordings_newest on recordings (team_id, created_at desc, id desc);
create index recordings_of_session on recordings (team_id, session_id, take);

create table recording_steps (
  team_id uuid not null,
  recording_id uuid not null,
  step text not null check (step in ('drawing', 'probe', 'poster', 'playback', 'chapterPictures')),
  state text not null default 'waiting' check (state in ('waiting', 'running', 'done', 'failed')),
  percent integer not null default 0 check (percent between 0 and 100),
  -- the job, with its input, whose result this is: a finished step is not done again
  input text,
  started_at timestamptz,
  ended_at timestamptz,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (recording_id, step),
  foreign key (team_id, recording_id) references recordings (team_id, id) on delete cascade
);

create table recording_assets (
  team_id uuid not null,
  id uuid not null default gen_random_uuid(),
  recording_id uuid not null,
  kind text not null check (kind in ('playback', 'poster', 'chapterPicture')),
  -- the last part of its key in the store, derived from its input
  name text not null,
  chapter_id uuid,
  at_ms integer,
  content_type text not null,
  size_bytes bigint not null,
  width integer,
  height integer,
  details jsonb not null default '{}',
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (recording_id, name),
  foreign key (team_id, recording_id) references recordings (team_id, id) on delete cascade
);
create index recording_assets_by_kind on recording_assets (recording_id, kind);

create table uploads (
  team_id uuid not null,
  id uuid not null default gen_random_uuid(),
  recording_id uuid not null,
  person_id uuid not null references people (id) on delete cascade,
  -- the client's own key for one picked file, so that a double click makes one upload
  request_key uuid not null,
  object_key text not null unique,
  store_upload_id text not null,
  part_bytes bigint not null check (part_bytes > 0),
  part_count integer not null check (part_count between 1 and 10000),
  size_bytes bigint not null check (size_bytes > 0),
  state text not null default 'open' check (state in ('open', 'completed', 'aborted')),
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  unique (team_id, person_id, request_key),
  foreign key (team_id, recording_id) references recordings (team_id, id) on delete cascade
);

create table upload_parts (
  team_id uuid not null,
  upload_id uuid not null,
  number integer not null check (number between 1 and 10000),
  etag text not null,
  size_bytes bigint not null check (size_bytes > 0),
  sha256 text not null,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (upload_id, number),
  foreign key (team_id, upload_id) references uploads (team_id, id) on delete cascade
);

create table chapters (
  team_id uuid not null,
  id uuid not null,
  recording_id uuid not null,
  start_ms integer not null check (start_ms >= 0),
  end_ms integer not null,
  kind text not null check (kind in ('briefing', 'warm-up', 'activation', 'mobility', 'demo', 'substitution', 'workout', 'accessory', 'cool-down', 'aside')),
  title text not null,
  note text not null default '',
  block_id uuid,
  movement_id uuid,
  stands_in_for_movement_id uuid,
  missing text check (missing in ('kit', 'space', 'ability')),
  missing_kit_item_id uuid,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  foreign key (team_id, recording_id) references recordings (team_id, id) on delete cascade,
  foreign key (team_id, block_id) references blocks (team_id, id) on delete set null (block_id),
  foreign key (team_id, movement_id) references movements (team_id, id),
  foreign key (team_id, stands_in_for_movement_id) references movements (team_id, id),
  foreign key (team_id, missing_kit_item_id) references kit_items (team_id, id),
  constraint chapter_has_length check (end_ms > start_ms),
  -- W3C WebVTT, "WebVTT file using chapter title text": one after another or nested; here they never nest
  constraint chapters_follow_one_another exclude using gist (recording_id with =, int4range(start_ms, end_ms) with &&) deferrable initially deferred
);
create index chapters_in_order on chapters (recording_id, start_ms);
create index chapters_of_movement on chapters (team_id, movement_id);

create function chapter_inside_recording() returns trigger language plpgsql as $$
begin
  if not exists (select 1 from recordings r where r.id = new.recording_id and r.duration_ms is not null and new.end_ms <= r.duration_ms) then
    raise exception 'chapter % ends outside its recording', new.id using errcode = 'check_violation', constraint = 'chapter_inside_recording';
  end if;
  return null;
end $$;
create constraint trigger chapter_inside_recording after insert or update of end_ms, recording_id on chapters
  deferrable initially deferred for each row execute function chapter_inside_recording();

create table caption_tracks (
  team_id uuid not null,
  id uuid not null default gen_random_uuid(),
  recording_id uuid not null,
  language text not null default 'en',
  version integer not null default 0,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  unique (team_id, id),
  unique (recording_id, language),
  foreign key (team_id, recording_id) references recordings (team_id, id) on delete cascade
);

create table caption_lines (
  team_id uuid not null,
  track_id uuid not null,
  position integer not null check (position >= 0),
  start_ms integer not null check (start_ms >= 0),
  end_ms integer not null,
  text text not null check (text <> ''),
  primary key (track_id, position),
  foreign key (team_id, track_id) references caption_tracks (team_id, id) on delete cascade,
  check (end_ms > start_ms)
);

create table cues (
  team_id uuid not null,
  id uuid not null,
  recording_id uuid not null,
  at_ms integer not null check (at_ms >= 0),
  kind text not null default 'go' check (kind in ('set-up', 'go', 'safety')),
  text text not null check (text <> ''),
  movement_id uuid,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  foreign key (team_id, recording_id) references recordings (team_id, id) on delete cascade,
  foreign key (team_id, movement_id) references movements (team_id, id)
);
create index cues_in_order on cues (recording_id, at_ms);

-- every saved version of a recording's chapters, cues and captions, whole, with its author
create table document_versions (
  team_id uuid not null,
  recording_id uuid not null,
  document text not null check (document in ('chapters', 'cues', 'captions')),
  version integer not null,
  author_id uuid references people (id) on delete set null,
  how text not null check (how in ('edit', 'import', 'restore', 'made')),
  -- of a restore: the version that was brought back; of an import: the file's name
  origin text,
  content jsonb not null,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (recording_id, document, version),
  foreign key (team_id, recording_id) references recordings (team_id, id) on delete cascade
);

create table watch_places (
  team_id uuid not null,
  person_id uuid not null,
  recording_id uuid not null,
  at_ms integer not null check (at_ms >= 0),
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (team_id, person_id, recording_id),
  foreign key (team_id, person_id) references memberships (team_id, person_id) on delete cascade,
  foreign key (team_id, recording_id) references recordings (team_id, id) on delete cascade
);

create table notices (
  team_id uuid not null,
  id uuid not null default gen_random_uuid(),
  person_id uuid not null,
  kind text not null check (kind in ('recordingReady', 'recordingFailed', 'sessionPublished')),
  subject_id uuid,
  text text not null,
  read_at timestamptz,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now(),
  primary key (id),
  foreign key (team_id, person_id) references memberships (team_id, person_id) on delete cascade
);
create index notices_newest on notices (team_id, person_id, created_at desc, id desc);

create table audit_events (
  id uuid primary key default gen_random_uuid(),
  team_id uuid references teams (id) on delete cascade,
  actor_id uuid references people (id) on delete set null,
  action text not null,
  subject_type text not null,
  subject_id uuid,
  details jsonb not null default '{}',
  request_id text,
  created_at timestamptz not null default now(),
  updated_at timestamptz not null default now()
);
create index audit_events_newest on audit_events (team_id, created_at desc, id desc);

-- one search document a chapter, kept fresh in the transaction that changes what it is made from
create table chapter_search (
  chapter_id uuid primary key,
  team_id uuid not null,
  recording_id uuid not null,
  session_id uuid,
  movement_id uuid,
  stands_in_for_movement_id uuid,
  kind text not null,
  -- 0 members see it, 1 a draft, 2 an aside
  visibility smallint not null,
  coach_id uuid,
  sort_at timestamptz not null,
  start_ms integer not null,
  end_ms integer not null,
  document tsvector not null,
  foreign key (team_id, chapter_id) references chapters (team_id, id) on delete cascade deferrable initially deferred
);
create index chapter_search_of_movement on chapter_search (movement_id, sort_at desc, chapter_id desc) include (team_id, recording_id, kind, start_ms, end_ms) where visibility = 0;
create index chapter_search_stands_in on chapter_search (stands_in_for_movement_id, sort_at desc, chapter_id desc) where visibility = 0;
create index chapter_search_of_recording on chapter_search (recording_id);
create index chapter_search_document on chapter_search using gin (document);

create table worker_heartbeats (
  worker_id text primary key,
  seen_at timestamptz not null default now()
);
`;
