CREATE TABLE `audit_change` (
	`id` integer PRIMARY KEY NOT NULL,
	`entry_id` integer NOT NULL,
	`table_name` text NOT NULL,
	`row_key` text NOT NULL,
	`operation` text NOT NULL,
	`before` text,
	`after` text
);
--> statement-breakpoint
CREATE INDEX `audit_change_entry` ON `audit_change` (`entry_id`);--> statement-breakpoint
CREATE INDEX `audit_change_row` ON `audit_change` (`table_name`,`row_key`,`id`);--> statement-breakpoint
CREATE TABLE `audit_entry` (
	`id` integer PRIMARY KEY NOT NULL,
	`at` integer NOT NULL,
	`verb` text NOT NULL,
	`version` integer NOT NULL,
	`actor_kind` text NOT NULL,
	`actor_id` integer,
	`roles` text NOT NULL,
	`subject_type` text,
	`subject_id` text,
	`reason` text,
	`payload` text NOT NULL,
	`request_id` text,
	`change_count` integer NOT NULL,
	`prev_hash` text NOT NULL,
	`hash` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `audit_entry_at` ON `audit_entry` (`at`);--> statement-breakpoint
CREATE INDEX `audit_entry_actor` ON `audit_entry` (`actor_id`,`id`);--> statement-breakpoint
CREATE INDEX `audit_entry_verb` ON `audit_entry` (`verb`,`id`);--> statement-breakpoint
CREATE INDEX `audit_entry_subject` ON `audit_entry` (`subject_type`,`subject_id`,`id`);--> statement-breakpoint
CREATE TABLE `audit_idempotency` (
	`key` text PRIMARY KEY NOT NULL,
	`actor_id` integer,
	`command` text NOT NULL,
	`input_hash` text NOT NULL,
	`answer` text NOT NULL,
	`entry_id` integer NOT NULL,
	`at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `audit_job` (
	`id` integer PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`input` text NOT NULL,
	`cause_entry_id` integer,
	`created_at` integer NOT NULL,
	`run_at` integer NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`done_at` integer,
	`failed_at` integer,
	`error` text
);
--> statement-breakpoint
CREATE INDEX `audit_job_due` ON `audit_job` (`run_at`) WHERE "audit_job"."done_at" is null and "audit_job"."failed_at" is null;--> statement-breakpoint
CREATE UNIQUE INDEX `audit_job_id_kind` ON `audit_job` (`id`,`kind`);--> statement-breakpoint
CREATE TABLE `identity_area_binding` (
	`id` integer PRIMARY KEY NOT NULL,
	`person_id` integer NOT NULL,
	`area_id` integer NOT NULL,
	`bound_at` integer NOT NULL,
	`ended_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `identity_area_binding_open` ON `identity_area_binding` (`person_id`,`area_id`) WHERE "identity_area_binding"."ended_at" is null;--> statement-breakpoint
CREATE TABLE `identity_credential` (
	`person_id` integer PRIMARY KEY NOT NULL,
	`password_hash` text NOT NULL,
	`changed_at` integer NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `identity_deputy` (
	`id` integer PRIMARY KEY NOT NULL,
	`person_id` integer NOT NULL,
	`deputy_id` integer NOT NULL,
	`role` text NOT NULL,
	`from_on` text NOT NULL,
	`to_on` text NOT NULL,
	`named_by` integer NOT NULL,
	`ended_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`deputy_id`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`named_by`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `identity_deputy_deputy` ON `identity_deputy` (`deputy_id`);--> statement-breakpoint
CREATE TABLE `identity_one_time_link` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`person_id` integer NOT NULL,
	`purpose` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`used_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `identity_person` (
	`id` integer PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`state` text NOT NULL,
	`created_at` integer NOT NULL,
	`suspended_reason` text,
	`preferred_units` text DEFAULT '{}' NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `identity_person_email` ON `identity_person` (lower("email"));--> statement-breakpoint
CREATE TABLE `identity_role_grant` (
	`id` integer PRIMARY KEY NOT NULL,
	`person_id` integer NOT NULL,
	`role` text NOT NULL,
	`state` text NOT NULL,
	`granted_by` integer,
	`granted_at` integer NOT NULL,
	`decided_by` integer,
	`decided_at` integer,
	`ended_by` integer,
	`ended_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`granted_by`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`decided_by`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`ended_by`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `identity_role_grant_open` ON `identity_role_grant` (`person_id`,`role`) WHERE "identity_role_grant"."state" in ('waiting', 'active');--> statement-breakpoint
CREATE TABLE `identity_session` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` integer NOT NULL,
	`started_at` integer NOT NULL,
	`seen_at` integer NOT NULL,
	`ended_at` integer,
	`address` text,
	FOREIGN KEY (`person_id`) REFERENCES `identity_person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `identity_session_person` ON `identity_session` (`person_id`);--> statement-breakpoint
CREATE TABLE `identity_throttle` (
	`key` text PRIMARY KEY NOT NULL,
	`window_started_at` integer NOT NULL,
	`failures` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `notifications_mail` (
	`id` integer PRIMARY KEY NOT NULL,
	`to_address` text NOT NULL,
	`subject` text NOT NULL,
	`body` text NOT NULL,
	`kind` text NOT NULL,
	`state` text NOT NULL,
	`cause_entry_id` integer NOT NULL,
	`queued_at` integer NOT NULL,
	`sent_at` integer,
	`attempts` integer DEFAULT 0 NOT NULL,
	`error` text,
	`file_name` text
);
--> statement-breakpoint
CREATE INDEX `notifications_mail_queued` ON `notifications_mail` (`queued_at`);--> statement-breakpoint
CREATE TABLE `signoff_signature` (
	`id` integer PRIMARY KEY NOT NULL,
	`person_id` integer NOT NULL,
	`printed_name` text NOT NULL,
	`roles` text NOT NULL,
	`meaning` text NOT NULL,
	`comment` text,
	`signed_at` integer NOT NULL,
	`subject_type` text NOT NULL,
	`subject_id` text NOT NULL,
	`content_hash` text NOT NULL,
	`entry_id` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `signoff_signature_subject` ON `signoff_signature` (`subject_type`,`subject_id`);--> statement-breakpoint
CREATE TABLE `systems_area` (
	`id` integer PRIMARY KEY NOT NULL,
	`site_id` integer NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`biosecurity_level` integer NOT NULL,
	`walking_order` integer NOT NULL,
	FOREIGN KEY (`site_id`) REFERENCES `systems_site`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `systems_area_code` ON `systems_area` (lower("code"));--> statement-breakpoint
CREATE TABLE `systems_equipment` (
	`id` integer PRIMARY KEY NOT NULL,
	`system_id` integer NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`kind` text NOT NULL,
	`state` text NOT NULL,
	`notes` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`system_id`) REFERENCES `systems_system`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `systems_equipment_code` ON `systems_equipment` (`system_id`,lower("code"));--> statement-breakpoint
CREATE TABLE `systems_join` (
	`id` integer PRIMARY KEY NOT NULL,
	`one_system_id` integer NOT NULL,
	`other_system_id` integer NOT NULL,
	`joined_by` integer,
	`joined_at` integer NOT NULL,
	`ended_by` integer,
	`ended_at` integer,
	FOREIGN KEY (`one_system_id`) REFERENCES `systems_system`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`other_system_id`) REFERENCES `systems_system`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `systems_join_open` ON `systems_join` (`one_system_id`,`other_system_id`) WHERE "systems_join"."ended_at" is null;--> statement-breakpoint
CREATE TABLE `systems_operating_level` (
	`id` integer PRIMARY KEY NOT NULL,
	`system_id` integer NOT NULL,
	`level_offset_m` real NOT NULL,
	`level_offset_uncertainty_m` real NOT NULL,
	`is_drained` integer NOT NULL,
	`reason` text NOT NULL,
	`set_by` integer,
	`set_at` integer NOT NULL,
	FOREIGN KEY (`system_id`) REFERENCES `systems_system`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `systems_operating_level_latest` ON `systems_operating_level` (`system_id`,`id`);--> statement-breakpoint
CREATE TABLE `systems_point` (
	`id` integer PRIMARY KEY NOT NULL,
	`system_id` integer NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`kind` text NOT NULL,
	`is_default` integer NOT NULL,
	`is_in_use` integer DEFAULT true NOT NULL,
	FOREIGN KEY (`system_id`) REFERENCES `systems_system`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `systems_point_code` ON `systems_point` (`system_id`,lower("code"));--> statement-breakpoint
CREATE UNIQUE INDEX `systems_point_default` ON `systems_point` (`system_id`) WHERE "systems_point"."is_default" = 1;--> statement-breakpoint
CREATE TABLE `systems_site` (
	`id` integer PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `systems_site_code` ON `systems_site` (lower("code"));--> statement-breakpoint
CREATE TABLE `systems_system` (
	`id` integer PRIMARY KEY NOT NULL,
	`area_id` integer NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`kind` text NOT NULL,
	`water_type` text NOT NULL,
	`state` text NOT NULL,
	`walking_order` integer NOT NULL,
	`notes` text DEFAULT '' NOT NULL,
	`created_at` integer NOT NULL,
	`retired_at` integer,
	`retired_reason` text,
	FOREIGN KEY (`area_id`) REFERENCES `systems_area`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `systems_system_code` ON `systems_system` (lower("code"));--> statement-breakpoint
CREATE INDEX `systems_system_area` ON `systems_system` (`area_id`);--> statement-breakpoint
CREATE TABLE `systems_volume_determination` (
	`id` integer PRIMARY KEY NOT NULL,
	`system_id` integer NOT NULL,
	`method` text NOT NULL,
	`volume_l` real NOT NULL,
	`standard_uncertainty_l` real NOT NULL,
	`surface_area_m2` real,
	`surface_area_uncertainty_m2` real,
	`correlation` real DEFAULT 0 NOT NULL,
	`components` text,
	`note` text NOT NULL,
	`status` text NOT NULL,
	`proposed_by` integer NOT NULL,
	`proposed_at` integer NOT NULL,
	`effective_from_at` integer NOT NULL,
	`decided_by` integer,
	`decided_at` integer,
	`decision_reason` text,
	FOREIGN KEY (`system_id`) REFERENCES `systems_system`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `systems_volume_of_record` ON `systems_volume_determination` (`system_id`,`status`,`effective_from_at`);--> statement-breakpoint
CREATE INDEX `systems_volume_waiting` ON `systems_volume_determination` (`status`);