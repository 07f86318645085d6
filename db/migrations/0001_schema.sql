CREATE TABLE "account_event" (
	"id" uuid PRIMARY KEY NOT NULL,
	"at" timestamp with time zone DEFAULT now() NOT NULL,
	"person_id" uuid,
	"kind" text NOT NULL,
	"address" "inet",
	"detail" jsonb
);
--> statement-breakpoint
CREATE TABLE "caution" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"level" text NOT NULL,
	"subject" text NOT NULL,
	"text" text NOT NULL,
	"source" text NOT NULL,
	"shipped_key" text,
	"applies_to" jsonb NOT NULL,
	"is_active" boolean DEFAULT true NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "caution_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "caution_shipped_key_unique" UNIQUE("shop_id","shipped_key"),
	CONSTRAINT "caution_level" CHECK ("caution"."level" in ('never','care'))
);
--> statement-breakpoint
ALTER TABLE "caution" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "cell" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"coupon_id" uuid NOT NULL,
	"grid_id" uuid NOT NULL,
	"address" text NOT NULL,
	"row_index" integer NOT NULL,
	"column_index" integer NOT NULL,
	"run_order" integer NOT NULL,
	"parameters" jsonb NOT NULL,
	"actual_parameters" jsonb,
	"mark_state" text DEFAULT 'planned' NOT NULL,
	"mark_note" text DEFAULT '' NOT NULL,
	"marked_at" timestamp with time zone,
	"marked_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "cell_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "cell_address_unique" UNIQUE("shop_id","grid_id","address"),
	CONSTRAINT "cell_coupon_unique" UNIQUE("shop_id","coupon_id","id"),
	CONSTRAINT "cell_mark_state" CHECK ("cell"."mark_state" in ('planned','marked','differs','skipped'))
);
--> statement-breakpoint
ALTER TABLE "cell" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "cell_rating" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"cell_id" uuid NOT NULL,
	"member_id" uuid NOT NULL,
	"rating" integer,
	"outcome" text,
	"tags" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"note" text DEFAULT '' NOT NULL,
	"rated_at" timestamp with time zone DEFAULT now() NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "cell_rating_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "cell_rating_person_unique" UNIQUE("shop_id","cell_id","member_id"),
	CONSTRAINT "cell_rating_range" CHECK ("cell_rating"."rating" between 0 and 5)
);
--> statement-breakpoint
ALTER TABLE "cell_rating" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "code_counter" (
	"shop_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"last_number" integer DEFAULT 0 NOT NULL,
	CONSTRAINT "code_counter_shop_id_kind_pk" PRIMARY KEY("shop_id","kind"),
	CONSTRAINT "code_counter_kind" CHECK ("code_counter"."kind" in ('coupon','recipe','run'))
);
--> statement-breakpoint
ALTER TABLE "code_counter" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "coupon" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"code" text NOT NULL,
	"title" text DEFAULT '' NOT NULL,
	"purpose" text DEFAULT 'exploration' NOT NULL,
	"state" text DEFAULT 'planned' NOT NULL,
	"material_id" uuid NOT NULL,
	"finish_id" uuid NOT NULL,
	"effect_id" uuid NOT NULL,
	"machine_id" uuid NOT NULL,
	"profile_id" uuid NOT NULL,
	"lens_id" uuid NOT NULL,
	"calibration_id" uuid,
	"confirms_revision_id" uuid,
	"lot" text DEFAULT '' NOT NULL,
	"thickness_mm" double precision,
	"stored_at" text DEFAULT '' NOT NULL,
	"ambient_notes" text DEFAULT '' NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"is_imported" boolean DEFAULT false NOT NULL,
	"unknown_fields" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"is_invented" boolean DEFAULT false NOT NULL,
	"source_note" text DEFAULT '' NOT NULL,
	"criteria" jsonb,
	"criteria_recorded_at" timestamp with time zone,
	"acknowledged_caution_ids" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"marking_started_at" timestamp with time zone,
	"marked_at" timestamp with time zone,
	"marked_by" uuid,
	"inspected_at" timestamp with time zone,
	"inspected_by" uuid,
	"sealed_at" timestamp with time zone,
	"sealed_by" uuid,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "coupon_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "coupon_code_unique" UNIQUE("shop_id","code"),
	CONSTRAINT "coupon_state" CHECK ("coupon"."state" in ('planned','marked','inspected','sealed')),
	CONSTRAINT "coupon_purpose" CHECK ("coupon"."purpose" in ('exploration','confirmation'))
);
--> statement-breakpoint
ALTER TABLE "coupon" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "coupon_correction" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"coupon_id" uuid NOT NULL,
	"cell_id" uuid,
	"text" text NOT NULL,
	"reason" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "coupon_correction_shop_id_id_pk" PRIMARY KEY("shop_id","id")
);
--> statement-breakpoint
ALTER TABLE "coupon_correction" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "deviation" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"description" text NOT NULL,
	"reason" text NOT NULL,
	"ends_at" timestamp with time zone,
	"maximum_quantity" integer,
	"granted_by_name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "deviation_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "deviation_is_limited" CHECK ("deviation"."ends_at" is not null or "deviation"."maximum_quantity" is not null)
);
--> statement-breakpoint
ALTER TABLE "deviation" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "effect" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"key" text NOT NULL,
	"criteria" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "effect_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "effect_name_unique" UNIQUE("shop_id","name"),
	CONSTRAINT "effect_key_unique" UNIQUE("shop_id","key")
);
--> statement-breakpoint
ALTER TABLE "effect" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "finish" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"preparation" text DEFAULT '' NOT NULL,
	"treatment" text DEFAULT '' NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "finish_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "finish_name_unique" UNIQUE("shop_id","name")
);
--> statement-breakpoint
ALTER TABLE "finish" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "hold" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"recipe_id" uuid,
	"machine_id" uuid,
	"reason" text NOT NULL,
	"placed_by_name" text NOT NULL,
	"released_at" timestamp with time zone,
	"released_by" uuid,
	"released_by_name" text,
	"release_reason" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "hold_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "hold_one_subject" CHECK (("hold"."recipe_id" is null) <> ("hold"."machine_id" is null))
);
--> statement-breakpoint
ALTER TABLE "hold" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "idempotency_key" (
	"shop_id" uuid NOT NULL,
	"member_id" uuid NOT NULL,
	"route" text NOT NULL,
	"key" text NOT NULL,
	"request_hash" text NOT NULL,
	"response_status" integer,
	"response_body" jsonb,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "idempotency_key_shop_id_member_id_route_key_pk" PRIMARY KEY("shop_id","member_id","route","key")
);
--> statement-breakpoint
ALTER TABLE "idempotency_key" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "invitation" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"email" text NOT NULL,
	"role" text NOT NULL,
	"token_hash" text NOT NULL,
	"state" text DEFAULT 'open' NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"accepted_at" timestamp with time zone,
	"accepted_member_id" uuid,
	CONSTRAINT "invitation_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "invitation_token_unique" UNIQUE("shop_id","token_hash"),
	CONSTRAINT "invitation_role" CHECK ("invitation"."role" in ('trainee','operator','lead','owner')),
	CONSTRAINT "invitation_state" CHECK ("invitation"."state" in ('open','accepted','revoked'))
);
--> statement-breakpoint
ALTER TABLE "invitation" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "ledger_event" (
	"shop_id" uuid NOT NULL,
	"seq" bigint NOT NULL,
	"at" timestamp with time zone NOT NULL,
	"actor_member_id" uuid,
	"actor_name" text NOT NULL,
	"session_id" uuid,
	"action" text NOT NULL,
	"subject_type" text NOT NULL,
	"subject_id" uuid NOT NULL,
	"subject_code" text,
	"before" jsonb,
	"after" jsonb,
	"body_hash" text NOT NULL,
	"previous_hash" text NOT NULL,
	"hash" text NOT NULL,
	CONSTRAINT "ledger_event_shop_id_seq_pk" PRIMARY KEY("shop_id","seq")
);
--> statement-breakpoint
ALTER TABLE "ledger_event" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "ledger_head" (
	"shop_id" uuid PRIMARY KEY NOT NULL,
	"seq" bigint DEFAULT 0 NOT NULL,
	"hash" text NOT NULL
);
--> statement-breakpoint
ALTER TABLE "ledger_head" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "lens" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"focal_length_mm" double precision NOT NULL,
	"field_size_mm" double precision NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "lens_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "lens_name_unique" UNIQUE("shop_id","name"),
	CONSTRAINT "lens_lengths" CHECK ("lens"."focal_length_mm" > 0 and "lens"."field_size_mm" > 0)
);
--> statement-breakpoint
ALTER TABLE "lens" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "machine" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"source_kind" text NOT NULL,
	"serial_number" text DEFAULT '' NOT NULL,
	"warm_up_minutes" integer DEFAULT 0 NOT NULL,
	"mounted_lens_id" uuid,
	"profile_number" integer DEFAULT 1 NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "machine_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "machine_name_unique" UNIQUE("shop_id","name"),
	CONSTRAINT "machine_source_kind" CHECK ("machine"."source_kind" in ('fibre-q-switched','fibre-mopa','co2','uv','green','diode','ultrafast'))
);
--> statement-breakpoint
ALTER TABLE "machine" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "machine_lens" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"machine_id" uuid NOT NULL,
	"lens_id" uuid NOT NULL,
	"working_distance_mm" double precision,
	"focus_method" text DEFAULT '' NOT NULL,
	"measured_spot_um" double precision,
	"spot_method" text,
	"spot_measured_on" date,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "machine_lens_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "machine_lens_pair_unique" UNIQUE("shop_id","machine_id","lens_id")
);
--> statement-breakpoint
ALTER TABLE "machine_lens" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "machine_profile" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"machine_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"physical_number" integer NOT NULL,
	"source_kind" text NOT NULL,
	"physical" jsonb NOT NULL,
	"panel" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "machine_profile_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "machine_profile_number_unique" UNIQUE("shop_id","machine_id","number")
);
--> statement-breakpoint
ALTER TABLE "machine_profile" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "material" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"family" text NOT NULL,
	"grade" text DEFAULT '' NOT NULL,
	"standard_designation" text DEFAULT '' NOT NULL,
	"supplier" text DEFAULT '' NOT NULL,
	"thickness_mm" double precision,
	"properties" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"archived_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "material_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "material_name_unique" UNIQUE("shop_id","name")
);
--> statement-breakpoint
ALTER TABLE "material" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "material_group" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"name" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "material_group_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "material_group_name_unique" UNIQUE("shop_id","name")
);
--> statement-breakpoint
ALTER TABLE "material_group" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "material_group_material" (
	"shop_id" uuid NOT NULL,
	"material_group_id" uuid NOT NULL,
	"material_id" uuid NOT NULL,
	CONSTRAINT "material_group_material_shop_id_material_group_id_material_id_pk" PRIMARY KEY("shop_id","material_group_id","material_id")
);
--> statement-breakpoint
ALTER TABLE "material_group_material" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "measurement" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"cell_id" uuid NOT NULL,
	"quantity" text NOT NULL,
	"value" double precision,
	"grade" text,
	"unit" text NOT NULL,
	"method" text NOT NULL,
	"method_detail" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"instrument" text DEFAULT '' NOT NULL,
	"photo_id" uuid,
	"uncertainty" double precision,
	"measured_at" timestamp with time zone DEFAULT now() NOT NULL,
	"supersedes_id" uuid,
	"reason" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "measurement_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "measurement_method" CHECK ("measurement"."method" in ('photo','colorimeter','profilometer','microscope','verifier','calliper','manual')),
	CONSTRAINT "measurement_has_result" CHECK ("measurement"."value" is not null or "measurement"."grade" is not null)
);
--> statement-breakpoint
ALTER TABLE "measurement" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "member" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"person_id" uuid NOT NULL,
	"role" text NOT NULL,
	"printed_name" text NOT NULL,
	"state" text DEFAULT 'active' NOT NULL,
	"signs_for" jsonb,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"removed_at" timestamp with time zone,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "member_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "member_person_unique" UNIQUE("shop_id","person_id"),
	CONSTRAINT "member_role" CHECK ("member"."role" in ('trainee','operator','lead','owner')),
	CONSTRAINT "member_state" CHECK ("member"."state" in ('active','removed'))
);
--> statement-breakpoint
ALTER TABLE "member" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "outbox" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"kind" text NOT NULL,
	"payload" jsonb NOT NULL,
	"state" text DEFAULT 'waiting' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"failure" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"sent_at" timestamp with time zone,
	CONSTRAINT "outbox_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "outbox_state" CHECK ("outbox"."state" in ('waiting','sent','failed'))
);
--> statement-breakpoint
ALTER TABLE "outbox" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "password_reset" (
	"token_hash" text PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"used_at" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "person" (
	"id" uuid PRIMARY KEY NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text NOT NULL,
	"password_changed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"session_version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "photo" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"coupon_id" uuid NOT NULL,
	"state" text DEFAULT 'processing' NOT NULL,
	"refused_reason" text,
	"received_key" text,
	"received_sha256" text NOT NULL,
	"received_bytes" integer NOT NULL,
	"received_type" text NOT NULL,
	"master_sha256" text,
	"master_bytes" integer,
	"large_sha256" text,
	"small_sha256" text,
	"width_px" integer,
	"height_px" integer,
	"colour_profile" text,
	"captured_at" timestamp with time zone,
	"corners" jsonb,
	"corners_found_by" text,
	"light_notes" text DEFAULT '' NOT NULL,
	"flags" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"processed_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "photo_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "photo_state" CHECK ("photo"."state" in ('uploading','processing','ready','refused')),
	CONSTRAINT "photo_corners_found_by" CHECK ("photo"."corners_found_by" in ('hand','marks','render'))
);
--> statement-breakpoint
ALTER TABLE "photo" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "power_calibration" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"machine_id" uuid NOT NULL,
	"measured_on" date NOT NULL,
	"meter" text NOT NULL,
	"meter_due_on" date,
	"wavelength_nm" double precision NOT NULL,
	"frequency_khz" double precision,
	"pulse_width_ns" double precision,
	"points" jsonb NOT NULL,
	"notes" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "power_calibration_shop_id_id_pk" PRIMARY KEY("shop_id","id")
);
--> statement-breakpoint
ALTER TABLE "power_calibration" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "recipe" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"code" text NOT NULL,
	"title" text NOT NULL,
	"material_id" uuid NOT NULL,
	"finish_id" uuid NOT NULL,
	"effect_id" uuid NOT NULL,
	"machine_id" uuid NOT NULL,
	"lens_id" uuid NOT NULL,
	"thickness_from_mm" double precision,
	"thickness_to_mm" double precision,
	"part_diameter_from_mm" double precision,
	"part_diameter_to_mm" double precision,
	"feature_kind" text DEFAULT 'filled-area' NOT NULL,
	"feature_size_from_mm" double precision,
	"feature_size_to_mm" double precision,
	"material_group_id" uuid,
	"customer_specification" text DEFAULT '' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "recipe_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "recipe_code_unique" UNIQUE("shop_id","code"),
	CONSTRAINT "recipe_feature_kind" CHECK ("recipe"."feature_kind" in ('filled-area','stroke-text','single-line','code'))
);
--> statement-breakpoint
ALTER TABLE "recipe" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "refresh_token" (
	"token_hash" text PRIMARY KEY NOT NULL,
	"session_id" uuid NOT NULL,
	"successor" text,
	"used_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL
);
--> statement-breakpoint
CREATE TABLE "revision" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"recipe_id" uuid NOT NULL,
	"number" integer,
	"state" text DEFAULT 'draft' NOT NULL,
	"content" jsonb NOT NULL,
	"profile_id" uuid NOT NULL,
	"calibration_id" uuid,
	"reason" text DEFAULT '' NOT NULL,
	"based_on_id" uuid,
	"route" text DEFAULT 'coupons' NOT NULL,
	"grounds" text DEFAULT '' NOT NULL,
	"grounds_by" uuid,
	"effective_from" timestamp with time zone,
	"review_due" timestamp with time zone,
	"content_hash" text,
	"acknowledged_caution_ids" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"submitted_at" timestamp with time zone,
	"approved_at" timestamp with time zone,
	"withdrawn_at" timestamp with time zone,
	"superseded_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "revision_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "revision_recipe_unique" UNIQUE("shop_id","recipe_id","id"),
	CONSTRAINT "revision_number_unique" UNIQUE("shop_id","recipe_id","number"),
	CONSTRAINT "revision_state" CHECK ("revision"."state" in ('draft','in_review','returned','scheduled','approved','superseded','withdrawn')),
	CONSTRAINT "revision_route" CHECK ("revision"."route" in ('coupons','earlier-experience','customer-given','transferred')),
	CONSTRAINT "revision_number_from_submit" CHECK (("revision"."state" = 'draft') = ("revision"."number" is null)),
	CONSTRAINT "revision_hash_from_submit" CHECK ("revision"."state" = 'draft' or "revision"."content_hash" is not null)
);
--> statement-breakpoint
ALTER TABLE "revision" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "revision_evidence" (
	"shop_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"coupon_id" uuid NOT NULL,
	"cell_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "revision_evidence_shop_id_revision_id_cell_id_kind_pk" PRIMARY KEY("shop_id","revision_id","cell_id","kind"),
	CONSTRAINT "revision_evidence_kind" CHECK ("revision_evidence"."kind" in ('basis','confirmation'))
);
--> statement-breakpoint
ALTER TABLE "revision_evidence" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "run" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"code" text NOT NULL,
	"kind" text NOT NULL,
	"state" text DEFAULT 'started' NOT NULL,
	"recipe_id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"machine_id" uuid NOT NULL,
	"content_hash" text NOT NULL,
	"steps" jsonb,
	"job_reference" text DEFAULT '' NOT NULL,
	"part" text DEFAULT '' NOT NULL,
	"lot" text DEFAULT '' NOT NULL,
	"lens_fitted_id" uuid,
	"ticks" jsonb DEFAULT '{}'::jsonb NOT NULL,
	"first_piece" jsonb,
	"good_count" integer DEFAULT 0 NOT NULL,
	"scrap_count" integer DEFAULT 0 NOT NULL,
	"measurements" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"bad_result" jsonb,
	"deviation_id" uuid,
	"notes" text DEFAULT '' NOT NULL,
	"client_id" uuid NOT NULL,
	"started_at" timestamp with time zone DEFAULT now() NOT NULL,
	"finished_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "run_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "run_code_unique" UNIQUE("shop_id","code"),
	CONSTRAINT "run_client_unique" UNIQUE("shop_id","client_id"),
	CONSTRAINT "run_kind" CHECK ("run"."kind" in ('production','confirmation','daily-check')),
	CONSTRAINT "run_state" CHECK ("run"."state" in ('started','finished','abandoned')),
	CONSTRAINT "run_counts" CHECK ("run"."good_count" >= 0 and "run"."scrap_count" >= 0)
);
--> statement-breakpoint
ALTER TABLE "run" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "session" (
	"id" uuid PRIMARY KEY NOT NULL,
	"person_id" uuid NOT NULL,
	"shop_id" uuid,
	"member_id" uuid,
	"user_agent" text,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"last_seen_at" timestamp with time zone DEFAULT now() NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"ended_at" timestamp with time zone,
	"ended_because" text
);
--> statement-breakpoint
CREATE TABLE "setting_request" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"machine_id" uuid,
	"lens_id" uuid,
	"material_id" uuid,
	"finish_id" uuid,
	"effect_id" uuid,
	"note" text DEFAULT '' NOT NULL,
	"state" text DEFAULT 'open' NOT NULL,
	"answer" text,
	"answered_by" uuid,
	"answered_at" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "setting_request_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "setting_request_state" CHECK ("setting_request"."state" in ('open','answered','closed'))
);
--> statement-breakpoint
ALTER TABLE "setting_request" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "shop" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"unit_system" text DEFAULT 'metric' NOT NULL,
	"time_zone" text DEFAULT 'UTC' NOT NULL,
	"locale" text DEFAULT 'en-GB' NOT NULL,
	"policy" jsonb NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	CONSTRAINT "shop_unit_system" CHECK ("shop"."unit_system" in ('metric','inch'))
);
--> statement-breakpoint
ALTER TABLE "shop" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "sign_in_throttle" (
	"subject" text PRIMARY KEY NOT NULL,
	"failures" integer DEFAULT 0 NOT NULL,
	"consecutive_failures" integer DEFAULT 0 NOT NULL,
	"window_started_at" timestamp with time zone DEFAULT now() NOT NULL,
	"blocked_until" timestamp with time zone
);
--> statement-breakpoint
CREATE TABLE "sign_off" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"revision_id" uuid NOT NULL,
	"member_id" uuid NOT NULL,
	"printed_name" text NOT NULL,
	"role" text NOT NULL,
	"meaning" text NOT NULL,
	"comment" text DEFAULT '' NOT NULL,
	"signed_at" timestamp with time zone DEFAULT now() NOT NULL,
	"content_hash" text NOT NULL,
	"ledger_hash_before" text NOT NULL,
	"method" text NOT NULL,
	"is_by_author" boolean DEFAULT false NOT NULL,
	"checks" jsonb,
	"acknowledged_caution_ids" jsonb DEFAULT '[]'::jsonb NOT NULL,
	CONSTRAINT "sign_off_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "sign_off_meaning" CHECK ("sign_off"."meaning" in ('submitted for review','recalled','approved','returned','withdrawn','hold placed','hold released')),
	CONSTRAINT "sign_off_method" CHECK ("sign_off"."method" in ('password','session'))
);
--> statement-breakpoint
ALTER TABLE "sign_off" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "test_grid" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"coupon_id" uuid NOT NULL,
	"number" integer DEFAULT 1 NOT NULL,
	"rows" integer NOT NULL,
	"columns" integer NOT NULL,
	"row_factor" jsonb,
	"column_factor" jsonb,
	"base_setting" jsonb NOT NULL,
	"label_step" jsonb,
	"cell_mm" double precision NOT NULL,
	"gap_mm" double precision NOT NULL,
	"layout_version" text NOT NULL,
	"run_order_seed" integer,
	"fill_drawn_by" text DEFAULT 'machine' NOT NULL,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "test_grid_shop_id_id_pk" PRIMARY KEY("shop_id","id"),
	CONSTRAINT "test_grid_number_unique" UNIQUE("shop_id","coupon_id","number"),
	CONSTRAINT "test_grid_size" CHECK ("test_grid"."rows" between 1 and 26 and "test_grid"."columns" between 1 and 26),
	CONSTRAINT "test_grid_fill_drawn_by" CHECK ("test_grid"."fill_drawn_by" in ('machine','artwork'))
);
--> statement-breakpoint
ALTER TABLE "test_grid" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "training_record" (
	"shop_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"member_id" uuid NOT NULL,
	"subject" text NOT NULL,
	"taught_by" text NOT NULL,
	"taught_on" timestamp with time zone NOT NULL,
	"expires_on" timestamp with time zone,
	"created_at" timestamp with time zone DEFAULT now() NOT NULL,
	"created_by" uuid NOT NULL,
	CONSTRAINT "training_record_shop_id_id_pk" PRIMARY KEY("shop_id","id")
);
--> statement-breakpoint
ALTER TABLE "training_record" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "caution" ADD CONSTRAINT "caution_shop_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "caution" ADD CONSTRAINT "caution_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cell" ADD CONSTRAINT "cell_grid_fk" FOREIGN KEY ("shop_id","grid_id") REFERENCES "public"."test_grid"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cell" ADD CONSTRAINT "cell_coupon_fk" FOREIGN KEY ("shop_id","coupon_id") REFERENCES "public"."coupon"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cell" ADD CONSTRAINT "cell_marked_by_fk" FOREIGN KEY ("shop_id","marked_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cell_rating" ADD CONSTRAINT "cell_rating_cell_fk" FOREIGN KEY ("shop_id","cell_id") REFERENCES "public"."cell"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "cell_rating" ADD CONSTRAINT "cell_rating_member_fk" FOREIGN KEY ("shop_id","member_id") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "code_counter" ADD CONSTRAINT "code_counter_shop_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_material_fk" FOREIGN KEY ("shop_id","material_id") REFERENCES "public"."material"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_finish_fk" FOREIGN KEY ("shop_id","finish_id") REFERENCES "public"."finish"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_effect_fk" FOREIGN KEY ("shop_id","effect_id") REFERENCES "public"."effect"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_profile_fk" FOREIGN KEY ("shop_id","profile_id") REFERENCES "public"."machine_profile"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_lens_fk" FOREIGN KEY ("shop_id","lens_id") REFERENCES "public"."lens"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_calibration_fk" FOREIGN KEY ("shop_id","calibration_id") REFERENCES "public"."power_calibration"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_marked_by_fk" FOREIGN KEY ("shop_id","marked_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_inspected_by_fk" FOREIGN KEY ("shop_id","inspected_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon" ADD CONSTRAINT "coupon_sealed_by_fk" FOREIGN KEY ("shop_id","sealed_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon_correction" ADD CONSTRAINT "coupon_correction_coupon_fk" FOREIGN KEY ("shop_id","coupon_id") REFERENCES "public"."coupon"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon_correction" ADD CONSTRAINT "coupon_correction_cell_fk" FOREIGN KEY ("shop_id","coupon_id","cell_id") REFERENCES "public"."cell"("shop_id","coupon_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "coupon_correction" ADD CONSTRAINT "coupon_correction_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "deviation" ADD CONSTRAINT "deviation_revision_fk" FOREIGN KEY ("shop_id","revision_id") REFERENCES "public"."revision"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "deviation" ADD CONSTRAINT "deviation_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "effect" ADD CONSTRAINT "effect_shop_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "effect" ADD CONSTRAINT "effect_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "finish" ADD CONSTRAINT "finish_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hold" ADD CONSTRAINT "hold_recipe_fk" FOREIGN KEY ("shop_id","recipe_id") REFERENCES "public"."recipe"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hold" ADD CONSTRAINT "hold_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hold" ADD CONSTRAINT "hold_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "hold" ADD CONSTRAINT "hold_released_by_fk" FOREIGN KEY ("shop_id","released_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitation" ADD CONSTRAINT "invitation_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ledger_event" ADD CONSTRAINT "ledger_event_shop_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "ledger_head" ADD CONSTRAINT "ledger_head_shop_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "lens" ADD CONSTRAINT "lens_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "machine" ADD CONSTRAINT "machine_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "machine" ADD CONSTRAINT "machine_mounted_lens_fk" FOREIGN KEY ("shop_id","mounted_lens_id") REFERENCES "public"."lens"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "machine_lens" ADD CONSTRAINT "machine_lens_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "machine_lens" ADD CONSTRAINT "machine_lens_lens_fk" FOREIGN KEY ("shop_id","lens_id") REFERENCES "public"."lens"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "machine_lens" ADD CONSTRAINT "machine_lens_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "machine_profile" ADD CONSTRAINT "machine_profile_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "machine_profile" ADD CONSTRAINT "machine_profile_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "material" ADD CONSTRAINT "material_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "material_group" ADD CONSTRAINT "material_group_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "material_group_material" ADD CONSTRAINT "material_group_material_group_fk" FOREIGN KEY ("shop_id","material_group_id") REFERENCES "public"."material_group"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "material_group_material" ADD CONSTRAINT "material_group_material_material_fk" FOREIGN KEY ("shop_id","material_id") REFERENCES "public"."material"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurement" ADD CONSTRAINT "measurement_cell_fk" FOREIGN KEY ("shop_id","cell_id") REFERENCES "public"."cell"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurement" ADD CONSTRAINT "measurement_photo_fk" FOREIGN KEY ("shop_id","photo_id") REFERENCES "public"."photo"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurement" ADD CONSTRAINT "measurement_supersedes_fk" FOREIGN KEY ("shop_id","supersedes_id") REFERENCES "public"."measurement"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurement" ADD CONSTRAINT "measurement_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "member" ADD CONSTRAINT "member_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "member" ADD CONSTRAINT "member_shop_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_shop_fk" FOREIGN KEY ("shop_id") REFERENCES "public"."shop"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "password_reset" ADD CONSTRAINT "password_reset_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photo" ADD CONSTRAINT "photo_coupon_fk" FOREIGN KEY ("shop_id","coupon_id") REFERENCES "public"."coupon"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photo" ADD CONSTRAINT "photo_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "power_calibration" ADD CONSTRAINT "power_calibration_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "power_calibration" ADD CONSTRAINT "power_calibration_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe" ADD CONSTRAINT "recipe_material_fk" FOREIGN KEY ("shop_id","material_id") REFERENCES "public"."material"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe" ADD CONSTRAINT "recipe_finish_fk" FOREIGN KEY ("shop_id","finish_id") REFERENCES "public"."finish"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe" ADD CONSTRAINT "recipe_effect_fk" FOREIGN KEY ("shop_id","effect_id") REFERENCES "public"."effect"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe" ADD CONSTRAINT "recipe_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe" ADD CONSTRAINT "recipe_lens_fk" FOREIGN KEY ("shop_id","lens_id") REFERENCES "public"."lens"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe" ADD CONSTRAINT "recipe_material_group_fk" FOREIGN KEY ("shop_id","material_group_id") REFERENCES "public"."material_group"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "recipe" ADD CONSTRAINT "recipe_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "refresh_token" ADD CONSTRAINT "refresh_token_session_id_session_id_fk" FOREIGN KEY ("session_id") REFERENCES "public"."session"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision" ADD CONSTRAINT "revision_recipe_fk" FOREIGN KEY ("shop_id","recipe_id") REFERENCES "public"."recipe"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision" ADD CONSTRAINT "revision_profile_fk" FOREIGN KEY ("shop_id","profile_id") REFERENCES "public"."machine_profile"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision" ADD CONSTRAINT "revision_calibration_fk" FOREIGN KEY ("shop_id","calibration_id") REFERENCES "public"."power_calibration"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision" ADD CONSTRAINT "revision_based_on_fk" FOREIGN KEY ("shop_id","based_on_id") REFERENCES "public"."revision"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision" ADD CONSTRAINT "revision_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision" ADD CONSTRAINT "revision_grounds_by_fk" FOREIGN KEY ("shop_id","grounds_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_evidence" ADD CONSTRAINT "revision_evidence_revision_fk" FOREIGN KEY ("shop_id","revision_id") REFERENCES "public"."revision"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_evidence" ADD CONSTRAINT "revision_evidence_coupon_fk" FOREIGN KEY ("shop_id","coupon_id") REFERENCES "public"."coupon"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_evidence" ADD CONSTRAINT "revision_evidence_cell_fk" FOREIGN KEY ("shop_id","coupon_id","cell_id") REFERENCES "public"."cell"("shop_id","coupon_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "revision_evidence" ADD CONSTRAINT "revision_evidence_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "run" ADD CONSTRAINT "run_revision_fk" FOREIGN KEY ("shop_id","recipe_id","revision_id") REFERENCES "public"."revision"("shop_id","recipe_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "run" ADD CONSTRAINT "run_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "run" ADD CONSTRAINT "run_lens_fk" FOREIGN KEY ("shop_id","lens_fitted_id") REFERENCES "public"."lens"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "run" ADD CONSTRAINT "run_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "run" ADD CONSTRAINT "run_deviation_fk" FOREIGN KEY ("shop_id","deviation_id") REFERENCES "public"."deviation"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "session" ADD CONSTRAINT "session_person_id_person_id_fk" FOREIGN KEY ("person_id") REFERENCES "public"."person"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_request" ADD CONSTRAINT "setting_request_machine_fk" FOREIGN KEY ("shop_id","machine_id") REFERENCES "public"."machine"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_request" ADD CONSTRAINT "setting_request_lens_fk" FOREIGN KEY ("shop_id","lens_id") REFERENCES "public"."lens"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_request" ADD CONSTRAINT "setting_request_material_fk" FOREIGN KEY ("shop_id","material_id") REFERENCES "public"."material"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_request" ADD CONSTRAINT "setting_request_finish_fk" FOREIGN KEY ("shop_id","finish_id") REFERENCES "public"."finish"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_request" ADD CONSTRAINT "setting_request_effect_fk" FOREIGN KEY ("shop_id","effect_id") REFERENCES "public"."effect"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_request" ADD CONSTRAINT "setting_request_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "setting_request" ADD CONSTRAINT "setting_request_answered_by_fk" FOREIGN KEY ("shop_id","answered_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_off" ADD CONSTRAINT "sign_off_revision_fk" FOREIGN KEY ("shop_id","revision_id") REFERENCES "public"."revision"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sign_off" ADD CONSTRAINT "sign_off_member_fk" FOREIGN KEY ("shop_id","member_id") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_grid" ADD CONSTRAINT "test_grid_coupon_fk" FOREIGN KEY ("shop_id","coupon_id") REFERENCES "public"."coupon"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "test_grid" ADD CONSTRAINT "test_grid_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "training_record" ADD CONSTRAINT "training_record_member_fk" FOREIGN KEY ("shop_id","member_id") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "training_record" ADD CONSTRAINT "training_record_author_fk" FOREIGN KEY ("shop_id","created_by") REFERENCES "public"."member"("shop_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "account_event_person" ON "account_event" USING btree ("person_id","at");--> statement-breakpoint
CREATE INDEX "cell_coupon" ON "cell" USING btree ("shop_id","coupon_id");--> statement-breakpoint
CREATE INDEX "coupon_recent" ON "coupon" USING btree ("shop_id","created_at");--> statement-breakpoint
CREATE INDEX "coupon_material" ON "coupon" USING btree ("shop_id","material_id","state");--> statement-breakpoint
CREATE UNIQUE INDEX "hold_open_recipe" ON "hold" USING btree ("shop_id","recipe_id") WHERE "hold"."released_at" is null and "hold"."recipe_id" is not null;--> statement-breakpoint
CREATE UNIQUE INDEX "hold_open_machine" ON "hold" USING btree ("shop_id","machine_id") WHERE "hold"."released_at" is null and "hold"."machine_id" is not null;--> statement-breakpoint
CREATE UNIQUE INDEX "invitation_open_unique" ON "invitation" USING btree ("shop_id",lower("email")) WHERE "invitation"."state" = 'open';--> statement-breakpoint
CREATE INDEX "invitation_token" ON "invitation" USING btree ("token_hash");--> statement-breakpoint
CREATE INDEX "ledger_event_subject" ON "ledger_event" USING btree ("shop_id","subject_type","subject_id");--> statement-breakpoint
CREATE INDEX "material_family" ON "material" USING btree ("shop_id","family");--> statement-breakpoint
CREATE UNIQUE INDEX "measurement_superseded_once" ON "measurement" USING btree ("shop_id","supersedes_id");--> statement-breakpoint
CREATE INDEX "measurement_cell" ON "measurement" USING btree ("shop_id","cell_id");--> statement-breakpoint
CREATE INDEX "member_person" ON "member" USING btree ("person_id");--> statement-breakpoint
CREATE UNIQUE INDEX "person_email_unique" ON "person" USING btree (lower("email"));--> statement-breakpoint
CREATE UNIQUE INDEX "photo_bytes_unique" ON "photo" USING btree ("shop_id","coupon_id","received_sha256");--> statement-breakpoint
CREATE INDEX "photo_coupon" ON "photo" USING btree ("shop_id","coupon_id");--> statement-breakpoint
CREATE INDEX "power_calibration_machine" ON "power_calibration" USING btree ("shop_id","machine_id","measured_on");--> statement-breakpoint
CREATE INDEX "recipe_keys" ON "recipe" USING btree ("shop_id","material_id","finish_id","effect_id","machine_id","lens_id");--> statement-breakpoint
CREATE INDEX "recipe_recent" ON "recipe" USING btree ("shop_id","created_at");--> statement-breakpoint
CREATE INDEX "refresh_token_session" ON "refresh_token" USING btree ("session_id");--> statement-breakpoint
CREATE UNIQUE INDEX "revision_one_approved" ON "revision" USING btree ("shop_id","recipe_id") WHERE "revision"."state" = 'approved';--> statement-breakpoint
CREATE UNIQUE INDEX "revision_one_scheduled" ON "revision" USING btree ("shop_id","recipe_id") WHERE "revision"."state" = 'scheduled';--> statement-breakpoint
CREATE INDEX "revision_state_recent" ON "revision" USING btree ("shop_id","state","submitted_at");--> statement-breakpoint
CREATE INDEX "revision_evidence_cell" ON "revision_evidence" USING btree ("shop_id","cell_id");--> statement-breakpoint
CREATE INDEX "run_recent" ON "run" USING btree ("shop_id","started_at");--> statement-breakpoint
CREATE INDEX "run_revision" ON "run" USING btree ("shop_id","revision_id");--> statement-breakpoint
CREATE INDEX "run_job" ON "run" USING btree ("shop_id","job_reference");--> statement-breakpoint
CREATE INDEX "session_person" ON "session" USING btree ("person_id");--> statement-breakpoint
CREATE INDEX "sign_off_revision" ON "sign_off" USING btree ("shop_id","revision_id","signed_at");--> statement-breakpoint
CREATE POLICY "caution_shop" ON "caution" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "cell_shop" ON "cell" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "cell_rating_shop" ON "cell_rating" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "code_counter_shop" ON "code_counter" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "coupon_shop" ON "coupon" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "coupon_correction_shop" ON "coupon_correction" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "deviation_shop" ON "deviation" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "effect_shop" ON "effect" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "finish_shop" ON "finish" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "hold_shop" ON "hold" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "idempotency_key_shop" ON "idempotency_key" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "invitation_shop" ON "invitation" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "ledger_event_shop" ON "ledger_event" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "ledger_head_shop" ON "ledger_head" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "lens_shop" ON "lens" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "machine_shop" ON "machine" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "machine_lens_shop" ON "machine_lens" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "machine_profile_shop" ON "machine_profile" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "material_shop" ON "material" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "material_group_shop" ON "material_group" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "material_group_material_shop" ON "material_group_material" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "measurement_shop" ON "measurement" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "member_shop" ON "member" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "outbox_shop" ON "outbox" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "photo_shop" ON "photo" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "power_calibration_shop" ON "power_calibration" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "recipe_shop" ON "recipe" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "revision_shop" ON "revision" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "revision_evidence_shop" ON "revision_evidence" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "run_shop" ON "run" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "setting_request_shop" ON "setting_request" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "shop_shop" ON "shop" AS PERMISSIVE FOR ALL TO public USING (id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "sign_off_shop" ON "sign_off" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "test_grid_shop" ON "test_grid" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));--> statement-breakpoint
CREATE POLICY "training_record_shop" ON "training_record" AS PERMISSIVE FOR ALL TO public USING (shop_id = (select current_setting('app.shop_id')::uuid)) WITH CHECK (shop_id = (select current_setting('app.shop_id')::uuid));