-- Rights alone would leave the owner free; these hold for everybody.
CREATE TRIGGER `editions_no_update` BEFORE UPDATE ON `editions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A published edition does not change.';
--> statement-breakpoint
CREATE TRIGGER `editions_no_delete` BEFORE DELETE ON `editions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A published edition does not change.';
--> statement-breakpoint
CREATE TRIGGER `edition_events_no_update` BEFORE UPDATE ON `edition_events` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'The history of an edition does not change.';
--> statement-breakpoint
CREATE TRIGGER `edition_events_no_delete` BEFORE DELETE ON `edition_events` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'The history of an edition does not change.';
--> statement-breakpoint
CREATE TRIGGER `audit_no_update` BEFORE UPDATE ON `audit` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'The audit trail does not change.';
--> statement-breakpoint
CREATE TRIGGER `audit_no_delete` BEFORE DELETE ON `audit` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'The audit trail does not change.';
--> statement-breakpoint
CREATE TRIGGER `resolved_editions_no_update` BEFORE UPDATE ON `resolved_editions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A resolved edition does not change.';
--> statement-breakpoint
CREATE TRIGGER `resolved_editions_no_delete` BEFORE DELETE ON `resolved_editions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A resolved edition does not change.';
