CREATE TABLE `checks` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(30) NOT NULL,
	`number` int NOT NULL,
	`made_at` datetime(3) NOT NULL,
	`made_by_id` char(36) character set ascii collate ascii_bin,
	`submitted_on` date NOT NULL,
	`context` json NOT NULL,
	`record_hash` char(64) NOT NULL,
	`resolved_hash` char(64) NOT NULL,
	`engine_version` varchar(40) NOT NULL,
	`seal` char(64) NOT NULL,
	`summary` json NOT NULL,
	`result` json NOT NULL,
	`stale` varchar(300),
	CONSTRAINT `checks_id` PRIMARY KEY(`id`),
	CONSTRAINT `checks_number` UNIQUE(`revision_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `findings` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`check_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`rule` varchar(120) NOT NULL,
	`subject` varchar(160) NOT NULL,
	`clause` varchar(60),
	`severity` varchar(30) NOT NULL,
	`outcome` varchar(30) NOT NULL,
	`borderline` boolean NOT NULL,
	`rounded` double,
	`margin` double,
	CONSTRAINT `findings_id` PRIMARY KEY(`id`),
	CONSTRAINT `findings_position` UNIQUE(`check_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `notes` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`submittal_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`side` varchar(30) NOT NULL,
	`kind` varchar(30) NOT NULL,
	`finding` varchar(300),
	`sheet` varchar(120),
	`cell` varchar(20),
	`text` varchar(4000) NOT NULL,
	`answers_id` char(36) character set ascii collate ascii_bin,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`sent_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `notes_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `replay_findings` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`replay_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`rule` varchar(120) NOT NULL,
	`subject` varchar(160) NOT NULL,
	`outcome_before` varchar(30),
	`outcome_after` varchar(30),
	`detail` text,
	CONSTRAINT `replay_findings_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `waivers` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`submittal_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`finding` varchar(300) NOT NULL,
	`reason` varchar(2000) NOT NULL,
	`to_be_returned` boolean NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`sent_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `waivers_id` PRIMARY KEY(`id`),
	CONSTRAINT `waivers_finding` UNIQUE(`revision_id`,`finding`)
);
--> statement-breakpoint
CREATE TABLE `cell_blocks` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`grid_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`sheet` int NOT NULL,
	`from_row` int NOT NULL,
	`to_row` int NOT NULL,
	`cells` json NOT NULL,
	CONSTRAINT `cell_blocks_id` PRIMARY KEY(`id`),
	CONSTRAINT `cell_blocks_rows` UNIQUE(`grid_id`,`sheet`,`from_row`)
);
--> statement-breakpoint
CREATE TABLE `cell_grids` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`file_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`decoder` varchar(60) NOT NULL,
	`date_1904` boolean NOT NULL,
	`properties` json NOT NULL,
	`sheets` json NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `cell_grids_id` PRIMARY KEY(`id`),
	CONSTRAINT `cell_grids_decoder` UNIQUE(`file_id`,`decoder`)
);
--> statement-breakpoint
CREATE TABLE `files` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(30) NOT NULL,
	`file_name` varchar(255) NOT NULL,
	`media_type` varchar(120) NOT NULL,
	`size_bytes` int NOT NULL,
	`sha256` char(64) NOT NULL,
	`bytes` longblob NOT NULL,
	`created_by_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `files_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `accounts` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`account_id` varchar(255) NOT NULL,
	`provider_id` varchar(60) NOT NULL,
	`password` text,
	`access_token` text,
	`refresh_token` text,
	`id_token` text,
	`access_token_expires_at` datetime(3),
	`refresh_token_expires_at` datetime(3),
	`scope` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `accounts_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `agency_contractors` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `agency_contractors_id` PRIMARY KEY(`id`),
	CONSTRAINT `agency_contractors_pair` UNIQUE(`agency_id`,`contractor_id`)
);
--> statement-breakpoint
CREATE TABLE `audit` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin,
	`person_id` char(36) character set ascii collate ascii_bin,
	`act` varchar(80) NOT NULL,
	`subject_kind` varchar(40) NOT NULL,
	`subject_id` varchar(80) NOT NULL,
	`detail` json NOT NULL,
	`request_id` varchar(64),
	CONSTRAINT `audit_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `demo_sign_ins` (
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`password` varchar(120) NOT NULL,
	CONSTRAINT `demo_sign_ins_person_id` PRIMARY KEY(`person_id`)
);
--> statement-breakpoint
CREATE TABLE `invitations` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`invited_from_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`inviter_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`email` varchar(254) NOT NULL,
	`role` varchar(200) NOT NULL,
	`status` varchar(30) NOT NULL,
	`token_hash` char(64) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `invitations_id` PRIMARY KEY(`id`),
	CONSTRAINT `invitations_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `laboratories` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`accreditation` varchar(120),
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `laboratories_id` PRIMARY KEY(`id`),
	CONSTRAINT `laboratories_name` UNIQUE(`organisation_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `members` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`role` varchar(200) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `members_id` PRIMARY KEY(`id`),
	CONSTRAINT `members_organisation_person` UNIQUE(`organisation_id`,`person_id`)
);
--> statement-breakpoint
CREATE TABLE `organisations` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`slug` varchar(160) NOT NULL,
	`kind` varchar(30) NOT NULL,
	`time_zone` varchar(64) NOT NULL,
	`review_working_days` int NOT NULL,
	`waiver_policy` varchar(30) NOT NULL,
	`letterhead` json NOT NULL,
	`logo` text,
	`metadata` text,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `organisations_id` PRIMARY KEY(`id`),
	CONSTRAINT `organisations_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `people` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`email` varchar(254) NOT NULL,
	`email_verified` boolean NOT NULL DEFAULT false,
	`image` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `people_id` PRIMARY KEY(`id`),
	CONSTRAINT `people_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`token` varchar(100) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`ip_address` varchar(64),
	`user_agent` text,
	`active_organisation_id` char(36) character set ascii collate ascii_bin,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `sessions_id` PRIMARY KEY(`id`),
	CONSTRAINT `sessions_token` UNIQUE(`token`)
);
--> statement-breakpoint
CREATE TABLE `set_up_links` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`token_hash` char(64) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`used_at` datetime(3),
	CONSTRAINT `set_up_links_id` PRIMARY KEY(`id`),
	CONSTRAINT `set_up_links_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `verifications` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`identifier` varchar(255) NOT NULL,
	`value` text NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `verifications_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `contacts` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`project_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`name` varchar(120) NOT NULL,
	`function` varchar(120) NOT NULL,
	`email` varchar(254) NOT NULL,
	CONSTRAINT `contacts_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `project_contractors` (
	`project_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `project_contractors_pk` PRIMARY KEY(`project_id`,`contractor_id`)
);
--> statement-breakpoint
CREATE TABLE `projects` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`number` varchar(40) NOT NULL,
	`title` varchar(120) NOT NULL,
	`letting_on` date,
	`facts` json NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `projects_id` PRIMARY KEY(`id`),
	CONSTRAINT `projects_number` UNIQUE(`agency_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `section_layers` (
	`section_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`edition_id` char(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `section_layers_pk` PRIMARY KEY(`section_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `sections` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`project_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`base_edition_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`resolved_hash` char(64) NOT NULL,
	`confirmed_by_id` char(36) character set ascii collate ascii_bin,
	`confirmed_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `sections_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `returns` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`submittal_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`state` varchar(30) NOT NULL,
	`disposition` varchar(30) NOT NULL,
	`reason` varchar(2000) NOT NULL,
	`text_above` text NOT NULL,
	`text_below` text NOT NULL,
	`recipients` json NOT NULL,
	`copies` json NOT NULL,
	`included` json NOT NULL,
	`findings_workbook` boolean NOT NULL,
	`prepared_by_id` char(36) character set ascii collate ascii_bin,
	`signing_engineer_id` char(36) character set ascii collate ascii_bin,
	`frozen` json,
	`letter_file_id` char(36) character set ascii collate ascii_bin,
	`workbook_file_id` char(36) character set ascii collate ascii_bin,
	`decided_by_id` char(36) character set ascii collate ascii_bin,
	`sent_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`saved_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `returns_id` PRIMARY KEY(`id`),
	CONSTRAINT `returns_revision` UNIQUE(`revision_id`)
);
--> statement-breakpoint
CREATE TABLE `cases` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`draft_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`case_key` varchar(120) NOT NULL,
	`title` varchar(200) NOT NULL,
	`record` json NOT NULL,
	`context` json NOT NULL,
	`expected` json NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `cases_id` PRIMARY KEY(`id`),
	CONSTRAINT `cases_key` UNIQUE(`draft_id`,`case_key`)
);
--> statement-breakpoint
CREATE TABLE `draft_comments` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`draft_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`rule` varchar(120),
	`text` varchar(4000) NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `draft_comments_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `edition_drafts` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`rule_set_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`edition` varchar(40) NOT NULL,
	`state` varchar(30) NOT NULL,
	`document` json NOT NULL,
	`based_on_id` char(36) character set ascii collate ascii_bin,
	`created_by_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `edition_drafts_id` PRIMARY KEY(`id`),
	CONSTRAINT `edition_drafts_edition` UNIQUE(`rule_set_id`,`edition`)
);
--> statement-breakpoint
CREATE TABLE `edition_events` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`edition_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(30) NOT NULL,
	`at` datetime(3) NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`reason` text,
	CONSTRAINT `edition_events_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `editions` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`rule_set_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`rule_set_key` varchar(80) NOT NULL,
	`edition` varchar(40) NOT NULL,
	`title` varchar(200) NOT NULL,
	`document` json NOT NULL,
	`hash` char(64) NOT NULL,
	`effective_from` date NOT NULL,
	`effective_to` date,
	`layer_of_key` varchar(80),
	`layer_of_edition` varchar(40),
	`rule_count` int NOT NULL,
	`starting_point` boolean NOT NULL,
	`published_at` datetime(3) NOT NULL,
	`published_by_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`second_author_id` char(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `editions_id` PRIMARY KEY(`id`),
	CONSTRAINT `editions_edition` UNIQUE(`agency_id`,`rule_set_key`,`edition`)
);
--> statement-breakpoint
CREATE TABLE `replays` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`draft_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`job_id` char(36) character set ascii collate ascii_bin,
	`resolved_hash` char(64) NOT NULL,
	`summary` json,
	`created_by_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`finished_at` datetime(3),
	CONSTRAINT `replays_id` PRIMARY KEY(`id`),
	CONSTRAINT `replays_number` UNIQUE(`agency_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `resolved_editions` (
	`hash` char(64) NOT NULL,
	`document` json NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `resolved_editions_hash` PRIMARY KEY(`hash`)
);
--> statement-breakpoint
CREATE TABLE `rule_sets` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`rule_set_key` varchar(80) NOT NULL,
	`title` varchar(200) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `rule_sets_id` PRIMARY KEY(`id`),
	CONSTRAINT `rule_sets_key` UNIQUE(`agency_id`,`rule_set_key`)
);
--> statement-breakpoint
CREATE TABLE `answers` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`sheet` varchar(120) NOT NULL,
	`cell` varchar(20) NOT NULL,
	`text` text NOT NULL,
	`answer` varchar(200) NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `answers_id` PRIMARY KEY(`id`),
	CONSTRAINT `answers_cell` UNIQUE(`revision_id`,`sheet`,`cell`)
);
--> statement-breakpoint
CREATE TABLE `documents` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`type` varchar(80) NOT NULL,
	`issuer` varchar(200),
	`reference` varchar(200),
	`date` date,
	`valid_to` date,
	`source` json,
	`stated` json,
	`added` boolean NOT NULL,
	`file_id` char(36) character set ascii collate ascii_bin,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `documents_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `mappings` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`laboratory_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(200) NOT NULL,
	`fingerprint` varchar(128) NOT NULL,
	`number` int NOT NULL,
	`document` json NOT NULL,
	`created_by_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `mappings_id` PRIMARY KEY(`id`),
	CONSTRAINT `mappings_number` UNIQUE(`laboratory_id`,`fingerprint`,`number`)
);
--> statement-breakpoint
CREATE TABLE `mix_records` (
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`record` json NOT NULL,
	`record_hash` char(64) NOT NULL,
	`reading` json NOT NULL,
	`mapping` json NOT NULL,
	`mapping_name` varchar(200) NOT NULL,
	`read_at` datetime(3) NOT NULL,
	CONSTRAINT `mix_records_revision_id` PRIMARY KEY(`revision_id`)
);
--> statement-breakpoint
CREATE TABLE `readings` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`quantity` varchar(80) NOT NULL,
	`value` varchar(40),
	`qualifier` varchar(20),
	`unit` varchar(20) NOT NULL,
	`trial` varchar(60),
	`specimen` varchar(60),
	`sieve_mm` varchar(20),
	`origin` varchar(20) NOT NULL,
	`sheet` varchar(120),
	`cell` varchar(20),
	CONSTRAINT `readings_id` PRIMARY KEY(`id`),
	CONSTRAINT `readings_position` UNIQUE(`revision_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `replaced_workbooks` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`file_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`replaced_by_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`replaced_at` datetime(3) NOT NULL,
	CONSTRAINT `replaced_workbooks_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `revisions` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`submittal_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`state` varchar(30) NOT NULL,
	`disposition` varchar(30),
	`reason_for_revision` varchar(2000),
	`laboratory_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`section` json NOT NULL,
	`workbook_file_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`uploaded_by_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`uploaded_at` datetime(3) NOT NULL,
	`mapping_id` char(36) character set ascii collate ascii_bin,
	`doubt_count` int NOT NULL DEFAULT 0,
	`changes` text,
	`declaration` text,
	`submitted_by_id` char(36) character set ascii collate ascii_bin,
	`submitted_at` datetime(3),
	`received_on` date,
	`due_on` date,
	`taken_by_id` char(36) character set ascii collate ascii_bin,
	`taken_at` datetime(3),
	`returned_at` datetime(3),
	`working_days_taken` int,
	`withdrawn_at` datetime(3),
	`withdrawal_reason` varchar(2000),
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `revisions_id` PRIMARY KEY(`id`),
	CONSTRAINT `revisions_number` UNIQUE(`submittal_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `submittals` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`agency_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`project_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`section_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`mix_designation` varchar(60) NOT NULL,
	`active_designation` varchar(60),
	`description` varchar(300) NOT NULL DEFAULT '',
	`latest_number` int NOT NULL,
	`standing_revision` int,
	`standing_disposition` varchar(30),
	`standing_on` date,
	`created_by_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `submittals_id` PRIMARY KEY(`id`),
	CONSTRAINT `submittals_active_designation` UNIQUE(`contractor_id`,`project_id`,`active_designation`)
);
--> statement-breakpoint
CREATE TABLE `typed_attributes` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`value` json NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`typed_on` date NOT NULL,
	CONSTRAINT `typed_attributes_id` PRIMARY KEY(`id`),
	CONSTRAINT `typed_attributes_name` UNIQUE(`revision_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `caught_mails` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`caught_at` datetime(3) NOT NULL,
	`message_id` varchar(255) NOT NULL,
	`sender` varchar(254) NOT NULL,
	`recipients` json NOT NULL,
	`subject` varchar(300) NOT NULL,
	`attachments` int NOT NULL,
	`source` longblob NOT NULL,
	CONSTRAINT `caught_mails_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `idempotency_keys` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`idempotency_key` char(64) NOT NULL,
	`request_hash` char(64) NOT NULL,
	`status` int,
	`response` json,
	`owner` char(36) character set ascii collate ascii_bin,
	`lease_until` datetime(3),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `idempotency_keys_id` PRIMARY KEY(`id`),
	CONSTRAINT `idempotency_keys_key` UNIQUE(`person_id`,`organisation_id`,`idempotency_key`)
);
--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`kind` varchar(40) NOT NULL,
	`state` varchar(30) NOT NULL,
	`subject_kind` varchar(40) NOT NULL,
	`subject_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`payload` json NOT NULL,
	`resume_from` json,
	`progress` varchar(300) NOT NULL DEFAULT '',
	`done` int NOT NULL DEFAULT 0,
	`total` int NOT NULL DEFAULT 0,
	`problem` json,
	`attempts` int NOT NULL DEFAULT 0,
	`cancel_requested` boolean NOT NULL DEFAULT false,
	`owner` char(36) character set ascii collate ascii_bin,
	`lease_until` datetime(3),
	`created_by_id` char(36) character set ascii collate ascii_bin,
	`created_at` datetime(3) NOT NULL,
	`finished_at` datetime(3),
	CONSTRAINT `jobs_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin,
	`kind` varchar(40) NOT NULL,
	`message_id` varchar(255) NOT NULL,
	`in_reply_to` varchar(255),
	`subject_kind` varchar(40) NOT NULL,
	`subject_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`submittal_id` char(36) character set ascii collate ascii_bin,
	`recipients` json NOT NULL,
	`copies` json NOT NULL,
	`subject` varchar(300) NOT NULL,
	`text` mediumtext NOT NULL,
	`html` mediumtext NOT NULL,
	`state` varchar(30) NOT NULL,
	`attempts` int NOT NULL DEFAULT 0,
	`next_attempt_at` datetime(3) NOT NULL,
	`last_problem` text,
	`owner` char(36) character set ascii collate ascii_bin,
	`lease_until` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`sent_at` datetime(3),
	CONSTRAINT `outbox_id` PRIMARY KEY(`id`),
	CONSTRAINT `outbox_message_id` UNIQUE(`message_id`)
);
--> statement-breakpoint
CREATE TABLE `outbox_attachments` (
	`outbox_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`position` int NOT NULL,
	`file_id` char(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `outbox_attachments_pk` PRIMARY KEY(`outbox_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `rate_limits` (
	`key` varchar(255) NOT NULL,
	`points` int NOT NULL DEFAULT 0,
	`expire` bigint unsigned,
	CONSTRAINT `rate_limits_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
ALTER TABLE `checks` ADD CONSTRAINT `checks_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `checks` ADD CONSTRAINT `checks_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `checks` ADD CONSTRAINT `checks_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `checks` ADD CONSTRAINT `checks_made_by_fk` FOREIGN KEY (`made_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `findings` ADD CONSTRAINT `findings_check_fk` FOREIGN KEY (`check_id`) REFERENCES `checks`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_submittal_fk` FOREIGN KEY (`submittal_id`) REFERENCES `submittals`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_organisation_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `replay_findings` ADD CONSTRAINT `replay_findings_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waivers` ADD CONSTRAINT `waivers_submittal_fk` FOREIGN KEY (`submittal_id`) REFERENCES `submittals`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waivers` ADD CONSTRAINT `waivers_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waivers` ADD CONSTRAINT `waivers_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waivers` ADD CONSTRAINT `waivers_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waivers` ADD CONSTRAINT `waivers_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cell_blocks` ADD CONSTRAINT `cell_blocks_grid_fk` FOREIGN KEY (`grid_id`) REFERENCES `cell_grids`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cell_grids` ADD CONSTRAINT `cell_grids_file_fk` FOREIGN KEY (`file_id`) REFERENCES `files`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `files` ADD CONSTRAINT `files_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `files` ADD CONSTRAINT `files_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `files` ADD CONSTRAINT `files_created_by_fk` FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `accounts` ADD CONSTRAINT `accounts_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `agency_contractors` ADD CONSTRAINT `agency_contractors_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `agency_contractors` ADD CONSTRAINT `agency_contractors_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `demo_sign_ins` ADD CONSTRAINT `demo_sign_ins_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_organisation_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_invited_from_fk` FOREIGN KEY (`invited_from_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_inviter_fk` FOREIGN KEY (`inviter_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `laboratories` ADD CONSTRAINT `laboratories_organisation_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `members` ADD CONSTRAINT `members_organisation_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `members` ADD CONSTRAINT `members_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `contacts` ADD CONSTRAINT `contacts_project_fk` FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `project_contractors` ADD CONSTRAINT `project_contractors_project_fk` FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `project_contractors` ADD CONSTRAINT `project_contractors_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `projects` ADD CONSTRAINT `projects_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `section_layers` ADD CONSTRAINT `section_layers_section_fk` FOREIGN KEY (`section_id`) REFERENCES `sections`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `section_layers` ADD CONSTRAINT `section_layers_edition_fk` FOREIGN KEY (`edition_id`) REFERENCES `editions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sections` ADD CONSTRAINT `sections_project_fk` FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sections` ADD CONSTRAINT `sections_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sections` ADD CONSTRAINT `sections_base_edition_fk` FOREIGN KEY (`base_edition_id`) REFERENCES `editions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sections` ADD CONSTRAINT `sections_confirmed_by_fk` FOREIGN KEY (`confirmed_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_submittal_fk` FOREIGN KEY (`submittal_id`) REFERENCES `submittals`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_prepared_by_fk` FOREIGN KEY (`prepared_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_signing_engineer_fk` FOREIGN KEY (`signing_engineer_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_decided_by_fk` FOREIGN KEY (`decided_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_letter_fk` FOREIGN KEY (`letter_file_id`) REFERENCES `files`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_workbook_fk` FOREIGN KEY (`workbook_file_id`) REFERENCES `files`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cases` ADD CONSTRAINT `cases_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cases` ADD CONSTRAINT `cases_draft_fk` FOREIGN KEY (`draft_id`) REFERENCES `edition_drafts`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `draft_comments` ADD CONSTRAINT `draft_comments_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `draft_comments` ADD CONSTRAINT `draft_comments_draft_fk` FOREIGN KEY (`draft_id`) REFERENCES `edition_drafts`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `draft_comments` ADD CONSTRAINT `draft_comments_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_drafts` ADD CONSTRAINT `edition_drafts_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_drafts` ADD CONSTRAINT `edition_drafts_rule_set_fk` FOREIGN KEY (`rule_set_id`) REFERENCES `rule_sets`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_drafts` ADD CONSTRAINT `edition_drafts_based_on_fk` FOREIGN KEY (`based_on_id`) REFERENCES `editions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_drafts` ADD CONSTRAINT `edition_drafts_created_by_fk` FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_events` ADD CONSTRAINT `edition_events_edition_fk` FOREIGN KEY (`edition_id`) REFERENCES `editions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_events` ADD CONSTRAINT `edition_events_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `edition_events` ADD CONSTRAINT `edition_events_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `editions` ADD CONSTRAINT `editions_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `editions` ADD CONSTRAINT `editions_rule_set_fk` FOREIGN KEY (`rule_set_id`) REFERENCES `rule_sets`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `editions` ADD CONSTRAINT `editions_published_by_fk` FOREIGN KEY (`published_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `editions` ADD CONSTRAINT `editions_second_author_fk` FOREIGN KEY (`second_author_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `replays` ADD CONSTRAINT `replays_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `replays` ADD CONSTRAINT `replays_draft_fk` FOREIGN KEY (`draft_id`) REFERENCES `edition_drafts`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `replays` ADD CONSTRAINT `replays_created_by_fk` FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rule_sets` ADD CONSTRAINT `rule_sets_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `answers` ADD CONSTRAINT `answers_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `answers` ADD CONSTRAINT `answers_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `documents` ADD CONSTRAINT `documents_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `documents` ADD CONSTRAINT `documents_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `documents` ADD CONSTRAINT `documents_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `documents` ADD CONSTRAINT `documents_file_fk` FOREIGN KEY (`file_id`) REFERENCES `files`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mappings` ADD CONSTRAINT `mappings_organisation_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mappings` ADD CONSTRAINT `mappings_laboratory_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mappings` ADD CONSTRAINT `mappings_created_by_fk` FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mix_records` ADD CONSTRAINT `mix_records_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `readings` ADD CONSTRAINT `readings_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `replaced_workbooks` ADD CONSTRAINT `replaced_workbooks_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `replaced_workbooks` ADD CONSTRAINT `replaced_workbooks_file_fk` FOREIGN KEY (`file_id`) REFERENCES `files`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `replaced_workbooks` ADD CONSTRAINT `replaced_workbooks_person_fk` FOREIGN KEY (`replaced_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_submittal_fk` FOREIGN KEY (`submittal_id`) REFERENCES `submittals`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_laboratory_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_workbook_fk` FOREIGN KEY (`workbook_file_id`) REFERENCES `files`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_uploaded_by_fk` FOREIGN KEY (`uploaded_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_submitted_by_fk` FOREIGN KEY (`submitted_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_taken_by_fk` FOREIGN KEY (`taken_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revisions` ADD CONSTRAINT `revisions_mapping_fk` FOREIGN KEY (`mapping_id`) REFERENCES `mappings`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `submittals` ADD CONSTRAINT `submittals_agency_fk` FOREIGN KEY (`agency_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `submittals` ADD CONSTRAINT `submittals_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `submittals` ADD CONSTRAINT `submittals_project_fk` FOREIGN KEY (`project_id`) REFERENCES `projects`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `submittals` ADD CONSTRAINT `submittals_section_fk` FOREIGN KEY (`section_id`) REFERENCES `sections`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `submittals` ADD CONSTRAINT `submittals_created_by_fk` FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `typed_attributes` ADD CONSTRAINT `typed_attributes_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `typed_attributes` ADD CONSTRAINT `typed_attributes_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `idempotency_keys` ADD CONSTRAINT `idempotency_keys_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `jobs` ADD CONSTRAINT `jobs_organisation_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `jobs` ADD CONSTRAINT `jobs_created_by_fk` FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `outbox` ADD CONSTRAINT `outbox_organisation_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `outbox_attachments` ADD CONSTRAINT `outbox_attachments_outbox_fk` FOREIGN KEY (`outbox_id`) REFERENCES `outbox`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `outbox_attachments` ADD CONSTRAINT `outbox_attachments_file_fk` FOREIGN KEY (`file_id`) REFERENCES `files`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `checks_agency` ON `checks` (`agency_id`,`made_at`);--> statement-breakpoint
CREATE INDEX `findings_agency_rule` ON `findings` (`agency_id`,`rule`,`outcome`);--> statement-breakpoint
CREATE INDEX `findings_revision` ON `findings` (`revision_id`);--> statement-breakpoint
CREATE INDEX `notes_submittal` ON `notes` (`submittal_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `notes_revision` ON `notes` (`revision_id`);--> statement-breakpoint
CREATE INDEX `replay_findings_replay` ON `replay_findings` (`replay_id`,`rule`);--> statement-breakpoint
CREATE INDEX `files_contractor` ON `files` (`contractor_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `files_sha256` ON `files` (`sha256`);--> statement-breakpoint
CREATE INDEX `accounts_person` ON `accounts` (`person_id`);--> statement-breakpoint
CREATE INDEX `agency_contractors_contractor` ON `agency_contractors` (`contractor_id`);--> statement-breakpoint
CREATE INDEX `audit_organisation_at` ON `audit` (`organisation_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_subject` ON `audit` (`subject_kind`,`subject_id`);--> statement-breakpoint
CREATE INDEX `invitations_organisation` ON `invitations` (`organisation_id`,`status`);--> statement-breakpoint
CREATE INDEX `invitations_invited_from` ON `invitations` (`invited_from_id`,`status`);--> statement-breakpoint
CREATE INDEX `members_person` ON `members` (`person_id`);--> statement-breakpoint
CREATE INDEX `sessions_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE INDEX `verifications_identifier` ON `verifications` (`identifier`);--> statement-breakpoint
CREATE INDEX `contacts_project` ON `contacts` (`project_id`,`position`);--> statement-breakpoint
CREATE INDEX `project_contractors_contractor` ON `project_contractors` (`contractor_id`);--> statement-breakpoint
CREATE INDEX `section_layers_edition` ON `section_layers` (`edition_id`);--> statement-breakpoint
CREATE INDEX `sections_project` ON `sections` (`project_id`,`position`);--> statement-breakpoint
CREATE INDEX `sections_base_edition` ON `sections` (`base_edition_id`);--> statement-breakpoint
CREATE INDEX `returns_agency_state` ON `returns` (`agency_id`,`state`);--> statement-breakpoint
CREATE INDEX `returns_submittal` ON `returns` (`submittal_id`);--> statement-breakpoint
CREATE INDEX `draft_comments_draft` ON `draft_comments` (`draft_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `edition_drafts_agency` ON `edition_drafts` (`agency_id`);--> statement-breakpoint
CREATE INDEX `edition_events_edition` ON `edition_events` (`edition_id`,`at`);--> statement-breakpoint
CREATE INDEX `editions_rule_set` ON `editions` (`rule_set_id`,`effective_from`);--> statement-breakpoint
CREATE INDEX `documents_revision` ON `documents` (`revision_id`,`position`);--> statement-breakpoint
CREATE INDEX `readings_agency_quantity` ON `readings` (`agency_id`,`quantity`);--> statement-breakpoint
CREATE INDEX `replaced_workbooks_revision` ON `replaced_workbooks` (`revision_id`);--> statement-breakpoint
CREATE INDEX `revisions_agency_state` ON `revisions` (`agency_id`,`state`,`due_on`);--> statement-breakpoint
CREATE INDEX `revisions_contractor_state` ON `revisions` (`contractor_id`,`state`);--> statement-breakpoint
CREATE INDEX `revisions_taken_by` ON `revisions` (`taken_by_id`);--> statement-breakpoint
CREATE INDEX `submittals_agency_updated` ON `submittals` (`agency_id`,`updated_at`,`id`);--> statement-breakpoint
CREATE INDEX `submittals_contractor_updated` ON `submittals` (`contractor_id`,`updated_at`,`id`);--> statement-breakpoint
CREATE INDEX `submittals_project` ON `submittals` (`project_id`);--> statement-breakpoint
CREATE INDEX `submittals_section` ON `submittals` (`section_id`);--> statement-breakpoint
CREATE INDEX `caught_mails_at` ON `caught_mails` (`caught_at`);--> statement-breakpoint
CREATE INDEX `caught_mails_message` ON `caught_mails` (`message_id`);--> statement-breakpoint
CREATE INDEX `idempotency_keys_created` ON `idempotency_keys` (`created_at`);--> statement-breakpoint
CREATE INDEX `jobs_state` ON `jobs` (`state`,`lease_until`);--> statement-breakpoint
CREATE INDEX `jobs_subject` ON `jobs` (`subject_kind`,`subject_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `outbox_state` ON `outbox` (`state`,`next_attempt_at`);--> statement-breakpoint
CREATE INDEX `outbox_subject` ON `outbox` (`subject_kind`,`subject_id`);--> statement-breakpoint
CREATE INDEX `outbox_submittal` ON `outbox` (`submittal_id`,`created_at`);