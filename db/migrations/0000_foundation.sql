CREATE TABLE "answer_event" (
	"id" uuid PRIMARY KEY NOT NULL,
	"sequence" bigserial NOT NULL,
	"party_id" uuid NOT NULL,
	"show_id" uuid,
	"hire_id" uuid,
	"kind" text NOT NULL,
	"line_id" uuid,
	"line_hash" text,
	"revision_id" uuid NOT NULL,
	"content" jsonb,
	"remark" text DEFAULT '' NOT NULL,
	"by_name" text NOT NULL,
	"grant_id" uuid,
	"token_id" uuid,
	"person_id" uuid,
	"taken_from" text,
	"taken_how" text,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "answer_event_sequence_unique" UNIQUE("sequence"),
	CONSTRAINT "answer_event_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "answer_event_of_one" CHECK (num_nonnulls("answer_event"."show_id", "answer_event"."hire_id") = 1),
	CONSTRAINT "answer_event_by_one" CHECK (num_nonnulls("answer_event"."token_id", "answer_event"."person_id") = 1),
	CONSTRAINT "answer_event_line" CHECK ("answer_event"."kind" = 'close' or ("answer_event"."line_id" is not null and "answer_event"."line_hash" is not null and "answer_event"."content" is not null))
);
--> statement-breakpoint
CREATE TABLE "dispatch" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"pack_id" uuid NOT NULL,
	"grant_id" uuid NOT NULL,
	"contact_id" uuid NOT NULL,
	"mail_id" uuid NOT NULL,
	"sent_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "dispatch_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "pack" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"show_id" uuid,
	"hire_id" uuid,
	"schema_version" integer NOT NULL,
	"document" jsonb NOT NULL,
	"pdf_blob_id" uuid,
	"pdf_pages" integer,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "pack_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "pack_of_one" CHECK (num_nonnulls("pack"."show_id", "pack"."hire_id") = 1)
);
--> statement-breakpoint
CREATE TABLE "settlement" (
	"id" uuid PRIMARY KEY NOT NULL,
	"sequence" bigserial NOT NULL,
	"party_id" uuid NOT NULL,
	"show_id" uuid,
	"hire_id" uuid,
	"line_id" uuid NOT NULL,
	"line_hash" text NOT NULL,
	"answer_event_id" uuid NOT NULL,
	"decision" text NOT NULL,
	"remark" text DEFAULT '' NOT NULL,
	"person_id" uuid NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "settlement_sequence_unique" UNIQUE("sequence"),
	CONSTRAINT "settlement_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "settlement_of_one" CHECK (num_nonnulls("settlement"."show_id", "settlement"."hire_id") = 1)
);
--> statement-breakpoint
CREATE TABLE "audit_event" (
	"id" bigserial PRIMARY KEY NOT NULL,
	"party_id" uuid,
	"actor_kind" text NOT NULL,
	"actor_id" text NOT NULL,
	"action" text NOT NULL,
	"subject_type" text NOT NULL,
	"subject_id" text NOT NULL,
	"detail" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"address" text DEFAULT '' NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "bench_drum" (
	"party_id" uuid NOT NULL,
	"show_id" uuid NOT NULL,
	"kit_entry_id" uuid NOT NULL,
	"physical_drum_id" uuid NOT NULL,
	CONSTRAINT "bench_drum_show_id_kit_entry_id_pk" PRIMARY KEY("show_id","kit_entry_id")
);
--> statement-breakpoint
CREATE TABLE "physical_drum" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"supplier_id" uuid,
	"badge" text DEFAULT '' NOT NULL,
	"serial" text DEFAULT '' NOT NULL,
	"diameter_in" double precision NOT NULL,
	"depth_in" double precision NOT NULL,
	"lugs" integer NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "physical_drum_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "reading" (
	"id" uuid PRIMARY KEY NOT NULL,
	"sequence" bigserial NOT NULL,
	"party_id" uuid NOT NULL,
	"show_id" uuid NOT NULL,
	"kit_entry_id" uuid NOT NULL,
	"physical_drum_id" uuid NOT NULL,
	"side" text NOT NULL,
	"lug" integer NOT NULL,
	"device_id" uuid NOT NULL,
	"device_sequence" integer NOT NULL,
	"device_at" timestamp with time zone NOT NULL,
	"server_at" timestamp with time zone DEFAULT now() NOT NULL,
	"method" text NOT NULL,
	"value" double precision NOT NULL,
	"unit" text NOT NULL,
	"target_hz" double precision,
	"other_head" text NOT NULL,
	"on_stand" boolean NOT NULL,
	"gauge" text DEFAULT '' NOT NULL,
	"temperature_c" double precision,
	"pass" integer NOT NULL,
	"strikes_reading_id" uuid,
	"by_name" text NOT NULL,
	"grant_id" uuid,
	"person_id" uuid,
	CONSTRAINT "reading_sequence_unique" UNIQUE("sequence"),
	CONSTRAINT "reading_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "reading_device_key" UNIQUE("device_id","device_sequence"),
	CONSTRAINT "reading_strikes_key" UNIQUE("strikes_reading_id")
);
--> statement-breakpoint
CREATE TABLE "sign_off" (
	"id" uuid PRIMARY KEY NOT NULL,
	"sequence" bigserial NOT NULL,
	"party_id" uuid NOT NULL,
	"show_id" uuid NOT NULL,
	"kit_entry_id" uuid NOT NULL,
	"decision" text NOT NULL,
	"by_name" text NOT NULL,
	"remark" text DEFAULT '' NOT NULL,
	"grant_id" uuid,
	"person_id" uuid,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "sign_off_sequence_unique" UNIQUE("sequence"),
	CONSTRAINT "sign_off_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "contact" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"venue_id" uuid,
	"supplier_id" uuid,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"phone" text DEFAULT '' NOT NULL,
	"duties" text[] DEFAULT '{}' NOT NULL,
	"locale" text DEFAULT 'en' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "contact_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "contact_of_one" CHECK (num_nonnulls("contact"."venue_id", "contact"."supplier_id") = 1)
);
--> statement-breakpoint
CREATE TABLE "stage" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"venue_id" uuid NOT NULL,
	"name" text NOT NULL,
	"width_m" double precision NOT NULL,
	"depth_m" double precision NOT NULL,
	"height_m" double precision DEFAULT 0 NOT NULL,
	"access" text[] DEFAULT '{}' NOT NULL,
	"volts" double precision,
	"mains_hz" double precision,
	"inlets" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "stage_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "supplier" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"name" text NOT NULL,
	"town" text DEFAULT '' NOT NULL,
	"country" text DEFAULT '' NOT NULL,
	"zone" text,
	"currency" text,
	"remark" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "supplier_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "venue" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"name" text NOT NULL,
	"town" text DEFAULT '' NOT NULL,
	"country" text DEFAULT '' NOT NULL,
	"zone" text,
	"remark" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "venue_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "blob" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"sha256" text NOT NULL,
	"size" integer NOT NULL,
	"content_type" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "blob_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "blob_content_key" UNIQUE("party_id","sha256")
);
--> statement-breakpoint
CREATE TABLE "file_reference" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"blob_id" uuid NOT NULL,
	"name" text NOT NULL,
	"audience" text NOT NULL,
	"subject_type" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "file_reference_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "grant" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"purpose" text NOT NULL,
	"show_id" uuid,
	"hire_id" uuid,
	"contact_id" uuid,
	"recipient_name" text NOT NULL,
	"recipient_email" text,
	"expires_at" timestamp with time zone NOT NULL,
	"withdrawn_at" timestamp with time zone,
	"created_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "grant_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "grant_of_one" CHECK (num_nonnulls("grant"."show_id", "grant"."hire_id") = 1),
	CONSTRAINT "grant_bench_of_show" CHECK ("grant"."purpose" <> 'bench' or "grant"."show_id" is not null)
);
--> statement-breakpoint
CREATE TABLE "grant_token" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"grant_id" uuid NOT NULL,
	"token_hash" text NOT NULL,
	"made_for" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"last_used_at" timestamp with time zone,
	"use_count" integer DEFAULT 0 NOT NULL,
	CONSTRAINT "grant_token_token_hash_unique" UNIQUE("token_hash"),
	CONSTRAINT "grant_token_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "hire" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"tour_id" uuid NOT NULL,
	"supplier_id" uuid NOT NULL,
	"name" text DEFAULT '' NOT NULL,
	"zone" text,
	"delivery_date" date,
	"delivery_from" text,
	"delivery_until" text,
	"collection_date" date,
	"collection_from" text,
	"collection_until" text,
	"receiver" text DEFAULT '' NOT NULL,
	"condition_on_return" text DEFAULT '' NOT NULL,
	"po_number" text DEFAULT '' NOT NULL,
	"rate_basis" text DEFAULT 'show' NOT NULL,
	"currency" text,
	"transport_minor" bigint,
	"tax_basis_points" integer,
	"valid_until" date,
	"answers_due_at" timestamp with time zone,
	"confirmed_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "hire_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "hire_show" (
	"party_id" uuid NOT NULL,
	"hire_id" uuid NOT NULL,
	"show_id" uuid NOT NULL,
	CONSTRAINT "hire_show_hire_id_show_id_pk" PRIMARY KEY("hire_id","show_id")
);
--> statement-breakpoint
CREATE TABLE "job_worker" (
	"worker_id" text PRIMARY KEY NOT NULL,
	"seen_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "kit_entry" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"rig_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"name" text NOT NULL,
	"supply" text NOT NULL,
	"count" integer DEFAULT 1 NOT NULL,
	"remark" text DEFAULT '' NOT NULL,
	"spec" jsonb NOT NULL,
	"position" integer DEFAULT 0 NOT NULL,
	"removed_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "kit_entry_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "mail" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid,
	"kind" text NOT NULL,
	"to_address" text NOT NULL,
	"to_name" text DEFAULT '' NOT NULL,
	"subject" text NOT NULL,
	"text_body" text NOT NULL,
	"html_body" text NOT NULL,
	"idempotency_key" text NOT NULL,
	"send_after" timestamp with time zone DEFAULT now() NOT NULL,
	"first_tried_at" timestamp with time zone,
	"attempts" integer DEFAULT 0 NOT NULL,
	"sent_at" timestamp with time zone,
	"provider_id" text,
	"cancelled_at" timestamp with time zone,
	"failed_at" timestamp with time zone,
	"failure" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "mail_idempotency_key_unique" UNIQUE("idempotency_key"),
	CONSTRAINT "mail_provider_id_unique" UNIQUE("provider_id"),
	CONSTRAINT "mail_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "mail_attachment" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"mail_id" uuid NOT NULL,
	"blob_id" uuid NOT NULL,
	"name" text NOT NULL
);
--> statement-breakpoint
CREATE TABLE "mail_event" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"event_id" text NOT NULL,
	"mail_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"detail" jsonb NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"received_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "mail_event_event_id_unique" UNIQUE("event_id")
);
--> statement-breakpoint
CREATE TABLE "invitation" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"email" text NOT NULL,
	"roles" text[] NOT NULL,
	"token_hash" text NOT NULL,
	"invited_by" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"accepted_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone,
	CONSTRAINT "invitation_token_hash_unique" UNIQUE("token_hash"),
	CONSTRAINT "invitation_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "membership" (
	"party_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"roles" text[] NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "membership_party_id_person_id_pk" PRIMARY KEY("party_id","person_id")
);
--> statement-breakpoint
CREATE TABLE "party" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"units" text DEFAULT 'metric' NOT NULL,
	"reference_hz" double precision DEFAULT 440 NOT NULL,
	"paper" text DEFAULT 'A4' NOT NULL,
	"locale" text DEFAULT 'en' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "player" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"name" text NOT NULL,
	"hand" text DEFAULT 'right' NOT NULL,
	"throne_height_m" double precision,
	"arrangement" jsonb,
	"mixes" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "player_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "stand_in" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"role" text NOT NULL,
	"lent_by" uuid NOT NULL,
	"from_at" timestamp with time zone DEFAULT now() NOT NULL,
	"until_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone,
	CONSTRAINT "stand_in_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "password_reset" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"person_id" uuid NOT NULL,
	"token_hash" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone,
	CONSTRAINT "password_reset_token_hash_unique" UNIQUE("token_hash")
);
--> statement-breakpoint
CREATE TABLE "person" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"name" text NOT NULL,
	"email" text NOT NULL,
	"email_verified_at" timestamp with time zone,
	"password_hash" text,
	"locale" text DEFAULT 'en' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "session" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"person_id" uuid NOT NULL,
	"active_party_id" uuid,
	"device" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"last_seen_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "verification_token" (
	"identifier" text NOT NULL,
	"token" text NOT NULL,
	"expires" timestamp with time zone NOT NULL,
	CONSTRAINT "verification_token_identifier_token_pk" PRIMARY KEY("identifier","token")
);
--> statement-breakpoint
CREATE TABLE "channel" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"rig_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"name" text NOT NULL,
	"piece_id" uuid,
	"output" text DEFAULT '' NOT NULL,
	"stand" text DEFAULT '' NOT NULL,
	"phantom" boolean DEFAULT false NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "channel_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "channel_number_key" UNIQUE("rig_id","number")
);
--> statement-breakpoint
CREATE TABLE "plot" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"rig_id" uuid NOT NULL,
	"show_id" uuid,
	"base_sequence" integer DEFAULT 0 NOT NULL,
	"sequence" integer DEFAULT 0 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "plot_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "plot_of_key" UNIQUE NULLS NOT DISTINCT("rig_id","show_id")
);
--> statement-breakpoint
CREATE TABLE "plot_command" (
	"party_id" uuid NOT NULL,
	"plot_id" uuid NOT NULL,
	"sequence" integer NOT NULL,
	"client_id" uuid NOT NULL,
	"command_version" integer NOT NULL,
	"command" jsonb NOT NULL,
	"person_id" uuid NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "plot_command_plot_id_sequence_pk" PRIMARY KEY("plot_id","sequence"),
	CONSTRAINT "plot_command_client_key" UNIQUE("plot_id","client_id")
);
--> statement-breakpoint
CREATE TABLE "plot_snapshot" (
	"party_id" uuid NOT NULL,
	"plot_id" uuid NOT NULL,
	"sequence" integer NOT NULL,
	"document" jsonb NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "plot_snapshot_plot_id_sequence_pk" PRIMARY KEY("plot_id","sequence")
);
--> statement-breakpoint
CREATE TABLE "rate_limit" (
	"key" varchar(255) PRIMARY KEY NOT NULL,
	"points" integer DEFAULT 0 NOT NULL,
	"expire" bigint
);
--> statement-breakpoint
CREATE TABLE "line" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"rig_id" uuid NOT NULL,
	"kit_entry_id" uuid,
	"kind" text NOT NULL,
	"replaces_line_id" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "line_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "line_entry_key" UNIQUE("kit_entry_id","kind")
);
--> statement-breakpoint
CREATE TABLE "revision" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"rig_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"note" text NOT NULL,
	"schema_version" integer NOT NULL,
	"document" jsonb NOT NULL,
	"document_hash" text NOT NULL,
	"issued_by" uuid NOT NULL,
	"issued_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "revision_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "revision_number_key" UNIQUE("rig_id","number")
);
--> statement-breakpoint
CREATE TABLE "revision_line" (
	"party_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"line_id" uuid NOT NULL,
	"hash" text NOT NULL,
	"position" integer NOT NULL,
	"content" jsonb NOT NULL,
	CONSTRAINT "revision_line_revision_id_line_id_pk" PRIMARY KEY("revision_id","line_id")
);
--> statement-breakpoint
CREATE TABLE "day" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"tour_id" uuid NOT NULL,
	"date" date NOT NULL,
	"kind" text NOT NULL,
	"remark" text DEFAULT '' NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "day_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "day_date_key" UNIQUE("tour_id","date")
);
--> statement-breakpoint
CREATE TABLE "rig" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"tour_id" uuid NOT NULL,
	"name" text NOT NULL,
	"position" integer DEFAULT 0 NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "rig_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "rig_name_key" UNIQUE("tour_id","name")
);
--> statement-breakpoint
CREATE TABLE "show" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"tour_id" uuid NOT NULL,
	"day_id" uuid NOT NULL,
	"rig_id" uuid NOT NULL,
	"stage_id" uuid NOT NULL,
	"player_id" uuid NOT NULL,
	"name" text DEFAULT '' NOT NULL,
	"zone" text,
	"load_in_time" text,
	"show_time" text,
	"show_day_offset" integer DEFAULT 0 NOT NULL,
	"answers_due_at" timestamp with time zone,
	"slot" jsonb,
	"shared_kit" jsonb,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "show_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
