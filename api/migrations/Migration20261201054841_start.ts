import { Migration } from '@mikro-orm/migrations';

export class Migration20261201054841_start extends Migration {
  override async up(): Promise<void> {
    this.addSql(`create extension if not exists postgis;`);

    this.addSql(
      `create table "building" ("id" varchar(40) not null, "parcel" varchar(40) null, "kind" varchar(60) not null, "storeys" int null, "base_m" double precision not null, "top_m" double precision not null, "height_source" varchar(120) not null, "geometry" geometry(Geometry, 4326) not null, constraint "building_pkey" primary key ("id"));`,
    );
    this.addSql(`create index "building_geometry_index" on "building" using gist ("geometry");`);

    this.addSql(
      `create table "case_counter" ("year" int not null, "last_number" int not null, constraint "case_counter_pkey" primary key ("year"));`,
    );

    this.addSql(
      `create table "collector" ("id" varchar(40) not null, "building" varchar(40) null, "address" varchar(200) not null, "plane_m" double precision not null, "tilt_deg" double precision not null, "facing_deg" double precision not null, "geometry" geometry(Geometry, 4326) not null, constraint "collector_pkey" primary key ("id"));`,
    );
    this.addSql(`create index "collector_geometry_index" on "collector" using gist ("geometry");`);

    this.addSql(
      `create table "idempotency_key" ("scope" varchar(40) not null, "key" varchar(200) not null, "request_id" varchar(60) not null, "fingerprint" varchar(64) not null, "status" int null, "body" jsonb null, "created_at" timestamptz(3) not null, constraint "idempotency_key_pkey" primary key ("scope", "key"));`,
    );
    this.addSql(
      `create index "idempotency_key_created_at_index" on "idempotency_key" ("created_at");`,
    );

    this.addSql(
      `create table "invitation" ("id" uuid not null, "role" text check ("role" in ('applicant', 'planner', 'board', 'administrator')) not null, "token_hash" varchar(64) not null, "created_at" timestamptz(3) not null, "expires_at" timestamptz(3) not null, "accepted_at" timestamptz(3) null, constraint "invitation_pkey" primary key ("id"));`,
    );
    this.addSql(
      `alter table "invitation" add constraint "invitation_token_hash_unique" unique ("token_hash");`,
    );

    this.addSql(
      `create table "municipality" ("short_name" varchar(40) not null, "name" varchar(120) not null, "time_zone" varchar(60) not null, "locale" varchar(35) not null, "longitude" double precision not null, "latitude" double precision not null, "elevation_m" double precision not null, "extent" jsonb not null, "study_year" int not null, constraint "municipality_pkey" primary key ("short_name"));`,
    );

    this.addSql(
      `create table "open_space" ("id" varchar(40) not null, "class" text check ("class" in ('open-space', 'walk')) not null, "name" varchar(200) not null, "geometry" geometry(Geometry, 4326) not null, constraint "open_space_pkey" primary key ("id"));`,
    );
    this.addSql(
      `create index "open_space_geometry_index" on "open_space" using gist ("geometry");`,
    );

    this.addSql(
      `create table "parcel" ("number" varchar(40) not null, "address" varchar(200) not null, "zone" varchar(60) not null, "use" varchar(60) not null, "geometry" geometry(Geometry, 4326) not null, constraint "parcel_pkey" primary key ("number"));`,
    );
    this.addSql(`create index "parcel_geometry_index" on "parcel" using gist ("geometry");`);

    this.addSql(
      `create table "person" ("id" uuid not null, "email" varchar(254) not null, "name" varchar(120) not null, "role" text check ("role" in ('applicant', 'planner', 'board', 'administrator')) not null, "password_hash" varchar(255) not null, "created_at" timestamptz(3) not null, constraint "person_pkey" primary key ("id"));`,
    );
    this.addSql(`alter table "person" add constraint "person_email_unique" unique ("email");`);

    this.addSql(
      `create table "review_case" ("id" uuid not null, "draft_key" varchar(40) not null, "number" varchar(20) null, "title" varchar(120) not null, "description" text not null, "state" text check ("state" in ('draft', 'submitted', 'sent-back', 'complete', 'under-review', 'open-for-comment', 'report-issued', 'continued', 'heard', 'approved', 'approved-with-conditions', 'refused', 'appealed', 'remanded', 'withdrawn')) not null, "state_since" timestamptz(3) not null, "applicant_id" uuid not null, "site_parcels" text[] not null, "address" text not null, "site" geometry(Geometry, 4326) not null, "site_point" geometry(Geometry, 4326) not null, "site_since" timestamptz(3) not null, "created_at" timestamptz(3) not null, constraint "review_case_pkey" primary key ("id"));`,
    );
    this.addSql(
      `alter table "review_case" add constraint "review_case_draft_key_unique" unique ("draft_key");`,
    );
    this.addSql(
      `alter table "review_case" add constraint "review_case_number_unique" unique ("number");`,
    );
    this.addSql(`create index "review_case_state_index" on "review_case" ("state");`);
    this.addSql(`create index "review_case_applicant_id_index" on "review_case" ("applicant_id");`);
    this.addSql(`create index "review_case_site_index" on "review_case" using gist ("site");`);

    this.addSql(
      `create table "case_transition" ("id" uuid not null, "review_case_id" uuid not null, "position" int not null, "from_state" text check ("from_state" in ('draft', 'submitted', 'sent-back', 'complete', 'under-review', 'open-for-comment', 'report-issued', 'continued', 'heard', 'approved', 'approved-with-conditions', 'refused', 'appealed', 'remanded', 'withdrawn')) not null, "to_state" text check ("to_state" in ('draft', 'submitted', 'sent-back', 'complete', 'under-review', 'open-for-comment', 'report-issued', 'continued', 'heard', 'approved', 'approved-with-conditions', 'refused', 'appealed', 'remanded', 'withdrawn')) not null, "at" timestamptz(3) not null, "by_id" uuid not null, "by_role" text check ("by_role" in ('applicant', 'planner', 'board', 'administrator')) not null, "reason" text null, "due_date" date null, constraint "case_transition_pkey" primary key ("id"));`,
    );
    this.addSql(
      `alter table "case_transition" add constraint "case_transition_review_case_id_position_unique" unique ("review_case_id", "position");`,
    );

    this.addSql(
      `create table "rule_version" ("id" uuid not null, "rule_id" varchar(100) not null, "version" int not null, "in_force_from" date null, "rule" jsonb not null, "created_at" timestamptz(3) not null, constraint "rule_version_pkey" primary key ("id"));`,
    );
    this.addSql(
      `alter table "rule_version" add constraint "rule_version_rule_id_version_unique" unique ("rule_id", "version");`,
    );

    this.addSql(
      `create table "street" ("id" uuid not null, "name" varchar(200) not null, "geometry" geometry(Geometry, 4326) not null, constraint "street_pkey" primary key ("id"));`,
    );
    this.addSql(`create index "street_geometry_index" on "street" using gist ("geometry");`);

    this.addSql(
      `create table "street_line" ("id" uuid not null, "name" varchar(200) not null, "geometry" geometry(Geometry, 4326) not null, constraint "street_line_pkey" primary key ("id"));`,
    );
    this.addSql(
      `create index "street_line_geometry_index" on "street_line" using gist ("geometry");`,
    );

    this.addSql(
      `create table "water" ("id" uuid not null, "name" varchar(200) not null, "geometry" geometry(Geometry, 4326) not null, constraint "water_pkey" primary key ("id"));`,
    );
    this.addSql(`create index "water_geometry_index" on "water" using gist ("geometry");`);

    this.addSql(
      `create table "yard" ("id" varchar(40) not null, "parcel" varchar(40) not null, "address" varchar(200) not null, "label" varchar(200) not null, "geometry" geometry(Geometry, 4326) not null, constraint "yard_pkey" primary key ("id"));`,
    );
    this.addSql(`create index "yard_geometry_index" on "yard" using gist ("geometry");`);

    this.addSql(
      `alter table "review_case" add constraint "review_case_applicant_id_foreign" foreign key ("applicant_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "case_transition" add constraint "case_transition_review_case_id_foreign" foreign key ("review_case_id") references "review_case" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "case_transition" add constraint "case_transition_by_id_foreign" foreign key ("by_id") references "person" ("id") on update cascade;`,
    );

    // The table of connect-pg-simple, as that package writes it.
    this.addSql(
      `create table "session" ("sid" varchar not null primary key, "sess" json not null, "expire" timestamp(6) not null);`,
    );
    this.addSql(`create index "session_expire_index" on "session" ("expire");`);

    // What has happened stays: nobody changes history, not even by mistake in the code.
    this.addSql(
      `create function "refuse_change"() returns trigger language plpgsql as $$ begin raise exception 'rows of % are never changed', tg_table_name; end $$;`,
    );
    for (const table of ['case_transition', 'rule_version']) {
      this.addSql(
        `create trigger "${table}_is_kept" before update or delete on "${table}" for each row execute function "refuse_change"();`,
      );
    }
  }
}
