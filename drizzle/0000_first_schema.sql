CREATE TABLE `organisations` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(20) NOT NULL,
	`name` varchar(200) NOT NULL,
	`address_line` varchar(300),
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `organisations_id` PRIMARY KEY(`id`),
	CONSTRAINT `organisations_name_unique` UNIQUE(`name`)
);
--> statement-breakpoint
CREATE TABLE `people` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(200) NOT NULL,
	`role` varchar(20) NOT NULL,
	`is_active` boolean NOT NULL DEFAULT true,
	`password_hash` varchar(255),
	`sign_in_epoch` int NOT NULL DEFAULT 1,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `people_id` PRIMARY KEY(`id`),
	CONSTRAINT `people_email_unique` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `person_tokens` (
	`digest` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`person_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(20) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`used_at` datetime(3),
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `person_tokens_digest` PRIMARY KEY(`digest`)
);
--> statement-breakpoint
CREATE TABLE `sign_ins` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`person_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`epoch` int NOT NULL,
	`started_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`last_used_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`ended_at` datetime(3),
	`failed_confirmations` int NOT NULL DEFAULT 0,
	CONSTRAINT `sign_ins_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `throttles` (
	`key` varchar(80) character set ascii collate ascii_bin NOT NULL,
	`window_started_at` datetime(3) NOT NULL,
	`tries` int NOT NULL,
	CONSTRAINT `throttles_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `case_holds` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(20) NOT NULL,
	`reason` text NOT NULL,
	`set_by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`set_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`cleared_by_id` varchar(40) character set ascii collate ascii_bin,
	`cleared_at` datetime(3),
	`clear_reason` text,
	CONSTRAINT `case_holds_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `case_moves` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`from_state` varchar(20),
	`to_state` varchar(20) NOT NULL,
	`reason` text,
	`by_id` varchar(40) character set ascii collate ascii_bin,
	`at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `case_moves_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `case_numbers` (
	`year` int NOT NULL,
	`last` int NOT NULL,
	CONSTRAINT `case_numbers_year` PRIMARY KEY(`year`)
);
--> statement-breakpoint
CREATE TABLE `case_questions` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`question` text NOT NULL,
	`asked_by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`asked_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`answer` text,
	`answered_by_id` varchar(40) character set ascii collate ascii_bin,
	`answered_at` datetime(3),
	CONSTRAINT `case_questions_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `case_technicians` (
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`person_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `case_technicians_case_id_person_id_pk` PRIMARY KEY(`case_id`,`person_id`)
);
--> statement-breakpoint
CREATE TABLE `cases` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`number` varchar(20) character set ascii collate ascii_bin,
	`organisation_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`requester_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`state` varchar(20) NOT NULL DEFAULT 'draft',
	`stage` int NOT NULL DEFAULT 0,
	`title` varchar(200) NOT NULL DEFAULT '',
	`part_name` varchar(200) NOT NULL DEFAULT '',
	`drawing_number` varchar(100) NOT NULL DEFAULT '',
	`serial_number` varchar(100) NOT NULL DEFAULT '',
	`heat_number` varchar(100) NOT NULL DEFAULT '',
	`material` varchar(100) NOT NULL DEFAULT '',
	`priority` varchar(4),
	`investigator_id` varchar(40) character set ascii collate ascii_bin,
	`lead_id` varchar(40) character set ascii collate ascii_bin,
	`second_reader_id` varchar(40) character set ascii collate ascii_bin,
	`due_on` date,
	`due_key` int GENERATED ALWAYS AS ((case when stage between 1 and 5 then 0 when stage = 6 then 2 else 3 end) * 1000000 + coalesce(to_days(due_on), 999999)) STORED,
	`impartiality_statement` text,
	`end_reason` text,
	`is_on_hold` boolean NOT NULL DEFAULT false,
	`is_restricted` boolean NOT NULL DEFAULT false,
	`item_count` int NOT NULL DEFAULT 0,
	`open_gate_count` int NOT NULL DEFAULT 8,
	`revision` int NOT NULL DEFAULT 1,
	`submitted_at` datetime(3),
	`accepted_at` datetime(3),
	`signed_at` datetime(3),
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`changed_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `cases_id` PRIMARY KEY(`id`),
	CONSTRAINT `cases_number_unique` UNIQUE(`number`)
);
--> statement-breakpoint
CREATE TABLE `field_returns` (
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`answers` json NOT NULL,
	`revision` int NOT NULL DEFAULT 1,
	`saved_by_id` varchar(40) character set ascii collate ascii_bin,
	`saved_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `field_returns_case_id` PRIMARY KEY(`case_id`)
);
--> statement-breakpoint
CREATE TABLE `saved_views` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`person_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(60) NOT NULL,
	`query` varchar(2000) NOT NULL,
	`position` int NOT NULL DEFAULT 0,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `saved_views_id` PRIMARY KEY(`id`),
	CONSTRAINT `saved_views_by_person_name` UNIQUE(`person_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `settings` (
	`name` varchar(80) character set ascii collate ascii_bin NOT NULL,
	`value` json NOT NULL,
	`changed_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `settings_name` PRIMARY KEY(`name`)
);
--> statement-breakpoint
CREATE TABLE `label_counters` (
	`scope_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`prefix` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`last` int NOT NULL,
	CONSTRAINT `label_counters_scope_id_prefix_pk` PRIMARY KEY(`scope_id`,`prefix`)
);
--> statement-breakpoint
CREATE TABLE `record_edges` (
	`version_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`input_version_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `record_edges_version_id_input_version_id_pk` PRIMARY KEY(`version_id`,`input_version_id`)
);
--> statement-breakpoint
CREATE TABLE `record_versions` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`record_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`content` json NOT NULL,
	`quotes` json NOT NULL,
	`headline_value` double,
	`headline_unit` varchar(20),
	`headline_uncertainty` double,
	`method` varchar(120),
	`method_version` varchar(60),
	`reason` text,
	`made_by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`sha256` varchar(64) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `record_versions_id` PRIMARY KEY(`id`),
	CONSTRAINT `record_versions_by_record_number` UNIQUE(`record_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `records` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(30) NOT NULL,
	`scope_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`label` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`state` varchar(10) NOT NULL DEFAULT 'recorded',
	`void_reason` text,
	`latest_version` int NOT NULL DEFAULT 0,
	`made_by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `records_id` PRIMARY KEY(`id`),
	CONSTRAINT `records_by_scope_label` UNIQUE(`scope_id`,`label`)
);
--> statement-breakpoint
CREATE TABLE `custody_entries` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`item_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`act` varchar(20) NOT NULL,
	`at` datetime(3) NOT NULL,
	`from_place` varchar(200) NOT NULL,
	`to_place` varchar(200) NOT NULL,
	`holder_id` varchar(40) character set ascii collate ascii_bin,
	`reason` text NOT NULL,
	`condition_note` text,
	`seal_broken` varchar(60),
	`seal_fitted` varchar(60),
	`due_back_at` datetime(3),
	`corrects_id` varchar(40) character set ascii collate ascii_bin,
	`image_ids` json,
	`by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`sha256` varchar(64) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `custody_entries_id` PRIMARY KEY(`id`),
	CONSTRAINT `custody_by_item_position` UNIQUE(`item_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `items` (
	`record_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(20) NOT NULL,
	`parent_id` varchar(40) character set ascii collate ascii_bin,
	CONSTRAINT `items_record_id` PRIMARY KEY(`record_id`)
);
--> statement-breakpoint
CREATE TABLE `request_files` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`object_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`caption` varchar(300) NOT NULL DEFAULT '',
	`is_withdrawn` boolean NOT NULL DEFAULT false,
	`by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `request_files_id` PRIMARY KEY(`id`),
	CONSTRAINT `request_files_by_case_object` UNIQUE(`case_id`,`object_id`)
);
--> statement-breakpoint
CREATE TABLE `stored_objects` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin,
	`key` varchar(255) character set ascii collate ascii_bin NOT NULL,
	`file_name` varchar(255) NOT NULL,
	`media_type` varchar(100) NOT NULL,
	`size_bytes` bigint NOT NULL,
	`sha256` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`made_by_id` varchar(40) character set ascii collate ascii_bin,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `stored_objects_id` PRIMARY KEY(`id`),
	CONSTRAINT `stored_objects_key_unique` UNIQUE(`key`)
);
--> statement-breakpoint
CREATE TABLE `upload_parts` (
	`upload_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`part_number` int NOT NULL,
	`etag` varchar(100) NOT NULL,
	`size_bytes` int NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `upload_parts_upload_id_part_number_pk` PRIMARY KEY(`upload_id`,`part_number`)
);
--> statement-breakpoint
CREATE TABLE `uploads` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`purpose` varchar(20) NOT NULL,
	`state` varchar(12) NOT NULL DEFAULT 'sending',
	`file_name` varchar(255) NOT NULL,
	`claimed_media_type` varchar(100) NOT NULL,
	`size_bytes` bigint NOT NULL,
	`last_modified` bigint,
	`first_part_sha256` varchar(64) character set ascii collate ascii_bin,
	`claimed_sha256` varchar(64) character set ascii collate ascii_bin,
	`key` varchar(255) character set ascii collate ascii_bin NOT NULL,
	`s3_upload_id` varchar(400),
	`part_size_bytes` int,
	`details` json,
	`object_id` varchar(40) character set ascii collate ascii_bin,
	`image_id` varchar(40) character set ascii collate ascii_bin,
	`refusal` text,
	`by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`changed_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`finished_at` datetime(3),
	CONSTRAINT `uploads_id` PRIMARY KEY(`id`),
	CONSTRAINT `uploads_key_unique` UNIQUE(`key`)
);
--> statement-breakpoint
CREATE TABLE `calibrations` (
	`version_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`record_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`image_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`source` varchar(20) NOT NULL,
	`um_per_px` double NOT NULL,
	`relative_uncertainty` double NOT NULL,
	CONSTRAINT `calibrations_version_id` PRIMARY KEY(`version_id`)
);
--> statement-breakpoint
CREATE TABLE `images` (
	`record_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`object_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`state` varchar(10) NOT NULL DEFAULT 'checking',
	`refusal` text,
	`width_px` int,
	`height_px` int,
	`bit_depth` int,
	`channels` int,
	`file_um_per_px_x` double,
	`file_um_per_px_y` double,
	`metadata` json,
	`tile_prefix` varchar(200) character set ascii collate ascii_bin,
	`scale_factors` json,
	`is_shareable` boolean NOT NULL DEFAULT false,
	CONSTRAINT `images_record_id` PRIMARY KEY(`record_id`)
);
--> statement-breakpoint
CREATE TABLE `marks` (
	`version_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`record_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`image_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`tool` varchar(12) NOT NULL,
	`feature_code` varchar(3) character set ascii collate ascii_bin,
	`geometry` json NOT NULL,
	CONSTRAINT `marks_version_id` PRIMARY KEY(`version_id`)
);
--> statement-breakpoint
CREATE TABLE `traverse_readings` (
	`version_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`record_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`depth_mm` double NOT NULL,
	`d1_um` double,
	`d2_um` double,
	`entered_hardness` double,
	`lateral_mm` double,
	`track` int,
	`is_left_out` boolean NOT NULL DEFAULT false,
	`left_out_reason` text,
	`kept_reason` text,
	CONSTRAINT `traverse_readings_version_id_position_pk` PRIMARY KEY(`version_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `report_issues` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`case_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`state` varchar(12) NOT NULL DEFAULT 'drafting',
	`reason` text,
	`document` json NOT NULL,
	`root_cause` text,
	`revision` int NOT NULL DEFAULT 1,
	`saved_by_id` varchar(40) character set ascii collate ascii_bin,
	`saved_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`frozen` json,
	`manifest` json,
	`manifest_sha256` varchar(64) character set ascii collate ascii_bin,
	`pdf_object_id` varchar(40) character set ascii collate ascii_bin,
	`signed_by_id` varchar(40) character set ascii collate ascii_bin,
	`signed_at` datetime(3),
	`released_at` datetime(3),
	`made_by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `report_issues_id` PRIMARY KEY(`id`),
	CONSTRAINT `report_issues_by_case_number` UNIQUE(`case_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `report_revisions` (
	`issue_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`revision` int NOT NULL,
	`document` json NOT NULL,
	`saved_by_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`saved_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `report_revisions_issue_id_revision_pk` PRIMARY KEY(`issue_id`,`revision`)
);
--> statement-breakpoint
CREATE TABLE `audit_events` (
	`id` bigint AUTO_INCREMENT NOT NULL,
	`chain` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`at` datetime(3) NOT NULL,
	`actor_id` varchar(40) character set ascii collate ascii_bin,
	`actor_name` varchar(200) NOT NULL,
	`actor_role` varchar(20) NOT NULL,
	`action` varchar(60) character set ascii collate ascii_bin NOT NULL,
	`subject_kind` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`subject_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`subject_label` varchar(120) NOT NULL,
	`before` json,
	`after` json,
	`previous_sha256` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`sha256` varchar(64) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `audit_events_id` PRIMARY KEY(`id`),
	CONSTRAINT `audit_by_chain_position` UNIQUE(`chain`,`position`)
);
--> statement-breakpoint
CREATE TABLE `audit_heads` (
	`chain` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`sha256` varchar(64) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `audit_heads_chain` PRIMARY KEY(`chain`)
);
--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(40) NOT NULL,
	`state` varchar(10) NOT NULL DEFAULT 'ready',
	`payload` json NOT NULL,
	`unique_key` varchar(120) character set ascii collate ascii_bin,
	`run_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`attempts` int NOT NULL DEFAULT 0,
	`max_attempts` int NOT NULL DEFAULT 8,
	`lease_until` datetime(3),
	`worker` varchar(80) character set ascii collate ascii_bin,
	`last_error` text,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	`finished_at` datetime(3),
	CONSTRAINT `jobs_id` PRIMARY KEY(`id`),
	CONSTRAINT `jobs_unique_key_unique` UNIQUE(`unique_key`)
);
--> statement-breakpoint
ALTER TABLE `people` ADD CONSTRAINT `people_organisation_id_organisations_id_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `person_tokens` ADD CONSTRAINT `person_tokens_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sign_ins` ADD CONSTRAINT `sign_ins_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_holds` ADD CONSTRAINT `case_holds_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_holds` ADD CONSTRAINT `case_holds_set_by_id_people_id_fk` FOREIGN KEY (`set_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_holds` ADD CONSTRAINT `case_holds_cleared_by_id_people_id_fk` FOREIGN KEY (`cleared_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_moves` ADD CONSTRAINT `case_moves_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_moves` ADD CONSTRAINT `case_moves_by_id_people_id_fk` FOREIGN KEY (`by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_questions` ADD CONSTRAINT `case_questions_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_questions` ADD CONSTRAINT `case_questions_asked_by_id_people_id_fk` FOREIGN KEY (`asked_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_questions` ADD CONSTRAINT `case_questions_answered_by_id_people_id_fk` FOREIGN KEY (`answered_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_technicians` ADD CONSTRAINT `case_technicians_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `case_technicians` ADD CONSTRAINT `case_technicians_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cases` ADD CONSTRAINT `cases_organisation_id_organisations_id_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cases` ADD CONSTRAINT `cases_requester_id_people_id_fk` FOREIGN KEY (`requester_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cases` ADD CONSTRAINT `cases_investigator_id_people_id_fk` FOREIGN KEY (`investigator_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cases` ADD CONSTRAINT `cases_lead_id_people_id_fk` FOREIGN KEY (`lead_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cases` ADD CONSTRAINT `cases_second_reader_id_people_id_fk` FOREIGN KEY (`second_reader_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `field_returns` ADD CONSTRAINT `field_returns_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `field_returns` ADD CONSTRAINT `field_returns_saved_by_id_people_id_fk` FOREIGN KEY (`saved_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `saved_views` ADD CONSTRAINT `saved_views_person_id_people_id_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `record_edges` ADD CONSTRAINT `record_edges_version_id_record_versions_id_fk` FOREIGN KEY (`version_id`) REFERENCES `record_versions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `record_edges` ADD CONSTRAINT `record_edges_input_version_id_record_versions_id_fk` FOREIGN KEY (`input_version_id`) REFERENCES `record_versions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `record_versions` ADD CONSTRAINT `record_versions_record_id_records_id_fk` FOREIGN KEY (`record_id`) REFERENCES `records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `record_versions` ADD CONSTRAINT `record_versions_made_by_id_people_id_fk` FOREIGN KEY (`made_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `records` ADD CONSTRAINT `records_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `records` ADD CONSTRAINT `records_made_by_id_people_id_fk` FOREIGN KEY (`made_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `custody_entries` ADD CONSTRAINT `custody_entries_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `custody_entries` ADD CONSTRAINT `custody_entries_item_id_records_id_fk` FOREIGN KEY (`item_id`) REFERENCES `records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `custody_entries` ADD CONSTRAINT `custody_entries_holder_id_people_id_fk` FOREIGN KEY (`holder_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `custody_entries` ADD CONSTRAINT `custody_entries_by_id_people_id_fk` FOREIGN KEY (`by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_record_id_records_id_fk` FOREIGN KEY (`record_id`) REFERENCES `records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `items` ADD CONSTRAINT `items_parent_id_records_id_fk` FOREIGN KEY (`parent_id`) REFERENCES `records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `request_files` ADD CONSTRAINT `request_files_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `request_files` ADD CONSTRAINT `request_files_object_id_stored_objects_id_fk` FOREIGN KEY (`object_id`) REFERENCES `stored_objects`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `request_files` ADD CONSTRAINT `request_files_by_id_people_id_fk` FOREIGN KEY (`by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stored_objects` ADD CONSTRAINT `stored_objects_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stored_objects` ADD CONSTRAINT `stored_objects_made_by_id_people_id_fk` FOREIGN KEY (`made_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `upload_parts` ADD CONSTRAINT `upload_parts_upload_id_uploads_id_fk` FOREIGN KEY (`upload_id`) REFERENCES `uploads`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `uploads` ADD CONSTRAINT `uploads_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `uploads` ADD CONSTRAINT `uploads_object_id_stored_objects_id_fk` FOREIGN KEY (`object_id`) REFERENCES `stored_objects`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `uploads` ADD CONSTRAINT `uploads_by_id_people_id_fk` FOREIGN KEY (`by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `calibrations` ADD CONSTRAINT `calibrations_version_id_record_versions_id_fk` FOREIGN KEY (`version_id`) REFERENCES `record_versions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `calibrations` ADD CONSTRAINT `calibrations_record_id_records_id_fk` FOREIGN KEY (`record_id`) REFERENCES `records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `calibrations` ADD CONSTRAINT `calibrations_image_id_images_record_id_fk` FOREIGN KEY (`image_id`) REFERENCES `images`(`record_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `images` ADD CONSTRAINT `images_record_id_records_id_fk` FOREIGN KEY (`record_id`) REFERENCES `records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `images` ADD CONSTRAINT `images_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `images` ADD CONSTRAINT `images_object_id_stored_objects_id_fk` FOREIGN KEY (`object_id`) REFERENCES `stored_objects`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `marks` ADD CONSTRAINT `marks_version_id_record_versions_id_fk` FOREIGN KEY (`version_id`) REFERENCES `record_versions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `marks` ADD CONSTRAINT `marks_record_id_records_id_fk` FOREIGN KEY (`record_id`) REFERENCES `records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `marks` ADD CONSTRAINT `marks_image_id_images_record_id_fk` FOREIGN KEY (`image_id`) REFERENCES `images`(`record_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `traverse_readings` ADD CONSTRAINT `traverse_readings_version_id_record_versions_id_fk` FOREIGN KEY (`version_id`) REFERENCES `record_versions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `traverse_readings` ADD CONSTRAINT `traverse_readings_record_id_records_id_fk` FOREIGN KEY (`record_id`) REFERENCES `records`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_issues` ADD CONSTRAINT `report_issues_case_id_cases_id_fk` FOREIGN KEY (`case_id`) REFERENCES `cases`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_issues` ADD CONSTRAINT `report_issues_saved_by_id_people_id_fk` FOREIGN KEY (`saved_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_issues` ADD CONSTRAINT `report_issues_pdf_object_id_stored_objects_id_fk` FOREIGN KEY (`pdf_object_id`) REFERENCES `stored_objects`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_issues` ADD CONSTRAINT `report_issues_signed_by_id_people_id_fk` FOREIGN KEY (`signed_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_issues` ADD CONSTRAINT `report_issues_made_by_id_people_id_fk` FOREIGN KEY (`made_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_revisions` ADD CONSTRAINT `report_revisions_issue_id_report_issues_id_fk` FOREIGN KEY (`issue_id`) REFERENCES `report_issues`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `report_revisions` ADD CONSTRAINT `report_revisions_saved_by_id_people_id_fk` FOREIGN KEY (`saved_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `people_by_organisation` ON `people` (`organisation_id`,`role`);--> statement-breakpoint
CREATE INDEX `sign_ins_by_person` ON `sign_ins` (`person_id`);--> statement-breakpoint
CREATE INDEX `case_holds_by_case` ON `case_holds` (`case_id`,`cleared_at`);--> statement-breakpoint
CREATE INDEX `case_moves_by_case` ON `case_moves` (`case_id`,`at`);--> statement-breakpoint
CREATE INDEX `case_questions_by_case` ON `case_questions` (`case_id`,`asked_at`);--> statement-breakpoint
CREATE INDEX `case_technicians_by_person` ON `case_technicians` (`person_id`);--> statement-breakpoint
CREATE INDEX `cases_by_due` ON `cases` (`due_key`,`id`);--> statement-breakpoint
CREATE INDEX `cases_by_changed` ON `cases` (`changed_at`,`id`);--> statement-breakpoint
CREATE INDEX `cases_by_number` ON `cases` (`number`,`id`);--> statement-breakpoint
CREATE INDEX `cases_by_stage` ON `cases` (`stage`,`id`);--> statement-breakpoint
CREATE INDEX `cases_by_title` ON `cases` (`title`,`id`);--> statement-breakpoint
CREATE INDEX `cases_by_organisation_changed` ON `cases` (`organisation_id`,`changed_at`,`id`);--> statement-breakpoint
CREATE INDEX `cases_by_organisation_due` ON `cases` (`organisation_id`,`due_key`,`id`);--> statement-breakpoint
CREATE INDEX `cases_by_investigator_due` ON `cases` (`investigator_id`,`due_key`,`id`);--> statement-breakpoint
CREATE INDEX `cases_by_requester` ON `cases` (`requester_id`,`state`);--> statement-breakpoint
CREATE INDEX `cases_by_drawing` ON `cases` (`drawing_number`,`id`);--> statement-breakpoint
CREATE INDEX `record_edges_by_input` ON `record_edges` (`input_version_id`);--> statement-breakpoint
CREATE INDEX `records_by_case_kind` ON `records` (`case_id`,`kind`);--> statement-breakpoint
CREATE INDEX `custody_by_case` ON `custody_entries` (`case_id`,`at`);--> statement-breakpoint
CREATE INDEX `items_by_case` ON `items` (`case_id`);--> statement-breakpoint
CREATE INDEX `items_by_parent` ON `items` (`parent_id`);--> statement-breakpoint
CREATE INDEX `stored_objects_by_sha` ON `stored_objects` (`sha256`);--> statement-breakpoint
CREATE INDEX `stored_objects_by_case` ON `stored_objects` (`case_id`);--> statement-breakpoint
CREATE INDEX `uploads_by_case` ON `uploads` (`case_id`,`state`);--> statement-breakpoint
CREATE INDEX `uploads_by_state` ON `uploads` (`state`,`changed_at`);--> statement-breakpoint
CREATE INDEX `calibrations_by_image` ON `calibrations` (`image_id`);--> statement-breakpoint
CREATE INDEX `images_by_case` ON `images` (`case_id`);--> statement-breakpoint
CREATE INDEX `images_by_object` ON `images` (`object_id`);--> statement-breakpoint
CREATE INDEX `marks_by_image` ON `marks` (`image_id`);--> statement-breakpoint
CREATE INDEX `marks_by_record` ON `marks` (`record_id`);--> statement-breakpoint
CREATE INDEX `traverse_readings_by_record` ON `traverse_readings` (`record_id`);--> statement-breakpoint
CREATE INDEX `report_revisions_by_writer` ON `report_revisions` (`saved_by_id`);--> statement-breakpoint
CREATE INDEX `audit_by_actor` ON `audit_events` (`actor_id`,`at`);--> statement-breakpoint
CREATE INDEX `jobs_ready` ON `jobs` (`state`,`run_at`,`id`);--> statement-breakpoint
CREATE INDEX `jobs_leased` ON `jobs` (`state`,`lease_until`);