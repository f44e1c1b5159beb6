import { Migration } from '@mikro-orm/migrations';

export class Migration20261201055106_add_massings_studies_comments_reports extends Migration {
  override async up(): Promise<void> {
    this.addSql(
      `create table "massing_revision" ("id" uuid not null, "review_case_id" uuid not null, "revision" int not null, "file_name" varchar(255) not null, "original" bytea not null, "sha256" varchar(64) not null, "size_bytes" int not null, "uploaded_by_id" uuid not null, "created_at" timestamptz(3) not null, "issues" jsonb not null, "blocks" jsonb not null, "figures" jsonb not null, "sound" boolean not null, constraint "massing_revision_pkey" primary key ("id"));`,
    );
    this.addSql(
      `alter table "massing_revision" add constraint "massing_revision_review_case_id_revision_unique" unique ("review_case_id", "revision");`,
    );

    this.addSql(
      `create table "comment" ("id" uuid not null, "review_case_id" uuid not null, "author_name" varchar(120) not null, "author_email" varchar(254) not null, "body" text not null, "pin" jsonb null, "revision" int null, "received_at" timestamptz(3) not null, "state" text check ("state" in ('waiting', 'published', 'withheld')) not null, "withheld_reason" text null, "moderated_by_id" uuid null, "moderated_at" timestamptz(3) null, constraint "comment_pkey" primary key ("id"));`,
    );
    this.addSql(`create index "comment_review_case_id_index" on "comment" ("review_case_id");`);

    this.addSql(
      `create table "study" ("id" uuid not null, "review_case_id" uuid not null, "massing_id" uuid not null, "rule_version_id" uuid not null, "year" int not null, "requested_by_id" uuid not null, "requested_at" timestamptz(3) not null, "status" text check ("status" in ('queued', 'running', 'finished', 'failed', 'cancelled')) not null, "instants_done" int not null default 0, "instants_total" int not null default 0, "claim" uuid null, "heartbeat_at" timestamptz(3) null, "attempts" int not null default 0, "finished_at" timestamptz(3) null, "failure" text null, "engine" varchar(40) null, "digest" varchar(71) null, "findings" jsonb null, "finding_rows" jsonb null, "evidence" text null, constraint "study_pkey" primary key ("id"));`,
    );
    this.addSql(`create index "study_review_case_id_index" on "study" ("review_case_id");`);

    this.addSql(
      `create table "report" ("id" uuid not null, "number" varchar(40) not null, "review_case_id" uuid not null, "ordinal" int not null, "massing_id" uuid not null, "study_id" uuid not null, "study_digest" varchar(71) not null, "issued_by_id" uuid not null, "issued_at" timestamptz(3) not null, "pdf" bytea not null, "size_bytes" int not null, "pages" int not null, "sha256" varchar(64) not null, "payload" jsonb not null, constraint "report_pkey" primary key ("id"));`,
    );
    this.addSql(`alter table "report" add constraint "report_number_unique" unique ("number");`);
    this.addSql(
      `alter table "report" add constraint "report_review_case_id_ordinal_unique" unique ("review_case_id", "ordinal");`,
    );

    this.addSql(
      `create table "study_instant" ("study_id" uuid not null, "position" int not null, "at" timestamptz(3) not null, "at_text" varchar(40) not null, "azimuth_deg" double precision not null, "altitude_deg" double precision not null, "net_new_m2" double precision null, "removed_m2" double precision null, "shadows" jsonb null, constraint "study_instant_pkey" primary key ("study_id", "position"));`,
    );
    this.addSql(
      `alter table "study_instant" add constraint "study_instant_study_id_at_unique" unique ("study_id", "at");`,
    );

    this.addSql(
      `alter table "massing_revision" add constraint "massing_revision_review_case_id_foreign" foreign key ("review_case_id") references "review_case" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "massing_revision" add constraint "massing_revision_uploaded_by_id_foreign" foreign key ("uploaded_by_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "comment" add constraint "comment_review_case_id_foreign" foreign key ("review_case_id") references "review_case" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "comment" add constraint "comment_moderated_by_id_foreign" foreign key ("moderated_by_id") references "person" ("id") on update cascade on delete set null;`,
    );

    this.addSql(
      `alter table "study" add constraint "study_review_case_id_foreign" foreign key ("review_case_id") references "review_case" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "study" add constraint "study_massing_id_foreign" foreign key ("massing_id") references "massing_revision" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "study" add constraint "study_rule_version_id_foreign" foreign key ("rule_version_id") references "rule_version" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "study" add constraint "study_requested_by_id_foreign" foreign key ("requested_by_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "report" add constraint "report_review_case_id_foreign" foreign key ("review_case_id") references "review_case" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "report" add constraint "report_massing_id_foreign" foreign key ("massing_id") references "massing_revision" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "report" add constraint "report_study_id_foreign" foreign key ("study_id") references "study" ("id") on update cascade;`,
    );
    this.addSql(
      `alter table "report" add constraint "report_issued_by_id_foreign" foreign key ("issued_by_id") references "person" ("id") on update cascade;`,
    );

    this.addSql(
      `alter table "study_instant" add constraint "study_instant_study_id_foreign" foreign key ("study_id") references "study" ("id") on update cascade;`,
    );

    // What people have been shown stays as it was, whoever writes to the database.
    this.addSql(
      `create trigger "massing_revision_is_kept" before update on "massing_revision" for each row execute function "refuse_change"();`,
    );
    this.addSql(
      `create trigger "study_is_kept" before update on "study" for each row when (old.status = 'finished') execute function "refuse_change"();`,
    );
    this.addSql(
      `create trigger "report_is_kept" before update or delete on "report" for each row execute function "refuse_change"();`,
    );
  }

  override async down(): Promise<void> {
    this.addSql(`alter table "study" drop constraint "study_massing_id_foreign";`);

    this.addSql(`alter table "report" drop constraint "report_massing_id_foreign";`);

    this.addSql(`alter table "report" drop constraint "report_study_id_foreign";`);

    this.addSql(`alter table "study_instant" drop constraint "study_instant_study_id_foreign";`);

    this.addSql(`drop table if exists "massing_revision" cascade;`);

    this.addSql(`drop table if exists "comment" cascade;`);

    this.addSql(`drop table if exists "study" cascade;`);

    this.addSql(`drop table if exists "report" cascade;`);

    this.addSql(`drop table if exists "study_instant" cascade;`);
  }
}
