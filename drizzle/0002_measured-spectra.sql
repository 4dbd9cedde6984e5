CREATE TABLE `spectra` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`sequence` int NOT NULL,
	`note` varchar(500) NOT NULL DEFAULT '',
	`file_key` varchar(160) character set ascii collate ascii_bin NOT NULL,
	`file_name` varchar(160) NOT NULL,
	`size_bytes` int NOT NULL,
	`sha256` binary(32) NOT NULL,
	`format` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`title` varchar(200) NOT NULL DEFAULT '',
	`kind` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`x_unit` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`y_unit` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`is_unit_assumed` boolean NOT NULL,
	`point_count` int NOT NULL,
	`first_x` double NOT NULL,
	`last_x` double NOT NULL,
	`curve` json NOT NULL,
	`peaks` json NOT NULL,
	`notes` json NOT NULL,
	`request_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`created_by` binary(16) NOT NULL,
	`withdrawn_at` datetime(3),
	`withdrawn_by` binary(16),
	`withdrawn_reason` varchar(500) NOT NULL DEFAULT '',
	CONSTRAINT `spectra_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `spectra_sequence` UNIQUE(`laboratory_id`,`stone_id`,`sequence`),
	CONSTRAINT `spectra_request` UNIQUE(`laboratory_id`,`request_id`)
);
--> statement-breakpoint
ALTER TABLE `spectra` ADD CONSTRAINT `spectra_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `spectra` ADD CONSTRAINT `spectra_withdrawn_by_users_id_fk` FOREIGN KEY (`withdrawn_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `spectra` ADD CONSTRAINT `spectra_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;