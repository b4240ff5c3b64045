CREATE TRIGGER IF NOT EXISTS `audit_events_no_update` BEFORE UPDATE ON `audit_events` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'audit_events is append-only';
--> statement-breakpoint
CREATE TRIGGER IF NOT EXISTS `audit_events_no_delete` BEFORE DELETE ON `audit_events` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'audit_events is append-only';
--> statement-breakpoint
CREATE TRIGGER IF NOT EXISTS `custody_entries_no_update` BEFORE UPDATE ON `custody_entries` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'custody_entries is append-only';
--> statement-breakpoint
CREATE TRIGGER IF NOT EXISTS `custody_entries_no_delete` BEFORE DELETE ON `custody_entries` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'custody_entries is append-only';
--> statement-breakpoint
CREATE TRIGGER IF NOT EXISTS `record_versions_no_update` BEFORE UPDATE ON `record_versions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'a version is never changed';
--> statement-breakpoint
CREATE TRIGGER IF NOT EXISTS `record_versions_no_delete` BEFORE DELETE ON `record_versions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'a version is never changed';
--> statement-breakpoint
CREATE TRIGGER IF NOT EXISTS `report_issues_stay_signed` BEFORE UPDATE ON `report_issues` FOR EACH ROW BEGIN IF OLD.`signed_at` IS NOT NULL AND (NOT (OLD.`document` <=> NEW.`document`) OR NOT (OLD.`frozen` <=> NEW.`frozen`) OR NOT (OLD.`manifest` <=> NEW.`manifest`) OR NOT (OLD.`manifest_sha256` <=> NEW.`manifest_sha256`) OR NOT (OLD.`signed_at` <=> NEW.`signed_at`) OR NOT (OLD.`signed_by_id` <=> NEW.`signed_by_id`) OR NOT (OLD.`root_cause` <=> NEW.`root_cause`) OR (OLD.`pdf_object_id` IS NOT NULL AND NOT (OLD.`pdf_object_id` <=> NEW.`pdf_object_id`))) THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'a signed issue is never changed'; END IF; END;
--> statement-breakpoint
CREATE TRIGGER IF NOT EXISTS `report_issues_no_delete` BEFORE DELETE ON `report_issues` FOR EACH ROW BEGIN IF OLD.`signed_at` IS NOT NULL THEN SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'a signed issue is never deleted'; END IF; END;
--> statement-breakpoint
CREATE FULLTEXT INDEX IF NOT EXISTS `cases_search` ON `cases` (`title`, `part_name`, `drawing_number`, `serial_number`, `heat_number`, `material`);
