import { Migration } from '@mikro-orm/migrations';

export class Migration20261201154743_change_rule_drafts extends Migration {
  override async up(): Promise<void> {
    this.addSql(
      `alter table "rule_version" add column "created_by_id" uuid null, add column "changed_at" timestamptz(3) null, add column "changed_by_id" uuid null, add column "enacted_at" timestamptz(3) null, add column "enacted_by_id" uuid null;`,
    );
    this.addSql(
      `alter table "rule_version" add constraint "rule_version_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "rule_version" add constraint "rule_version_changed_by_id_foreign" foreign key ("changed_by_id") references "person" ("id") on update cascade on delete set null;`,
    );
    this.addSql(
      `alter table "rule_version" add constraint "rule_version_enacted_by_id_foreign" foreign key ("enacted_by_id") references "person" ("id") on update cascade on delete set null;`,
    );

    // A draft may be worked on; what has come into force, or has judged a study, stays for good.
    this.addSql(
      `create function "refuse_change_of_rule"() returns trigger language plpgsql as $$
       begin
         if exists (select from "study" where "rule_version_id" = old."id")
           or old."in_force_from" <= (select (now() at time zone "time_zone")::date from "municipality" limit 1)
         then raise exception 'rows of % are never changed once they are in force', tg_table_name;
         end if;
         if tg_op = 'DELETE' then return old; end if;
         return new;
       end $$;`,
    );
    this.addSql(`drop trigger "rule_version_is_kept" on "rule_version";`);
    this.addSql(
      `create trigger "rule_version_is_kept" before update or delete on "rule_version" for each row execute function "refuse_change_of_rule"();`,
    );
  }

  override async down(): Promise<void> {
    this.addSql(`drop trigger "rule_version_is_kept" on "rule_version";`);
    this.addSql(
      `create trigger "rule_version_is_kept" before update or delete on "rule_version" for each row execute function "refuse_change"();`,
    );
    this.addSql(`drop function "refuse_change_of_rule"();`);
    this.addSql(
      `alter table "rule_version" drop column "created_by_id", drop column "changed_at", drop column "changed_by_id", drop column "enacted_at", drop column "enacted_by_id";`,
    );
  }
}
