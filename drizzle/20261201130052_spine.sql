CREATE TYPE "public"."link_purpose" AS ENUM('invitation', 'reset', 'sign-in');--> statement-breakpoint
CREATE TYPE "public"."role" AS ENUM('owner', 'office', 'inspector');--> statement-breakpoint
CREATE TYPE "public"."state_profile" AS ENUM('NY', 'TX', 'NJ', 'IL', 'NC', 'WA', 'MA', 'FL', 'general');--> statement-breakpoint
CREATE TYPE "public"."breaker_protection" AS ENUM('none', 'gfci', 'afci', 'dual-function', 'unknown');--> statement-breakpoint
CREATE TYPE "public"."cover_kind" AS ENUM('indoor', 'flap', 'in-use', 'metal', 'missing', 'broken');--> statement-breakpoint
CREATE TYPE "public"."device_kind" AS ENUM('receptacle', 'gfci-receptacle', 'afci-receptacle', 'dual-function-receptacle', 'hard-wired-outlet');--> statement-breakpoint
CREATE TYPE "public"."device_mark" AS ENUM('tamper-resistant', 'weather-resistant', 'no-equipment-ground', 'gfci-protected');--> statement-breakpoint
CREATE TYPE "public"."distance_end" AS ENUM('outside-edge', 'inside-bowl-edge');--> statement-breakpoint
CREATE TYPE "public"."do_not_trip_reason" AS ENUM('medical-equipment', 'freezer', 'sump-pump', 'aquarium', 'computer', 'alarm', 'occupant-asked');--> statement-breakpoint
CREATE TYPE "public"."inspection_state" AS ENUM('booked', 'on-site', 'in-review', 'released', 'closed', 'cancelled');--> statement-breakpoint
CREATE TYPE "public"."panel_kind" AS ENUM('main', 'sub');--> statement-breakpoint
CREATE TYPE "public"."party_kind" AS ENUM('buyer', 'agent', 'seller', 'electrician', 'occupant', 'other');--> statement-breakpoint
CREATE TYPE "public"."place" AS ENUM('bathroom', 'kitchen-counter', 'kitchen-wall', 'dishwasher', 'laundry-area', 'wet-bar', 'garage', 'accessory-building', 'outdoors', 'crawl-space', 'basement', 'attic', 'bedroom', 'living-room', 'dining-room', 'family-room', 'recreation-room', 'office', 'hallway', 'closet', 'sunroom', 'pool-area', 'boathouse', 'other-room');--> statement-breakpoint
CREATE TYPE "public"."presence" AS ENUM('present', 'not-present', 'removed');--> statement-breakpoint
CREATE TYPE "public"."sink_kind" AS ENUM('kitchen', 'laundry', 'utility', 'wet-bar', 'other');--> statement-breakpoint
CREATE TYPE "public"."slot_pattern" AS ENUM('5-15R', '5-20R', '1-15R', '6-15R', '6-20R', '10-30R', '14-30R', '14-50R');--> statement-breakpoint
CREATE TYPE "public"."structure_kind" AS ENUM('main-house', 'garage', 'unit', 'accessory');--> statement-breakpoint
CREATE TYPE "public"."supply" AS ENUM('120/240', '208Y/120');--> statement-breakpoint
CREATE TYPE "public"."visit_kind" AS ENUM('first', 'return', 're-test');--> statement-breakpoint
CREATE TYPE "public"."wiring_method" AS ENUM('grounded-cable', 'metal-raceway', 'two-wire', 'unknown');--> statement-breakpoint
CREATE TYPE "public"."yes_no_unknown" AS ENUM('yes', 'no', 'unknown');--> statement-breakpoint
CREATE TYPE "public"."photo_state" AS ENUM('announced', 'stored', 'refused');--> statement-breakpoint
CREATE TYPE "public"."finding_decision" AS ENUM('kept', 'dismissed');--> statement-breakpoint
CREATE TYPE "public"."notice_kind" AS ENUM('danger-told', 'back-on', 'handed-over');--> statement-breakpoint
CREATE TYPE "public"."reading_kind" AS ENUM('wiring', 'gfci', 'afci', 'load', 'physical');--> statement-breakpoint
CREATE TYPE "public"."signal" AS ENUM('DANGER', 'WARNING', 'CAUTION', 'NOTICE');--> statement-breakpoint
CREATE TYPE "public"."skip_reason" AS ENUM('blocked', 'in-use', 'occupied', 'locked', 'wet', 'unsafe', 'utility-off', 'medical-equipment', 'freezer-or-sump', 'computer-or-alarm', 'owner-refused', 'client-excluded', 'out-of-reach', 'representative-sample');--> statement-breakpoint
CREATE TYPE "public"."locale" AS ENUM('en', 'es');--> statement-breakpoint
CREATE TYPE "public"."message_state" AS ENUM('waiting', 'sending', 'sent', 'failed');--> statement-breakpoint
CREATE TYPE "public"."render_state" AS ENUM('waiting', 'rendering', 'ready', 'failed');--> statement-breakpoint
CREATE TYPE "public"."operation_outcome" AS ENUM('applied', 'merged', 'conflict', 'rejected');--> statement-breakpoint
CREATE TABLE "link_tokens" (
	"token_hash" "bytea" PRIMARY KEY NOT NULL,
	"code_hash" "bytea" NOT NULL,
	"purpose" "link_purpose" NOT NULL,
	"email" text NOT NULL,
	"user_id" uuid,
	"firm_id" uuid,
	"membership_id" uuid,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "link_tokens_codeHash_unique" UNIQUE("code_hash")
);
--> statement-breakpoint
CREATE TABLE "memberships" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"roles" "role"[] NOT NULL,
	"license_number" text,
	"license_state" text,
	"license_expires" text,
	"signature_name" text,
	"signature_key" text,
	"invited_at" timestamp with time zone,
	"disabled_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "memberships_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "memberships_firmId_userId_unique" UNIQUE("firm_id","user_id")
);
--> statement-breakpoint
CREATE TABLE "rate_limits" (
	"key" text PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id_hash" "bytea" PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"firm_id" uuid NOT NULL,
	"user_agent" text,
	"last_seen_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"revoked_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text,
	"disabled_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "users_email_unique" UNIQUE("email")
);
--> statement-breakpoint
CREATE TABLE "worker_heartbeats" (
	"worker_id" text PRIMARY KEY NOT NULL,
	"seen_at" timestamp with time zone DEFAULT now() NOT NULL,
	"stopping" boolean DEFAULT false NOT NULL,
	"address" "inet"
);
--> statement-breakpoint
CREATE TABLE "adoptions" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"place" text NOT NULL,
	"edition" integer NOT NULL,
	"from" date NOT NULL,
	"source" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "adoptions_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "firms" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"address" jsonb,
	"phone" text,
	"email" text,
	"license_number" text,
	"logo_key" text,
	"time_zone" text DEFAULT 'America/New_York' NOT NULL,
	"state_profile" "state_profile" DEFAULT 'general' NOT NULL,
	"shared_drafts" boolean DEFAULT false NOT NULL,
	"next_inspection_number" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "areas" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"structure_id" uuid NOT NULL,
	"name" text NOT NULL,
	"place" "place" NOT NULL,
	"also_place" "place",
	"floor" integer DEFAULT 1 NOT NULL,
	"order" double precision NOT NULL,
	"finished" boolean,
	"grade_access" boolean,
	"closed" boolean DEFAULT false NOT NULL,
	"revisions" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"writers" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"version" integer NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "areas_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "circuits" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"panel_id" uuid NOT NULL,
	"breaker" text NOT NULL,
	"poles" integer DEFAULT 1 NOT NULL,
	"amps" integer,
	"wire_awg" integer,
	"label_as_found" text,
	"protection" "breaker_protection" DEFAULT 'unknown' NOT NULL,
	"shared_neutral" "yes_no_unknown" DEFAULT 'unknown' NOT NULL,
	"order" double precision NOT NULL,
	"revisions" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"writers" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"version" integer NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "circuits_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "inspection_inspectors" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"membership_id" uuid NOT NULL,
	"leads" boolean DEFAULT false NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "inspection_inspectors_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "inspection_inspectors_firmId_inspectionId_membershipId_unique" UNIQUE("firm_id","inspection_id","membership_id")
);
--> statement-breakpoint
CREATE TABLE "inspections" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"number" integer NOT NULL,
	"state" "inspection_state" DEFAULT 'booked' NOT NULL,
	"address" jsonb NOT NULL,
	"search_text" text NOT NULL,
	"search_words" "tsvector" GENERATED ALWAYS AS (array_to_tsvector(string_to_array(replace(firm_id::text, '-', '') || ' ' || search_text, ' '))) STORED,
	"time_zone" text NOT NULL,
	"state_profile" "state_profile" NOT NULL,
	"scheduled_at" timestamp with time zone NOT NULL,
	"year_built" integer,
	"wiring_method" "wiring_method" DEFAULT 'unknown' NOT NULL,
	"supply" "supply" DEFAULT '120/240' NOT NULL,
	"service_amps" integer,
	"occupied" boolean,
	"utilities_on" boolean,
	"code_edition" integer,
	"code_edition_source" text,
	"arrival_confirmed" boolean DEFAULT false NOT NULL,
	"trip_confirmed" boolean DEFAULT false NOT NULL,
	"general_note" text,
	"next_order" integer DEFAULT 1 NOT NULL,
	"released_at" timestamp with time zone,
	"revisions" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"writers" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"version" integer NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "inspections_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "inspections_firmId_number_unique" UNIQUE("firm_id","number")
);
--> statement-breakpoint
CREATE TABLE "panels" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"name" text NOT NULL,
	"kind" "panel_kind" NOT NULL,
	"fed_from_circuit_id" uuid,
	"place" text,
	"order" double precision NOT NULL,
	"revisions" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"writers" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"version" integer NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "panels_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "parties" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"kind" "party_kind" NOT NULL,
	"name" text NOT NULL,
	"email" text,
	"phone" text,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "parties_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "receptacles" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"area_id" uuid NOT NULL,
	"label" text DEFAULT '' NOT NULL,
	"order" double precision NOT NULL,
	"pattern" "slot_pattern" DEFAULT '5-15R' NOT NULL,
	"device" "device_kind" DEFAULT 'receptacle' NOT NULL,
	"presence" "presence" DEFAULT 'present' NOT NULL,
	"marks" "device_mark"[] DEFAULT '{}' NOT NULL,
	"marks_checked" boolean DEFAULT false NOT NULL,
	"cover" "cover_kind",
	"circuit_id" uuid,
	"fed_from_receptacle_id" uuid,
	"dedicated_appliance" boolean,
	"height_ft" double precision,
	"sink_ft" double precision,
	"no_sink_near" boolean DEFAULT false NOT NULL,
	"sink_kind" "sink_kind",
	"tub_or_shower_ft" double precision,
	"no_tub_near" boolean DEFAULT false NOT NULL,
	"pool_ft" double precision,
	"no_pool_near" boolean DEFAULT false NOT NULL,
	"measured_to" "distance_end",
	"do_not_trip" "do_not_trip_reason",
	"near_bonded_panel" boolean,
	"revisions" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"writers" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"version" integer NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "receptacles_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "structures" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"name" text NOT NULL,
	"kind" "structure_kind" NOT NULL,
	"order" double precision NOT NULL,
	"revisions" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"writers" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"version" integer NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "structures_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "visits" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"kind" "visit_kind" NOT NULL,
	"started_at" timestamp with time zone NOT NULL,
	"order" integer NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "visits_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "photos" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"receptacle_id" uuid,
	"area_id" uuid,
	"circuit_id" uuid,
	"caption" text DEFAULT '' NOT NULL,
	"order" double precision NOT NULL,
	"state" "photo_state" DEFAULT 'announced' NOT NULL,
	"refusal" text,
	"type" text NOT NULL,
	"bytes" integer NOT NULL,
	"sha256" text NOT NULL,
	"width" integer,
	"height" integer,
	"sha256_of1600" text,
	"sha256_of480" text,
	"markings" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"taken_at" timestamp with time zone,
	"stored_at" timestamp with time zone,
	"revisions" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"writers" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"version" integer NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "photos_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "decisions" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"finding_id" text NOT NULL,
	"decision" "finding_decision" NOT NULL,
	"reason" text,
	"own_words" jsonb,
	"raised_signal" "signal",
	"saw_reading_ids" uuid[] NOT NULL,
	"order" integer NOT NULL,
	"membership_id" uuid NOT NULL,
	"recorded_at" timestamp with time zone NOT NULL,
	"version" integer NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "decisions_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "notices" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"kind" "notice_kind" NOT NULL,
	"receptacle_id" uuid,
	"circuit_id" uuid,
	"reading_id" uuid,
	"whom" text,
	"note" text,
	"order" integer NOT NULL,
	"membership_id" uuid NOT NULL,
	"recorded_at" timestamp with time zone NOT NULL,
	"version" integer NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "notices_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "readings" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"visit_id" uuid NOT NULL,
	"receptacle_id" uuid,
	"circuit_id" uuid,
	"kind" "reading_kind" NOT NULL,
	"evidence" jsonb NOT NULL,
	"supersedes" uuid,
	"order" integer NOT NULL,
	"membership_id" uuid NOT NULL,
	"recorded_at" timestamp with time zone NOT NULL,
	"withdrawn_at" timestamp with time zone,
	"version" integer NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "readings_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "skips" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"receptacle_id" uuid,
	"area_id" uuid,
	"reason" "skip_reason" NOT NULL,
	"note" text,
	"membership_id" uuid NOT NULL,
	"recorded_at" timestamp with time zone NOT NULL,
	"version" integer NOT NULL,
	"deleted_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "skips_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "grants" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"party_id" uuid NOT NULL,
	"token_hash" "bytea" NOT NULL,
	"code_hash" "bytea" NOT NULL,
	"until" timestamp with time zone NOT NULL,
	"revoked_at" timestamp with time zone,
	"opened_at" timestamp with time zone,
	"opens" integer DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "grants_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "grants_tokenHash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "messages" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid,
	"grant_id" uuid,
	"kind" text NOT NULL,
	"to_name" text NOT NULL,
	"to_email" text NOT NULL,
	"dedupe_key" text NOT NULL,
	"state" "message_state" DEFAULT 'waiting' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"failure" text,
	"sent_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "messages_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "messages_firmId_dedupeKey_unique" UNIQUE("firm_id","dedupe_key")
);
--> statement-breakpoint
CREATE TABLE "renders" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"report_version_id" uuid NOT NULL,
	"locale" "locale" NOT NULL,
	"state" "render_state" DEFAULT 'waiting' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"failure" text,
	"updated_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "renders_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "renders_firmId_reportVersionId_locale_unique" UNIQUE("firm_id","report_version_id","locale")
);
--> statement-breakpoint
CREATE TABLE "report_files" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"report_version_id" uuid NOT NULL,
	"locale" "locale" NOT NULL,
	"renderer" text NOT NULL,
	"key" text NOT NULL,
	"bytes" integer NOT NULL,
	"pages" integer NOT NULL,
	"sha256" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "report_files_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "report_files_firmId_reportVersionId_locale_renderer_unique" UNIQUE("firm_id","report_version_id","locale","renderer")
);
--> statement-breakpoint
CREATE TABLE "report_versions" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"snapshot" text NOT NULL,
	"sha256" text NOT NULL,
	"supersedes" uuid,
	"reason" text,
	"changes" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"signed_by" uuid NOT NULL,
	"released_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "report_versions_firm_id_id_pk" PRIMARY KEY("firm_id","id"),
	CONSTRAINT "report_versions_firmId_inspectionId_number_unique" UNIQUE("firm_id","inspection_id","number")
);
--> statement-breakpoint
CREATE TABLE "audit_events" (
	"firm_id" uuid NOT NULL,
	"order" bigint NOT NULL,
	"inspection_id" uuid,
	"actor_kind" text NOT NULL,
	"actor_id" uuid,
	"actor_name" text NOT NULL,
	"kind" text NOT NULL,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"previous_hash" text NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "audit_events_firm_id_order_pk" PRIMARY KEY("firm_id","order")
);
--> statement-breakpoint
CREATE TABLE "conflicts" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"inspection_id" uuid NOT NULL,
	"entity" text NOT NULL,
	"entity_id" uuid NOT NULL,
	"field" text NOT NULL,
	"theirs" jsonb,
	"their_membership_id" uuid,
	"their_captured_at" timestamp with time zone,
	"yours" jsonb,
	"membership_id" uuid NOT NULL,
	"captured_at" timestamp with time zone NOT NULL,
	"resolved_at" timestamp with time zone,
	"resolved_by" uuid,
	"kept" text,
	"version" integer NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "conflicts_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
