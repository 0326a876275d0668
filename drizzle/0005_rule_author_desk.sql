DROP TABLE `cases`;--> statement-breakpoint
ALTER TABLE `edition_drafts` ADD `starting_point` boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE `edition_drafts` ADD `sent_by_id` char(36) character set ascii collate ascii_bin;--> statement-breakpoint
ALTER TABLE `edition_drafts` ADD `sent_at` datetime(3);--> statement-breakpoint
ALTER TABLE `edition_drafts` ADD CONSTRAINT `edition_drafts_sent_by_fk` FOREIGN KEY (`sent_by_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;