CREATE TABLE "tour" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"name" text NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "tour_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
ALTER TABLE "answer_event" ADD CONSTRAINT "answer_event_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answer_event" ADD CONSTRAINT "answer_event_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answer_event" ADD CONSTRAINT "answer_event_hire_fk" FOREIGN KEY ("party_id","hire_id") REFERENCES "public"."hire"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answer_event" ADD CONSTRAINT "answer_event_line_fk" FOREIGN KEY ("party_id","line_id") REFERENCES "public"."line"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answer_event" ADD CONSTRAINT "answer_event_revision_fk" FOREIGN KEY ("party_id","revision_id") REFERENCES "public"."revision"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answer_event" ADD CONSTRAINT "answer_event_grant_fk" FOREIGN KEY ("party_id","grant_id") REFERENCES "public"."grant"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "answer_event" ADD CONSTRAINT "answer_event_token_fk" FOREIGN KEY ("party_id","token_id") REFERENCES "public"."grant_token"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispatch" ADD CONSTRAINT "dispatch_sent_by_person_id_fk" FOREIGN KEY ("sent_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispatch" ADD CONSTRAINT "dispatch_pack_fk" FOREIGN KEY ("party_id","pack_id") REFERENCES "public"."pack"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispatch" ADD CONSTRAINT "dispatch_grant_fk" FOREIGN KEY ("party_id","grant_id") REFERENCES "public"."grant"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispatch" ADD CONSTRAINT "dispatch_contact_fk" FOREIGN KEY ("party_id","contact_id") REFERENCES "public"."contact"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "dispatch" ADD CONSTRAINT "dispatch_mail_fk" FOREIGN KEY ("party_id","mail_id") REFERENCES "public"."mail"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pack" ADD CONSTRAINT "pack_revision_fk" FOREIGN KEY ("party_id","revision_id") REFERENCES "public"."revision"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pack" ADD CONSTRAINT "pack_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pack" ADD CONSTRAINT "pack_hire_fk" FOREIGN KEY ("party_id","hire_id") REFERENCES "public"."hire"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "pack" ADD CONSTRAINT "pack_blob_fk" FOREIGN KEY ("party_id","pdf_blob_id") REFERENCES "public"."blob"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement" ADD CONSTRAINT "settlement_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement" ADD CONSTRAINT "settlement_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement" ADD CONSTRAINT "settlement_hire_fk" FOREIGN KEY ("party_id","hire_id") REFERENCES "public"."hire"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement" ADD CONSTRAINT "settlement_line_fk" FOREIGN KEY ("party_id","line_id") REFERENCES "public"."line"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "settlement" ADD CONSTRAINT "settlement_answer_fk" FOREIGN KEY ("party_id","answer_event_id") REFERENCES "public"."answer_event"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bench_drum" ADD CONSTRAINT "bench_drum_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bench_drum" ADD CONSTRAINT "bench_drum_entry_fk" FOREIGN KEY ("party_id","kit_entry_id") REFERENCES "public"."kit_entry"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "bench_drum" ADD CONSTRAINT "bench_drum_physical_fk" FOREIGN KEY ("party_id","physical_drum_id") REFERENCES "public"."physical_drum"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "physical_drum" ADD CONSTRAINT "physical_drum_supplier_fk" FOREIGN KEY ("party_id","supplier_id") REFERENCES "public"."supplier"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading" ADD CONSTRAINT "reading_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading" ADD CONSTRAINT "reading_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading" ADD CONSTRAINT "reading_entry_fk" FOREIGN KEY ("party_id","kit_entry_id") REFERENCES "public"."kit_entry"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading" ADD CONSTRAINT "reading_physical_fk" FOREIGN KEY ("party_id","physical_drum_id") REFERENCES "public"."physical_drum"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading" ADD CONSTRAINT "reading_grant_fk" FOREIGN KEY ("party_id","grant_id") REFERENCES "public"."grant"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reading" ADD CONSTRAINT "reading_strikes_fk" FOREIGN KEY ("party_id","strikes_reading_id") REFERENCES "public"."reading"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_off" ADD CONSTRAINT "sign_off_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_off" ADD CONSTRAINT "sign_off_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_off" ADD CONSTRAINT "sign_off_entry_fk" FOREIGN KEY ("party_id","kit_entry_id") REFERENCES "public"."kit_entry"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_off" ADD CONSTRAINT "sign_off_grant_fk" FOREIGN KEY ("party_id","grant_id") REFERENCES "public"."grant"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contact" ADD CONSTRAINT "contact_venue_fk" FOREIGN KEY ("party_id","venue_id") REFERENCES "public"."venue"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "contact" ADD CONSTRAINT "contact_supplier_fk" FOREIGN KEY ("party_id","supplier_id") REFERENCES "public"."supplier"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stage" ADD CONSTRAINT "stage_venue_fk" FOREIGN KEY ("party_id","venue_id") REFERENCES "public"."venue"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "supplier" ADD CONSTRAINT "supplier_party_id_party_id_fk" FOREIGN KEY ("party_id") REFERENCES "public"."party"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "venue" ADD CONSTRAINT "venue_party_id_party_id_fk" FOREIGN KEY ("party_id") REFERENCES "public"."party"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "blob" ADD CONSTRAINT "blob_party_id_party_id_fk" FOREIGN KEY ("party_id") REFERENCES "public"."party"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "file_reference" ADD CONSTRAINT "file_reference_blob_fk" FOREIGN KEY ("party_id","blob_id") REFERENCES "public"."blob"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "grant" ADD CONSTRAINT "grant_created_by_person_id_fk" FOREIGN KEY ("created_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "grant" ADD CONSTRAINT "grant_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "grant" ADD CONSTRAINT "grant_hire_fk" FOREIGN KEY ("party_id","hire_id") REFERENCES "public"."hire"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "grant" ADD CONSTRAINT "grant_contact_fk" FOREIGN KEY ("party_id","contact_id") REFERENCES "public"."contact"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "grant_token" ADD CONSTRAINT "grant_token_grant_fk" FOREIGN KEY ("party_id","grant_id") REFERENCES "public"."grant"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hire" ADD CONSTRAINT "hire_tour_fk" FOREIGN KEY ("party_id","tour_id") REFERENCES "public"."tour"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hire" ADD CONSTRAINT "hire_supplier_fk" FOREIGN KEY ("party_id","supplier_id") REFERENCES "public"."supplier"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hire_show" ADD CONSTRAINT "hire_show_hire_fk" FOREIGN KEY ("party_id","hire_id") REFERENCES "public"."hire"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hire_show" ADD CONSTRAINT "hire_show_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "kit_entry" ADD CONSTRAINT "kit_entry_rig_fk" FOREIGN KEY ("party_id","rig_id") REFERENCES "public"."rig"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mail_attachment" ADD CONSTRAINT "mail_attachment_mail_fk" FOREIGN KEY ("party_id","mail_id") REFERENCES "public"."mail"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mail_attachment" ADD CONSTRAINT "mail_attachment_blob_fk" FOREIGN KEY ("party_id","blob_id") REFERENCES "public"."blob"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "mail_event" ADD CONSTRAINT "mail_event_mail_id_mail_id_fk" FOREIGN KEY ("mail_id") REFERENCES "public"."mail"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitation" ADD CONSTRAINT "invitation_party_id_party_id_fk" FOREIGN KEY ("party_id") REFERENCES "public"."party"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitation" ADD CONSTRAINT "invitation_invited_by_person_id_fk" FOREIGN KEY ("invited_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "membership" ADD CONSTRAINT "membership_party_id_party_id_fk" FOREIGN KEY ("party_id") REFERENCES "public"."party"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "membership" ADD CONSTRAINT "membership_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "player" ADD CONSTRAINT "player_party_id_party_id_fk" FOREIGN KEY ("party_id") REFERENCES "public"."party"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stand_in" ADD CONSTRAINT "stand_in_lent_by_person_id_fk" FOREIGN KEY ("lent_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "stand_in" ADD CONSTRAINT "stand_in_membership_fk" FOREIGN KEY ("party_id","person_id") REFERENCES "public"."membership"("party_id","person_id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "password_reset" ADD CONSTRAINT "password_reset_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "session" ADD CONSTRAINT "session_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "channel" ADD CONSTRAINT "channel_rig_fk" FOREIGN KEY ("party_id","rig_id") REFERENCES "public"."rig"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plot" ADD CONSTRAINT "plot_rig_fk" FOREIGN KEY ("party_id","rig_id") REFERENCES "public"."rig"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plot" ADD CONSTRAINT "plot_show_fk" FOREIGN KEY ("party_id","show_id") REFERENCES "public"."show"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plot_command" ADD CONSTRAINT "plot_command_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plot_command" ADD CONSTRAINT "plot_command_plot_fk" FOREIGN KEY ("party_id","plot_id") REFERENCES "public"."plot"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "plot_snapshot" ADD CONSTRAINT "plot_snapshot_plot_fk" FOREIGN KEY ("party_id","plot_id") REFERENCES "public"."plot"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "line" ADD CONSTRAINT "line_rig_fk" FOREIGN KEY ("party_id","rig_id") REFERENCES "public"."rig"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "line" ADD CONSTRAINT "line_entry_fk" FOREIGN KEY ("party_id","kit_entry_id") REFERENCES "public"."kit_entry"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "line" ADD CONSTRAINT "line_replaces_fk" FOREIGN KEY ("party_id","replaces_line_id") REFERENCES "public"."line"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision" ADD CONSTRAINT "revision_issued_by_person_id_fk" FOREIGN KEY ("issued_by") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision" ADD CONSTRAINT "revision_rig_fk" FOREIGN KEY ("party_id","rig_id") REFERENCES "public"."rig"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_line" ADD CONSTRAINT "revision_line_revision_fk" FOREIGN KEY ("party_id","revision_id") REFERENCES "public"."revision"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_line" ADD CONSTRAINT "revision_line_line_fk" FOREIGN KEY ("party_id","line_id") REFERENCES "public"."line"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "day" ADD CONSTRAINT "day_tour_fk" FOREIGN KEY ("party_id","tour_id") REFERENCES "public"."tour"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "rig" ADD CONSTRAINT "rig_tour_fk" FOREIGN KEY ("party_id","tour_id") REFERENCES "public"."tour"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "show" ADD CONSTRAINT "show_tour_fk" FOREIGN KEY ("party_id","tour_id") REFERENCES "public"."tour"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "show" ADD CONSTRAINT "show_day_fk" FOREIGN KEY ("party_id","day_id") REFERENCES "public"."day"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "show" ADD CONSTRAINT "show_rig_fk" FOREIGN KEY ("party_id","rig_id") REFERENCES "public"."rig"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "show" ADD CONSTRAINT "show_stage_fk" FOREIGN KEY ("party_id","stage_id") REFERENCES "public"."stage"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "show" ADD CONSTRAINT "show_player_fk" FOREIGN KEY ("party_id","player_id") REFERENCES "public"."player"("party_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "tour" ADD CONSTRAINT "tour_party_id_party_id_fk" FOREIGN KEY ("party_id") REFERENCES "public"."party"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "answer_event_show_idx" ON "answer_event" USING btree ("party_id","show_id","sequence");--> statement-breakpoint
CREATE INDEX "answer_event_hire_idx" ON "answer_event" USING btree ("party_id","hire_id","sequence");--> statement-breakpoint
CREATE INDEX "dispatch_pack_idx" ON "dispatch" USING btree ("party_id","pack_id");--> statement-breakpoint
CREATE INDEX "dispatch_grant_idx" ON "dispatch" USING btree ("party_id","grant_id");--> statement-breakpoint
CREATE INDEX "pack_show_idx" ON "pack" USING btree ("party_id","show_id");--> statement-breakpoint
CREATE INDEX "pack_hire_idx" ON "pack" USING btree ("party_id","hire_id");--> statement-breakpoint
CREATE INDEX "settlement_show_idx" ON "settlement" USING btree ("party_id","show_id","sequence");--> statement-breakpoint
CREATE INDEX "settlement_hire_idx" ON "settlement" USING btree ("party_id","hire_id","sequence");--> statement-breakpoint
CREATE INDEX "audit_event_party_idx" ON "audit_event" USING btree ("party_id","id");--> statement-breakpoint
CREATE INDEX "audit_event_subject_idx" ON "audit_event" USING btree ("party_id","subject_type","subject_id");--> statement-breakpoint
CREATE INDEX "reading_head_idx" ON "reading" USING btree ("party_id","show_id","kit_entry_id","side","sequence");--> statement-breakpoint
CREATE INDEX "sign_off_show_idx" ON "sign_off" USING btree ("party_id","show_id");--> statement-breakpoint
CREATE INDEX "contact_venue_idx" ON "contact" USING btree ("party_id","venue_id");--> statement-breakpoint
CREATE INDEX "contact_supplier_idx" ON "contact" USING btree ("party_id","supplier_id");--> statement-breakpoint
CREATE INDEX "stage_venue_idx" ON "stage" USING btree ("party_id","venue_id");--> statement-breakpoint
CREATE INDEX "file_reference_subject_idx" ON "file_reference" USING btree ("party_id","subject_type","subject_id");--> statement-breakpoint
CREATE INDEX "grant_show_idx" ON "grant" USING btree ("party_id","show_id");--> statement-breakpoint
CREATE INDEX "grant_hire_idx" ON "grant" USING btree ("party_id","hire_id");--> statement-breakpoint
CREATE INDEX "grant_token_grant_idx" ON "grant_token" USING btree ("party_id","grant_id");--> statement-breakpoint
CREATE INDEX "hire_tour_idx" ON "hire" USING btree ("party_id","tour_id");--> statement-breakpoint
CREATE INDEX "hire_show_show_idx" ON "hire_show" USING btree ("party_id","show_id");--> statement-breakpoint
CREATE INDEX "kit_entry_rig_idx" ON "kit_entry" USING btree ("party_id","rig_id");--> statement-breakpoint
CREATE INDEX "mail_attachment_mail_idx" ON "mail_attachment" USING btree ("mail_id");--> statement-breakpoint
CREATE INDEX "mail_event_mail_idx" ON "mail_event" USING btree ("mail_id");--> statement-breakpoint
CREATE UNIQUE INDEX "invitation_open_key" ON "invitation" USING btree ("party_id",lower("email")) WHERE "invitation"."accepted_at" is null and "invitation"."withdrawn_at" is null;--> statement-breakpoint
CREATE INDEX "membership_person_idx" ON "membership" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "stand_in_person_idx" ON "stand_in" USING btree ("party_id","person_id");--> statement-breakpoint
CREATE INDEX "password_reset_person_idx" ON "password_reset" USING btree ("person_id");--> statement-breakpoint
CREATE UNIQUE INDEX "person_email_key" ON "person" USING btree (lower("email"));--> statement-breakpoint
CREATE INDEX "session_person_idx" ON "session" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "channel_rig_idx" ON "channel" USING btree ("party_id","rig_id");--> statement-breakpoint
CREATE INDEX "line_rig_idx" ON "line" USING btree ("party_id","rig_id");--> statement-breakpoint
CREATE INDEX "revision_line_line_idx" ON "revision_line" USING btree ("party_id","line_id");--> statement-breakpoint
CREATE INDEX "show_tour_idx" ON "show" USING btree ("party_id","tour_id");--> statement-breakpoint
CREATE INDEX "show_rig_idx" ON "show" USING btree ("party_id","rig_id");