CREATE TABLE `mapping_versions` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`mapping_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`organisation_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`document` json NOT NULL,
	`fingerprint` varchar(480) NOT NULL,
	`origin` varchar(300) NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin,
	`learned` json NOT NULL,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `mapping_versions_id` PRIMARY KEY(`id`),
	CONSTRAINT `mapping_versions_number` UNIQUE(`mapping_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `reading_acts` (
	`id` char(36) character set ascii collate ascii_bin NOT NULL,
	`revision_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`contractor_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`file_id` char(36) character set ascii collate ascii_bin,
	`act` json NOT NULL,
	`takes_back_id` char(36) character set ascii collate ascii_bin,
	`person_id` char(36) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `reading_acts_id` PRIMARY KEY(`id`),
	CONSTRAINT `reading_acts_taken_back` UNIQUE(`takes_back_id`)
);
--> statement-breakpoint
CREATE INDEX `mappings_laboratory` ON `mappings` (`laboratory_id`);--> statement-breakpoint
ALTER TABLE `mappings` DROP INDEX `mappings_number`;--> statement-breakpoint
ALTER TABLE `mappings` MODIFY COLUMN `name` varchar(120) NOT NULL;--> statement-breakpoint
ALTER TABLE `mappings` MODIFY COLUMN `fingerprint` varchar(480) NOT NULL;--> statement-breakpoint
ALTER TABLE `mappings` ADD `retired_at` datetime(3);--> statement-breakpoint
ALTER TABLE `mappings` ADD `version` int DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE `revisions` ADD `mapping_number` int;--> statement-breakpoint
ALTER TABLE `mapping_versions` ADD CONSTRAINT `mapping_versions_mapping_fk` FOREIGN KEY (`mapping_id`) REFERENCES `mappings`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mapping_versions` ADD CONSTRAINT `mapping_versions_organisation_fk` FOREIGN KEY (`organisation_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mapping_versions` ADD CONSTRAINT `mapping_versions_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mapping_versions` ADD CONSTRAINT `mapping_versions_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reading_acts` ADD CONSTRAINT `reading_acts_revision_fk` FOREIGN KEY (`revision_id`) REFERENCES `revisions`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reading_acts` ADD CONSTRAINT `reading_acts_contractor_fk` FOREIGN KEY (`contractor_id`) REFERENCES `organisations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reading_acts` ADD CONSTRAINT `reading_acts_file_fk` FOREIGN KEY (`file_id`) REFERENCES `files`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reading_acts` ADD CONSTRAINT `reading_acts_takes_back_fk` FOREIGN KEY (`takes_back_id`) REFERENCES `reading_acts`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reading_acts` ADD CONSTRAINT `reading_acts_person_fk` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `mapping_versions_revision` ON `mapping_versions` (`revision_id`);--> statement-breakpoint
CREATE INDEX `reading_acts_revision` ON `reading_acts` (`revision_id`,`id`);--> statement-breakpoint
ALTER TABLE `mappings` DROP COLUMN `document`;
--> statement-breakpoint
CREATE TRIGGER `mapping_versions_no_update` BEFORE UPDATE ON `mapping_versions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A version of a mapping does not change.';
--> statement-breakpoint
CREATE TRIGGER `mapping_versions_no_delete` BEFORE DELETE ON `mapping_versions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A version of a mapping does not change.';
--> statement-breakpoint
CREATE TRIGGER `reading_acts_no_update` BEFORE UPDATE ON `reading_acts` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'What was done to a reading does not change.';
--> statement-breakpoint
CREATE TRIGGER `reading_acts_no_delete` BEFORE DELETE ON `reading_acts` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'What was done to a reading does not change.';
