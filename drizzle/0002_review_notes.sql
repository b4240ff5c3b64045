CREATE TABLE `review_notes` (
	`id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`issue_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`revision` int NOT NULL,
	`section` varchar(40) NOT NULL,
	`passage` varchar(500) NOT NULL,
	`figure_id` varchar(40) character set ascii collate ascii_bin,
	`kind` varchar(12) NOT NULL,
	`severity` varchar(8) NOT NULL,
	`words` text NOT NULL,
	`state` varchar(12) NOT NULL DEFAULT 'open',
	`replies` json NOT NULL,
	`reader_id` varchar(40) character set ascii collate ascii_bin NOT NULL,
	`made_at` datetime(3) NOT NULL DEFAULT current_timestamp(3),
	CONSTRAINT `review_notes_id` PRIMARY KEY(`id`),
	CONSTRAINT `review_notes_by_issue_number` UNIQUE(`issue_id`,`number`)
);
--> statement-breakpoint
ALTER TABLE `review_notes` ADD CONSTRAINT `review_notes_issue_id_report_issues_id_fk` FOREIGN KEY (`issue_id`) REFERENCES `report_issues`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `review_notes` ADD CONSTRAINT `review_notes_reader_id_people_id_fk` FOREIGN KEY (`reader_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;