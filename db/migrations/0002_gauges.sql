CREATE TABLE "gauge" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"party_id" uuid NOT NULL,
	"name" text NOT NULL,
	"scale_min" double precision NOT NULL,
	"scale_max" double precision NOT NULL,
	"scale_step" double precision NOT NULL,
	"remark" text DEFAULT '' NOT NULL,
	"tours_gauge" boolean DEFAULT false NOT NULL,
	"removed_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "gauge_party_key" UNIQUE("party_id","id"),
	CONSTRAINT "gauge_tours_stands" CHECK (not ("gauge"."tours_gauge" and "gauge"."removed_at" is not null))
);
--> statement-breakpoint
CREATE TABLE "gauge_pair" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"sequence" bigserial NOT NULL,
	"party_id" uuid NOT NULL,
	"gauge_id" uuid NOT NULL,
	"reading" double precision NOT NULL,
	"diameter_in" double precision NOT NULL,
	"depth_in" double precision NOT NULL,
	"ply_mils" double precision[] NOT NULL,
	"film" text NOT NULL,
	"coating_g_per_m2" double precision NOT NULL,
	"tap_hz" double precision NOT NULL,
	"temperature_c" double precision,
	"remark" text DEFAULT '' NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"by_person_id" uuid NOT NULL,
	"struck_at" timestamp with time zone,
	CONSTRAINT "gauge_pair_sequence_unique" UNIQUE("sequence"),
	CONSTRAINT "gauge_pair_party_key" UNIQUE("party_id","id")
);
--> statement-breakpoint
ALTER TABLE "gauge" ADD CONSTRAINT "gauge_party_id_party_id_fk" FOREIGN KEY ("party_id") REFERENCES "public"."party"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gauge_pair" ADD CONSTRAINT "gauge_pair_by_person_id_person_id_fk" FOREIGN KEY ("by_person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "gauge_pair" ADD CONSTRAINT "gauge_pair_gauge_fk" FOREIGN KEY ("party_id","gauge_id") REFERENCES "public"."gauge"("party_id","id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE UNIQUE INDEX "gauge_tours_key" ON "gauge" USING btree ("party_id") WHERE "gauge"."tours_gauge";--> statement-breakpoint
CREATE INDEX "gauge_pair_gauge_idx" ON "gauge_pair" USING btree ("party_id","gauge_id","sequence");