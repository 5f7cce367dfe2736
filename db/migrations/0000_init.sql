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
CREATE INDEX `audit_entry_actor` ON `audit_entry` (`actor_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_entry_verb` ON `audit_entry` (`verb`,`at`);--> statement-breakpoint
CREATE INDEX `audit_entry_actor_verb` ON `audit_entry` (`actor_id`,`verb`,`at`);--> statement-breakpoint
CREATE INDEX `audit_entry_subject` ON `audit_entry` (`subject_type`,`subject_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_entry_subject_type` ON `audit_entry` (`subject_type`,`at`);--> statement-breakpoint
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
CREATE TABLE `audit_verification` (
	`id` integer PRIMARY KEY NOT NULL,
	`asked_by` integer,
	`asked_at` integer NOT NULL,
	`finished_at` integer,
	`entries` integer,
	`head_entry_id` integer,
	`head_hash` text,
	`finding_count` integer,
	`findings` text DEFAULT '[]' NOT NULL,
	`trouble` text
);
--> statement-breakpoint
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
CREATE TABLE `imports_file` (
	`id` integer PRIMARY KEY NOT NULL,
	`sha256` text NOT NULL,
	`original_name` text NOT NULL,
	`bytes` integer NOT NULL,
	`kind` text NOT NULL,
	`stored_path` text NOT NULL,
	`uploaded_by` integer NOT NULL,
	`uploaded_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `imports_file_sha256` ON `imports_file` (`sha256`);--> statement-breakpoint
CREATE TABLE `imports_progress` (
	`import_id` integer PRIMARY KEY NOT NULL,
	`check_run` integer NOT NULL,
	`last_line` integer NOT NULL,
	`share` real NOT NULL,
	`rows_read` integer NOT NULL,
	`accepted` integer NOT NULL,
	`duplicate` integer NOT NULL,
	`refused` integer NOT NULL,
	`status_counts` text NOT NULL,
	`committed_id` integer NOT NULL,
	`committed` integer NOT NULL,
	`updated_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `imports_import` (
	`id` integer PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`file_id` integer NOT NULL,
	`file_name` text NOT NULL,
	`state` text NOT NULL,
	`form` text NOT NULL,
	`header` text NOT NULL,
	`survey` text,
	`answers` text NOT NULL,
	`defaults` text NOT NULL,
	`sheet` text,
	`check_run` integer DEFAULT 0 NOT NULL,
	`accepted_count` integer,
	`duplicate_count` integer,
	`refused_count` integer,
	`status_counts` text,
	`delivery_id` integer,
	`problem` text,
	`uploaded_by` integer NOT NULL,
	`uploaded_at` integer NOT NULL,
	`checked_at` integer,
	`committed_by` integer,
	`commit_started_at` integer,
	`committed_at` integer,
	`withdrawn_by` integer,
	`withdrawn_at` integer,
	`withdrawn_reason` text,
	FOREIGN KEY (`file_id`) REFERENCES `imports_file`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `imports_import_code` ON `imports_import` (`code`);--> statement-breakpoint
CREATE INDEX `imports_import_file` ON `imports_import` (`file_id`);--> statement-breakpoint
CREATE INDEX `imports_import_state` ON `imports_import` (`state`);--> statement-breakpoint
CREATE TABLE `imports_staged_row` (
	`id` integer PRIMARY KEY NOT NULL,
	`import_id` integer NOT NULL,
	`line` integer NOT NULL,
	`column_index` integer NOT NULL,
	`outcome` text NOT NULL,
	`candidate` text NOT NULL,
	`problems` text NOT NULL,
	`reading_uuid` text,
	`point_id` integer,
	`parameter_id` integer,
	`taken_at` integer,
	`value` real,
	`qualifier` text,
	`answer` text,
	`identity` text,
	`expected_status` text,
	`expected_sentence` text
);
--> statement-breakpoint
CREATE UNIQUE INDEX `imports_staged_row_place` ON `imports_staged_row` (`import_id`,`line`,`column_index`);--> statement-breakpoint
CREATE INDEX `imports_staged_row_outcome` ON `imports_staged_row` (`import_id`,`outcome`,`id`);--> statement-breakpoint
CREATE INDEX `imports_staged_row_identity` ON `imports_staged_row` (`import_id`,`identity`);--> statement-breakpoint
CREATE INDEX `imports_staged_row_series` ON `imports_staged_row` (`import_id`,`point_id`,`parameter_id`,`taken_at`);--> statement-breakpoint
CREATE TABLE `measurements_delivery` (
	`id` integer PRIMARY KEY NOT NULL,
	`source` text NOT NULL,
	`source_ref` text NOT NULL,
	`opened_at` integer NOT NULL,
	`published_at` integer,
	`withdrawn_at` integer,
	`withdrawn_by` integer,
	`withdrawn_reason` text
);
--> statement-breakpoint
CREATE TABLE `measurements_explanation` (
	`id` integer PRIMARY KEY NOT NULL,
	`reading_id` integer NOT NULL,
	`text` text NOT NULL,
	`explained_by` integer NOT NULL,
	`explained_at` integer NOT NULL,
	FOREIGN KEY (`reading_id`) REFERENCES `measurements_reading`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `measurements_explanation_reading` ON `measurements_explanation` (`reading_id`);--> statement-breakpoint
CREATE TABLE `measurements_judgement` (
	`id` integer PRIMARY KEY NOT NULL,
	`reading_id` integer NOT NULL,
	`status` text NOT NULL,
	`side` text,
	`sentence` text NOT NULL,
	`reasons` text NOT NULL,
	`limit_version_id` integer,
	`rule_version` integer NOT NULL,
	`cause` text NOT NULL,
	`judged_at` integer NOT NULL,
	FOREIGN KEY (`reading_id`) REFERENCES `measurements_reading`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `measurements_judgement_latest` ON `measurements_judgement` (`reading_id`,`id`);--> statement-breakpoint
CREATE TABLE `measurements_limit_template` (
	`id` integer PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`rows` text NOT NULL,
	`changed_by` integer NOT NULL,
	`changed_at` integer NOT NULL,
	`retired_at` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `measurements_limit_template_name` ON `measurements_limit_template` (lower("name"));--> statement-breakpoint
CREATE TABLE `measurements_limit_version` (
	`id` integer PRIMARY KEY NOT NULL,
	`workbook_id` integer NOT NULL,
	`point_id` integer NOT NULL,
	`parameter_id` integer NOT NULL,
	`version` integer NOT NULL,
	`state` text NOT NULL,
	`effective_from_at` integer NOT NULL,
	`effective_to_at` integer,
	`shape` text NOT NULL,
	`suspended_reason` text,
	FOREIGN KEY (`workbook_id`) REFERENCES `measurements_limit_workbook`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `measurements_limit_version_number` ON `measurements_limit_version` (`point_id`,`parameter_id`,`version`);--> statement-breakpoint
CREATE INDEX `measurements_limit_version_workbook` ON `measurements_limit_version` (`workbook_id`);--> statement-breakpoint
CREATE TABLE `measurements_limit_workbook` (
	`id` integer PRIMARY KEY NOT NULL,
	`title` text NOT NULL,
	`reason` text NOT NULL,
	`state` text NOT NULL,
	`proposed_by` integer NOT NULL,
	`proposed_at` integer NOT NULL,
	`decided_by` integer,
	`decided_at` integer,
	`decision_comment` text
);
--> statement-breakpoint
CREATE TABLE `measurements_reading` (
	`id` integer PRIMARY KEY NOT NULL,
	`uuid` text NOT NULL,
	`point_id` integer NOT NULL,
	`parameter_id` integer NOT NULL,
	`typed_text` text NOT NULL,
	`typed_unit` text,
	`value` real,
	`qualifier` text NOT NULL,
	`answer` text,
	`taken_at` integer NOT NULL,
	`entered_at` integer NOT NULL,
	`taken_by` integer NOT NULL,
	`entered_by` integer NOT NULL,
	`method_id` integer,
	`instrument_id` integer,
	`source` text NOT NULL,
	`source_ref` text,
	`delivery_id` integer,
	`note` text,
	`supersedes_id` integer,
	`correction_reason` text,
	`confirmed_by` integer,
	`confirmed_at` integer,
	`voided_by` integer,
	`voided_at` integer,
	`void_reason` text,
	FOREIGN KEY (`delivery_id`) REFERENCES `measurements_delivery`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`supersedes_id`) REFERENCES `measurements_reading`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `measurements_reading_uuid` ON `measurements_reading` (`uuid`);--> statement-breakpoint
CREATE UNIQUE INDEX `measurements_reading_supersedes` ON `measurements_reading` (`supersedes_id`);--> statement-breakpoint
CREATE INDEX `measurements_reading_series` ON `measurements_reading` (`point_id`,`parameter_id`,`taken_at`);--> statement-breakpoint
CREATE INDEX `measurements_reading_taken` ON `measurements_reading` (`taken_at`);--> statement-breakpoint
CREATE INDEX `measurements_reading_delivery` ON `measurements_reading` (`delivery_id`,`point_id`,`parameter_id`,`taken_at`);--> statement-breakpoint
CREATE TABLE `measurements_watch_item` (
	`id` integer PRIMARY KEY NOT NULL,
	`point_id` integer NOT NULL,
	`parameter_id` integer NOT NULL,
	`position` integer NOT NULL,
	`every_days` integer,
	`unit` text,
	`method_id` integer,
	`instrument_id` integer,
	`since` integer NOT NULL,
	`ended_at` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `measurements_watch_item_open` ON `measurements_watch_item` (`point_id`,`parameter_id`) WHERE "measurements_watch_item"."ended_at" is null;--> statement-breakpoint
CREATE TABLE `methods_instrument` (
	`id` integer PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`serial` text NOT NULL,
	`principle` text NOT NULL,
	`scale` text,
	`state` text NOT NULL,
	`check_every_days` integer,
	`retired_reason` text
);
--> statement-breakpoint
CREATE UNIQUE INDEX `methods_instrument_code` ON `methods_instrument` (lower("code"));--> statement-breakpoint
CREATE TABLE `methods_instrument_check` (
	`id` integer PRIMARY KEY NOT NULL,
	`instrument_id` integer NOT NULL,
	`parameter_id` integer,
	`checked_at` integer NOT NULL,
	`checked_by` integer NOT NULL,
	`standard` text NOT NULL,
	`standard_value` real,
	`as_found` real,
	`as_left` real,
	`unit` text,
	`verdict` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`due_on` text,
	FOREIGN KEY (`instrument_id`) REFERENCES `methods_instrument`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`parameter_id`) REFERENCES `methods_parameter`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `methods_instrument_check_latest` ON `methods_instrument_check` (`instrument_id`,`checked_at`);--> statement-breakpoint
CREATE TABLE `methods_method` (
	`id` integer PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`parameter_id` integer NOT NULL,
	`principle` text NOT NULL,
	`retired_at` integer,
	FOREIGN KEY (`parameter_id`) REFERENCES `methods_parameter`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `methods_method_code` ON `methods_method` (lower("code"));--> statement-breakpoint
CREATE TABLE `methods_parameter` (
	`id` integer PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`kind` text NOT NULL,
	`unit` text,
	`accepted_units` text NOT NULL,
	`decimals` integer NOT NULL,
	`plausible_low` real,
	`plausible_high` real,
	`choices` text NOT NULL,
	`parameter_group` text NOT NULL,
	`may_be_negative` integer NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`retired_at` integer,
	`retired_reason` text
);
--> statement-breakpoint
CREATE UNIQUE INDEX `methods_parameter_code` ON `methods_parameter` (lower("code"));--> statement-breakpoint
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
CREATE TABLE `quality_incident` (
	`id` integer PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`system_id` integer NOT NULL,
	`point_id` integer,
	`parameter_id` integer,
	`title` text NOT NULL,
	`state` text NOT NULL,
	`owner_id` integer NOT NULL,
	`began_at` integer NOT NULL,
	`opened_at` integer NOT NULL,
	`opened_by` integer NOT NULL,
	`recheck_due_at` integer,
	`recheck_reading_id` integer,
	`closed_at` integer,
	`closed_by` integer,
	`closure_text` text,
	`still_off_reason` text
);
--> statement-breakpoint
CREATE UNIQUE INDEX `quality_incident_code` ON `quality_incident` (`code`);--> statement-breakpoint
CREATE UNIQUE INDEX `quality_incident_one_open` ON `quality_incident` (`point_id`,`parameter_id`) WHERE "quality_incident"."state" <> 'closed' and "quality_incident"."point_id" is not null;--> statement-breakpoint
CREATE INDEX `quality_incident_state` ON `quality_incident` (`state`,`recheck_due_at`);--> statement-breakpoint
CREATE INDEX `quality_incident_system` ON `quality_incident` (`system_id`);--> statement-breakpoint
CREATE TABLE `quality_incident_note` (
	`id` integer PRIMARY KEY NOT NULL,
	`incident_id` integer NOT NULL,
	`text` text NOT NULL,
	`noted_by` integer NOT NULL,
	`noted_at` integer NOT NULL,
	FOREIGN KEY (`incident_id`) REFERENCES `quality_incident`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `quality_incident_note_incident` ON `quality_incident_note` (`incident_id`);--> statement-breakpoint
CREATE TABLE `quality_incident_reading` (
	`id` integer PRIMARY KEY NOT NULL,
	`incident_id` integer NOT NULL,
	`reading_id` integer NOT NULL,
	`joined_by` integer NOT NULL,
	`joined_at` integer NOT NULL,
	FOREIGN KEY (`incident_id`) REFERENCES `quality_incident`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `quality_incident_reading_once` ON `quality_incident_reading` (`reading_id`);--> statement-breakpoint
CREATE INDEX `quality_incident_reading_incident` ON `quality_incident_reading` (`incident_id`);--> statement-breakpoint
CREATE TABLE `rounds_day_review` (
	`id` integer PRIMARY KEY NOT NULL,
	`area_id` integer NOT NULL,
	`on_day` text NOT NULL,
	`outcome` text NOT NULL,
	`comment` text,
	`content_hash` text NOT NULL,
	`signature_id` integer NOT NULL,
	`reviewed_by` integer NOT NULL,
	`reviewed_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `rounds_day_review_sheet` ON `rounds_day_review` (`area_id`,`on_day`,`id`);--> statement-breakpoint
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
CREATE INDEX `systems_volume_waiting` ON `systems_volume_determination` (`status`);--> statement-breakpoint
CREATE VIEW `measurements_reading_in_force` AS 
  select r.id, r.uuid, r.point_id, r.parameter_id, r.typed_text, r.typed_unit, r.value, r.qualifier, r.answer,
    r.taken_at, r.entered_at, r.taken_by, r.entered_by, r.method_id, r.instrument_id, r.source, r.source_ref,
    r.delivery_id, r.note, r.supersedes_id, r.correction_reason, r.confirmed_by, r.confirmed_at,
    j.id as judgement_id, coalesce(j.status, 'none') as status, j.side, coalesce(j.sentence, '') as sentence,
    j.limit_version_id
  from measurements_reading r
  left join measurements_judgement j
    on j.id = (select max(newest.id) from measurements_judgement newest where newest.reading_id = r.id)
  left join measurements_delivery d on d.id = r.delivery_id
  where r.voided_at is null
    and (r.delivery_id is null or (d.published_at is not null and d.withdrawn_at is null))
    and not exists (select 1 from measurements_reading later where later.supersedes_id = r.id);--> statement-breakpoint
CREATE VIEW `methods_parameter_directory` AS 
  select p.id as parameter_id, p.code as parameter_code, p.name as parameter_name, p.unit as parameter_unit,
    p.decimals as parameter_decimals
  from methods_parameter p;--> statement-breakpoint
CREATE VIEW `systems_point_directory` AS 
  select p.id as point_id, p.code as point_code, p.name as point_name, p.is_default as is_default_point,
    p.is_in_use as is_point_in_use, s.id as system_id, s.code as system_code, s.name as system_name,
    s.state as system_state, s.walking_order as system_order, a.id as area_id, a.code as area_code,
    a.name as area_name, a.walking_order as area_order
  from systems_point p join systems_system s on s.id = p.system_id join systems_area a on a.id = s.area_id;