CREATE TABLE "mutation_log" (
	"firm_id" uuid NOT NULL,
	"client_id" uuid NOT NULL,
	"n" integer NOT NULL,
	"inspection_id" uuid,
	"operation" jsonb NOT NULL,
	"outcome" "operation_outcome" NOT NULL,
	"receipt" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "mutation_log_firm_id_client_id_n_pk" PRIMARY KEY("firm_id","client_id","n")
);
--> statement-breakpoint
CREATE TABLE "sync_clients" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"last" integer DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sync_clients_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "adoptions" ADD CONSTRAINT "adoptions_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "areas" ADD CONSTRAINT "areas_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "areas" ADD CONSTRAINT "areas_firm_id_structure_id_structures_firm_id_id_fk" FOREIGN KEY ("firm_id","structure_id") REFERENCES "public"."structures"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "circuits" ADD CONSTRAINT "circuits_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "circuits" ADD CONSTRAINT "circuits_firm_id_panel_id_panels_firm_id_id_fk" FOREIGN KEY ("firm_id","panel_id") REFERENCES "public"."panels"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "inspection_inspectors" ADD CONSTRAINT "inspection_inspectors_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "inspection_inspectors" ADD CONSTRAINT "inspection_inspectors_firm_id_membership_id_memberships_firm_id_id_fk" FOREIGN KEY ("firm_id","membership_id") REFERENCES "public"."memberships"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "inspections" ADD CONSTRAINT "inspections_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "panels" ADD CONSTRAINT "panels_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "parties" ADD CONSTRAINT "parties_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "receptacles" ADD CONSTRAINT "receptacles_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "receptacles" ADD CONSTRAINT "receptacles_firm_id_area_id_areas_firm_id_id_fk" FOREIGN KEY ("firm_id","area_id") REFERENCES "public"."areas"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "receptacles" ADD CONSTRAINT "receptacles_firm_id_circuit_id_circuits_firm_id_id_fk" FOREIGN KEY ("firm_id","circuit_id") REFERENCES "public"."circuits"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "structures" ADD CONSTRAINT "structures_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "visits" ADD CONSTRAINT "visits_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_firm_id_receptacle_id_receptacles_firm_id_id_fk" FOREIGN KEY ("firm_id","receptacle_id") REFERENCES "public"."receptacles"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_firm_id_area_id_areas_firm_id_id_fk" FOREIGN KEY ("firm_id","area_id") REFERENCES "public"."areas"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_firm_id_circuit_id_circuits_firm_id_id_fk" FOREIGN KEY ("firm_id","circuit_id") REFERENCES "public"."circuits"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "decisions" ADD CONSTRAINT "decisions_firm_id_membership_id_memberships_firm_id_id_fk" FOREIGN KEY ("firm_id","membership_id") REFERENCES "public"."memberships"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_firm_id_receptacle_id_receptacles_firm_id_id_fk" FOREIGN KEY ("firm_id","receptacle_id") REFERENCES "public"."receptacles"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "notices" ADD CONSTRAINT "notices_firm_id_reading_id_readings_firm_id_id_fk" FOREIGN KEY ("firm_id","reading_id") REFERENCES "public"."readings"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_firm_id_visit_id_visits_firm_id_id_fk" FOREIGN KEY ("firm_id","visit_id") REFERENCES "public"."visits"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_firm_id_receptacle_id_receptacles_firm_id_id_fk" FOREIGN KEY ("firm_id","receptacle_id") REFERENCES "public"."receptacles"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_firm_id_circuit_id_circuits_firm_id_id_fk" FOREIGN KEY ("firm_id","circuit_id") REFERENCES "public"."circuits"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_firm_id_supersedes_readings_firm_id_id_fk" FOREIGN KEY ("firm_id","supersedes") REFERENCES "public"."readings"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "readings" ADD CONSTRAINT "readings_firm_id_membership_id_memberships_firm_id_id_fk" FOREIGN KEY ("firm_id","membership_id") REFERENCES "public"."memberships"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "skips" ADD CONSTRAINT "skips_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "skips" ADD CONSTRAINT "skips_firm_id_receptacle_id_receptacles_firm_id_id_fk" FOREIGN KEY ("firm_id","receptacle_id") REFERENCES "public"."receptacles"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "skips" ADD CONSTRAINT "skips_firm_id_area_id_areas_firm_id_id_fk" FOREIGN KEY ("firm_id","area_id") REFERENCES "public"."areas"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "grants" ADD CONSTRAINT "grants_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "grants" ADD CONSTRAINT "grants_firm_id_party_id_parties_firm_id_id_fk" FOREIGN KEY ("firm_id","party_id") REFERENCES "public"."parties"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "messages" ADD CONSTRAINT "messages_firm_id_grant_id_grants_firm_id_id_fk" FOREIGN KEY ("firm_id","grant_id") REFERENCES "public"."grants"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "renders" ADD CONSTRAINT "renders_firm_id_report_version_id_report_versions_firm_id_id_fk" FOREIGN KEY ("firm_id","report_version_id") REFERENCES "public"."report_versions"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "report_files" ADD CONSTRAINT "report_files_firm_id_report_version_id_report_versions_firm_id_id_fk" FOREIGN KEY ("firm_id","report_version_id") REFERENCES "public"."report_versions"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "report_versions" ADD CONSTRAINT "report_versions_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "report_versions" ADD CONSTRAINT "report_versions_firm_id_supersedes_report_versions_firm_id_id_fk" FOREIGN KEY ("firm_id","supersedes") REFERENCES "public"."report_versions"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "report_versions" ADD CONSTRAINT "report_versions_firm_id_signed_by_memberships_firm_id_id_fk" FOREIGN KEY ("firm_id","signed_by") REFERENCES "public"."memberships"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "conflicts" ADD CONSTRAINT "conflicts_firm_id_inspection_id_inspections_firm_id_id_fk" FOREIGN KEY ("firm_id","inspection_id") REFERENCES "public"."inspections"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mutation_log" ADD CONSTRAINT "mutation_log_firm_id_client_id_sync_clients_firm_id_id_fk" FOREIGN KEY ("firm_id","client_id") REFERENCES "public"."sync_clients"("firm_id","id") ON DELETE restrict ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "sessions_user_id_index" ON "sessions" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "areas_firm_id_inspection_id_index" ON "areas" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "circuits_firm_id_inspection_id_index" ON "circuits" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "inspection_inspectors_firm_id_inspection_id_index" ON "inspection_inspectors" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "inspection_inspectors_firm_id_membership_id_index" ON "inspection_inspectors" USING btree ("firm_id","membership_id");--> statement-breakpoint
CREATE INDEX "inspections_firm_id_scheduled_at_id_index" ON "inspections" USING btree ("firm_id","scheduled_at" DESC NULLS LAST,"id");--> statement-breakpoint
CREATE INDEX "inspections_firm_id_state_scheduled_at_id_index" ON "inspections" USING btree ("firm_id","state","scheduled_at" DESC NULLS LAST,"id");--> statement-breakpoint
CREATE INDEX "inspections_firm_id_number_id_index" ON "inspections" USING btree ("firm_id","number","id");--> statement-breakpoint
CREATE INDEX "inspections_search_words_index" ON "inspections" USING gin ("search_words");--> statement-breakpoint
CREATE INDEX "panels_firm_id_inspection_id_index" ON "panels" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "parties_firm_id_inspection_id_index" ON "parties" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "receptacles_firm_id_inspection_id_index" ON "receptacles" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "receptacles_firm_id_area_id_index" ON "receptacles" USING btree ("firm_id","area_id");--> statement-breakpoint
CREATE INDEX "structures_firm_id_inspection_id_index" ON "structures" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "visits_firm_id_inspection_id_index" ON "visits" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "photos_firm_id_inspection_id_index" ON "photos" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "decisions_firm_id_inspection_id_index" ON "decisions" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "decisions_firm_id_inspection_id_finding_id_order_index" ON "decisions" USING btree ("firm_id","inspection_id","finding_id","order");--> statement-breakpoint
CREATE INDEX "notices_firm_id_inspection_id_index" ON "notices" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "readings_firm_id_inspection_id_index" ON "readings" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "readings_firm_id_receptacle_id_index" ON "readings" USING btree ("firm_id","receptacle_id");--> statement-breakpoint
CREATE INDEX "skips_firm_id_inspection_id_index" ON "skips" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "grants_firm_id_inspection_id_index" ON "grants" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "messages_firm_id_inspection_id_index" ON "messages" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "audit_events_firm_id_inspection_id_index" ON "audit_events" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "conflicts_firm_id_inspection_id_index" ON "conflicts" USING btree ("firm_id","inspection_id");--> statement-breakpoint
CREATE INDEX "mutation_log_firm_id_inspection_id_index" ON "mutation_log" USING btree ("firm_id","inspection_id");