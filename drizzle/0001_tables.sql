CREATE TABLE "password_links" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"person_id" uuid NOT NULL,
	"purpose" text NOT NULL,
	"token_hash" text NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	CONSTRAINT "password_links_token_hash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "people" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"role" text NOT NULL,
	"status" text NOT NULL,
	"password_hash" text,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "people_email_unique" UNIQUE("email"),
	CONSTRAINT "people_email_lower" CHECK ("people"."email" = lower("people"."email"))
);
--> statement-breakpoint
CREATE TABLE "session" (
	"sid" varchar PRIMARY KEY NOT NULL,
	"sess" json NOT NULL,
	"expire" timestamp (6) NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sign_in_failures" (
	"email_hash" text PRIMARY KEY NOT NULL,
	"failures" integer NOT NULL,
	"last_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "audit_trail" (
	"id" bigserial PRIMARY KEY NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"person_id" uuid,
	"action" text NOT NULL,
	"subject_kind" text NOT NULL,
	"subject_id" text NOT NULL,
	"from" jsonb,
	"to" jsonb
);
--> statement-breakpoint
CREATE TABLE "firm" (
	"id" integer PRIMARY KEY DEFAULT 1 NOT NULL,
	"name" text NOT NULL,
	"address" text DEFAULT '' NOT NULL,
	"phone" text DEFAULT '' NOT NULL,
	"sheet_age_limit_years" double precision DEFAULT 3 NOT NULL,
	"is_demo" boolean DEFAULT false NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "firm_single" CHECK ("firm"."id" = 1)
);
--> statement-breakpoint
CREATE TABLE "sheet_pages" (
	"revision_id" uuid NOT NULL,
	"page" integer NOT NULL,
	"width" double precision NOT NULL,
	"height" double precision NOT NULL,
	"rotation" integer DEFAULT 0 NOT NULL,
	"text" text NOT NULL,
	"words" jsonb NOT NULL,
	CONSTRAINT "sheet_pages_revision_id_page_pk" PRIMARY KEY("revision_id","page")
);
--> statement-breakpoint
CREATE TABLE "sheet_revisions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"sheet_id" uuid NOT NULL,
	"sha256" text NOT NULL,
	"bytes" bigint NOT NULL,
	"file_name" text NOT NULL,
	"revision_date" text,
	"state" text NOT NULL,
	"pages" integer NOT NULL,
	"sequence" integer NOT NULL,
	"uploaded_by" uuid,
	"uploaded_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sheets" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"kind" text NOT NULL,
	"title" text NOT NULL,
	"maker" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"search_text" text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE TABLE "mix_parts" (
	"mix_id" uuid NOT NULL,
	"part" text NOT NULL,
	"product_id" uuid NOT NULL,
	CONSTRAINT "mix_parts_mix_id_part_pk" PRIMARY KEY("mix_id","part")
);
--> statement-breakpoint
CREATE TABLE "mixes" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"maker" text NOT NULL,
	"chemistry" text NOT NULL,
	"color" text NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"status" text DEFAULT 'active' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"search_text" text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE TABLE "products" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"maker" text NOT NULL,
	"kind" text NOT NULL,
	"chemistry" text NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"status" text DEFAULT 'active' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"search_text" text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE TABLE "property_values" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"product_id" uuid,
	"mix_id" uuid,
	"property" text NOT NULL,
	"part" text DEFAULT 'mixed' NOT NULL,
	"value" jsonb NOT NULL,
	"at" jsonb,
	"film" text,
	"of" text,
	"thinned" boolean,
	"kind" text NOT NULL,
	"reason" text,
	"revision_id" uuid,
	"page" integer,
	"box" jsonb,
	"quote" text,
	"position" integer DEFAULT 0 NOT NULL,
	"by_person_id" uuid,
	"by_name" text NOT NULL,
	"made_at" timestamp with time zone DEFAULT now() NOT NULL,
	"ended_at" timestamp with time zone,
	CONSTRAINT "property_values_one_subject" CHECK (("property_values"."product_id" is null) <> ("property_values"."mix_id" is null)),
	CONSTRAINT "property_values_known_how" CHECK (("property_values"."kind" = 'stated' and "property_values"."revision_id" is not null and "property_values"."page" is not null) or ("property_values"."kind" = 'entered' and "property_values"."reason" is not null))
);
--> statement-breakpoint
CREATE TABLE "sheet_subjects" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"sheet_id" uuid NOT NULL,
	"product_id" uuid,
	"mix_id" uuid,
	CONSTRAINT "sheet_subjects_one" CHECK (("sheet_subjects"."product_id" is null) <> ("sheet_subjects"."mix_id" is null))
);
--> statement-breakpoint
CREATE TABLE "build_up_versions" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"build_up_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"status" text DEFAULT 'draft' NOT NULL,
	"conditions" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_by" uuid,
	"released_at" timestamp with time zone,
	"released_by" uuid,
	"released_by_name" text,
	"release_reasons" jsonb,
	"frozen_input" jsonb,
	"frozen_evaluation" jsonb
);
--> statement-breakpoint
CREATE TABLE "build_ups" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"number" integer GENERATED ALWAYS AS IDENTITY (sequence name "build_ups_number_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 2147483647 START WITH 1 CACHE 1),
	"name" text NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"search_text" text DEFAULT '' NOT NULL,
	CONSTRAINT "build_ups_number_unique" UNIQUE("number")
);
--> statement-breakpoint
CREATE TABLE "courses" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"version_id" uuid NOT NULL,
	"course_id" text NOT NULL,
	"position" integer NOT NULL,
	"stage" text NOT NULL,
	"mix_id" uuid,
	"course" jsonb NOT NULL
);
--> statement-breakpoint
CREATE TABLE "bays" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"job_id" uuid NOT NULL,
	"bay_id" text NOT NULL,
	"position" integer NOT NULL,
	"bay" jsonb NOT NULL
);
--> statement-breakpoint
CREATE TABLE "job_people" (
	"job_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	CONSTRAINT "job_people_job_id_person_id_pk" PRIMARY KEY("job_id","person_id")
);
--> statement-breakpoint
CREATE TABLE "jobs" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"number" integer GENERATED ALWAYS AS IDENTITY (sequence name "jobs_number_seq" INCREMENT BY 1 MINVALUE 1 MAXVALUE 2147483647 START WITH 1 CACHE 1),
	"name" text NOT NULL,
	"client" text DEFAULT '' NOT NULL,
	"site" text DEFAULT '' NOT NULL,
	"status" text DEFAULT 'open' NOT NULL,
	"build_up_version_id" uuid,
	"conditions" jsonb NOT NULL,
	"loss" jsonb NOT NULL,
	"starts_at" timestamp with time zone,
	"time_zone" text NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"search_text" text DEFAULT '' NOT NULL,
	CONSTRAINT "jobs_number_unique" UNIQUE("number")
);
--> statement-breakpoint
CREATE TABLE "log_entries" (
	"id" uuid PRIMARY KEY NOT NULL,
	"job_id" uuid NOT NULL,
	"bay_id" text,
	"course_id" text,
	"kind" text NOT NULL,
	"entry" jsonb NOT NULL,
	"device_at" timestamp with time zone NOT NULL,
	"received_at" timestamp with time zone DEFAULT now() NOT NULL,
	"person_id" uuid NOT NULL,
	"corrects_id" uuid
);
--> statement-breakpoint
CREATE TABLE "specification_issues" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"specification_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"issued_at" timestamp with time zone NOT NULL,
	"issued_by" uuid,
	"issued_by_name" text NOT NULL,
	"tree" text NOT NULL,
	"tree_sha256" text NOT NULL,
	"docx_sha256" text NOT NULL,
	"pdf_sha256" text NOT NULL,
	"facts" jsonb NOT NULL
);
--> statement-breakpoint
CREATE TABLE "specifications" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"job_id" uuid NOT NULL,
	"title" text NOT NULL,
	"section_number" text NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "password_links" ADD CONSTRAINT "password_links_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheet_pages" ADD CONSTRAINT "sheet_pages_revision_id_sheet_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."sheet_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheet_revisions" ADD CONSTRAINT "sheet_revisions_sheet_id_sheets_id_fk" FOREIGN KEY ("sheet_id") REFERENCES "public"."sheets"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheet_revisions" ADD CONSTRAINT "sheet_revisions_uploaded_by_people_id_fk" FOREIGN KEY ("uploaded_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mix_parts" ADD CONSTRAINT "mix_parts_mix_id_mixes_id_fk" FOREIGN KEY ("mix_id") REFERENCES "public"."mixes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mix_parts" ADD CONSTRAINT "mix_parts_product_id_products_id_fk" FOREIGN KEY ("product_id") REFERENCES "public"."products"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "property_values" ADD CONSTRAINT "property_values_product_id_products_id_fk" FOREIGN KEY ("product_id") REFERENCES "public"."products"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "property_values" ADD CONSTRAINT "property_values_mix_id_mixes_id_fk" FOREIGN KEY ("mix_id") REFERENCES "public"."mixes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "property_values" ADD CONSTRAINT "property_values_revision_id_sheet_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."sheet_revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "property_values" ADD CONSTRAINT "property_values_by_person_id_people_id_fk" FOREIGN KEY ("by_person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheet_subjects" ADD CONSTRAINT "sheet_subjects_sheet_id_sheets_id_fk" FOREIGN KEY ("sheet_id") REFERENCES "public"."sheets"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheet_subjects" ADD CONSTRAINT "sheet_subjects_product_id_products_id_fk" FOREIGN KEY ("product_id") REFERENCES "public"."products"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sheet_subjects" ADD CONSTRAINT "sheet_subjects_mix_id_mixes_id_fk" FOREIGN KEY ("mix_id") REFERENCES "public"."mixes"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "build_up_versions" ADD CONSTRAINT "build_up_versions_build_up_id_build_ups_id_fk" FOREIGN KEY ("build_up_id") REFERENCES "public"."build_ups"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "build_up_versions" ADD CONSTRAINT "build_up_versions_updated_by_people_id_fk" FOREIGN KEY ("updated_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "build_up_versions" ADD CONSTRAINT "build_up_versions_released_by_people_id_fk" FOREIGN KEY ("released_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "courses" ADD CONSTRAINT "courses_version_id_build_up_versions_id_fk" FOREIGN KEY ("version_id") REFERENCES "public"."build_up_versions"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bays" ADD CONSTRAINT "bays_job_id_jobs_id_fk" FOREIGN KEY ("job_id") REFERENCES "public"."jobs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "job_people" ADD CONSTRAINT "job_people_job_id_jobs_id_fk" FOREIGN KEY ("job_id") REFERENCES "public"."jobs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "job_people" ADD CONSTRAINT "job_people_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_build_up_version_id_build_up_versions_id_fk" FOREIGN KEY ("build_up_version_id") REFERENCES "public"."build_up_versions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "log_entries" ADD CONSTRAINT "log_entries_job_id_jobs_id_fk" FOREIGN KEY ("job_id") REFERENCES "public"."jobs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "log_entries" ADD CONSTRAINT "log_entries_person_id_people_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "specification_issues" ADD CONSTRAINT "specification_issues_specification_id_specifications_id_fk" FOREIGN KEY ("specification_id") REFERENCES "public"."specifications"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "specification_issues" ADD CONSTRAINT "specification_issues_issued_by_people_id_fk" FOREIGN KEY ("issued_by") REFERENCES "public"."people"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "specifications" ADD CONSTRAINT "specifications_job_id_jobs_id_fk" FOREIGN KEY ("job_id") REFERENCES "public"."jobs"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "password_links_person" ON "password_links" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "session_expire" ON "session" USING btree ("expire");--> statement-breakpoint
CREATE INDEX "audit_trail_subject" ON "audit_trail" USING btree ("subject_kind","subject_id","id");--> statement-breakpoint
CREATE UNIQUE INDEX "sheet_revisions_sha256" ON "sheet_revisions" USING btree ("sha256");--> statement-breakpoint
CREATE UNIQUE INDEX "sheet_revisions_sequence" ON "sheet_revisions" USING btree ("sheet_id","sequence");--> statement-breakpoint
CREATE INDEX "sheets_search" ON "sheets" USING gin ("search_text" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "sheets_title" ON "sheets" USING btree ("title","id");--> statement-breakpoint
CREATE INDEX "mix_parts_product" ON "mix_parts" USING btree ("product_id");--> statement-breakpoint
CREATE UNIQUE INDEX "mixes_maker_name" ON "mixes" USING btree (lower("maker"),lower("name"));--> statement-breakpoint
CREATE INDEX "mixes_search" ON "mixes" USING gin ("search_text" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "mixes_name" ON "mixes" USING btree (lower("name"),"id");--> statement-breakpoint
CREATE UNIQUE INDEX "products_maker_name" ON "products" USING btree (lower("maker"),lower("name"));--> statement-breakpoint
CREATE INDEX "products_search" ON "products" USING gin ("search_text" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "products_name" ON "products" USING btree (lower("name"),"id");--> statement-breakpoint
CREATE INDEX "property_values_product" ON "property_values" USING btree ("product_id");--> statement-breakpoint
CREATE INDEX "property_values_mix" ON "property_values" USING btree ("mix_id");--> statement-breakpoint
CREATE INDEX "property_values_revision" ON "property_values" USING btree ("revision_id");--> statement-breakpoint
CREATE UNIQUE INDEX "sheet_subjects_product" ON "sheet_subjects" USING btree ("sheet_id","product_id");--> statement-breakpoint
CREATE UNIQUE INDEX "sheet_subjects_mix" ON "sheet_subjects" USING btree ("sheet_id","mix_id");--> statement-breakpoint
CREATE INDEX "sheet_subjects_by_product" ON "sheet_subjects" USING btree ("product_id");--> statement-breakpoint
CREATE INDEX "sheet_subjects_by_mix" ON "sheet_subjects" USING btree ("mix_id");--> statement-breakpoint
CREATE UNIQUE INDEX "build_up_versions_number" ON "build_up_versions" USING btree ("build_up_id","number");--> statement-breakpoint
CREATE INDEX "build_up_versions_status" ON "build_up_versions" USING btree ("status");--> statement-breakpoint
CREATE INDEX "build_ups_name" ON "build_ups" USING btree ("name","id");--> statement-breakpoint
CREATE INDEX "build_ups_search" ON "build_ups" USING gin ("search_text" gin_trgm_ops);--> statement-breakpoint
CREATE UNIQUE INDEX "courses_position" ON "courses" USING btree ("version_id","position");--> statement-breakpoint
CREATE INDEX "courses_mix" ON "courses" USING btree ("mix_id");--> statement-breakpoint
CREATE UNIQUE INDEX "bays_position" ON "bays" USING btree ("job_id","position");--> statement-breakpoint
CREATE INDEX "job_people_person" ON "job_people" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "jobs_name" ON "jobs" USING btree ("name","id");--> statement-breakpoint
CREATE INDEX "log_entries_job" ON "log_entries" USING btree ("job_id","received_at");--> statement-breakpoint
CREATE UNIQUE INDEX "specification_issues_number" ON "specification_issues" USING btree ("specification_id","number");--> statement-breakpoint
CREATE INDEX "specifications_job" ON "specifications" USING btree ("job_id");