CREATE TABLE `inclusions` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`sequence` int NOT NULL,
	`type` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`other_text` varchar(60) NOT NULL DEFAULT '',
	`photo_id` binary(16),
	`photo_x` decimal(5,4),
	`photo_y` decimal(5,4),
	`plot_side` varchar(8) character set ascii collate ascii_bin,
	`plot_x` decimal(5,4),
	`plot_y` decimal(5,4),
	`depth` varchar(12) character set ascii collate ascii_bin NOT NULL,
	`amount` varchar(8) character set ascii collate ascii_bin NOT NULL,
	`size_mm` decimal(9,4),
	`size_text` varchar(24) NOT NULL DEFAULT '',
	`note` varchar(500) NOT NULL DEFAULT '',
	`observer_id` binary(16) NOT NULL,
	`recorded_at` datetime(3) NOT NULL,
	`struck_at` datetime(3),
	`struck_by` binary(16),
	`struck_reason` varchar(500) NOT NULL DEFAULT '',
	CONSTRAINT `inclusions_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `inclusions_sequence` UNIQUE(`laboratory_id`,`stone_id`,`sequence`)
);
--> statement-breakpoint
CREATE TABLE `stone_plots` (
	`laboratory_id` binary(16) NOT NULL,
	`stone_id` binary(16) NOT NULL,
	`outline` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`changed_at` datetime(3) NOT NULL,
	`changed_by` binary(16) NOT NULL,
	CONSTRAINT `stone_plots_laboratory_id_stone_id_pk` PRIMARY KEY(`laboratory_id`,`stone_id`)
);
--> statement-breakpoint
ALTER TABLE `attachments` ADD `magnification_x` decimal(7,2);--> statement-breakpoint
ALTER TABLE `attachments` ADD `picture_width_mm` decimal(9,4);--> statement-breakpoint
ALTER TABLE `inclusions` ADD CONSTRAINT `inclusions_observer_id_users_id_fk` FOREIGN KEY (`observer_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `inclusions` ADD CONSTRAINT `inclusions_struck_by_users_id_fk` FOREIGN KEY (`struck_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `inclusions` ADD CONSTRAINT `inclusions_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `inclusions` ADD CONSTRAINT `inclusions_photo_fk` FOREIGN KEY (`laboratory_id`,`photo_id`) REFERENCES `attachments`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stone_plots` ADD CONSTRAINT `stone_plots_changed_by_users_id_fk` FOREIGN KEY (`changed_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stone_plots` ADD CONSTRAINT `stone_plots_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `inclusions_photo` ON `inclusions` (`laboratory_id`,`photo_id`);