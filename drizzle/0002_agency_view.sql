ALTER TABLE `revisions` ADD `description` varchar(300) DEFAULT '' NOT NULL;
--> statement-breakpoint
ALTER TABLE `submittals` ADD `agency_updated_at` datetime(3);
--> statement-breakpoint
CREATE INDEX `submittals_agency_seen` ON `submittals` (`agency_id`,`agency_updated_at`,`id`);
--> statement-breakpoint
ALTER TABLE `submittals` DROP COLUMN `description`;
--> statement-breakpoint
DROP INDEX `submittals_agency_updated` ON `submittals`;
