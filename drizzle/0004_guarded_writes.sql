ALTER TABLE `idempotency_keys` DROP FOREIGN KEY `idempotency_keys_person_fk`;
--> statement-breakpoint
ALTER TABLE `invitations` ADD `version` int DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE `jobs` ADD `version` int DEFAULT 1 NOT NULL;