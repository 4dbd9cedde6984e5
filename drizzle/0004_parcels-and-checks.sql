CREATE TABLE `instrument_corrections` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`instrument_id` binary(16) NOT NULL,
	`correction` json NOT NULL,
	`check_ids` json NOT NULL,
	`reason` varchar(300) NOT NULL,
	`from_at` datetime(3) NOT NULL,
	`made_by` binary(16) NOT NULL,
	`ended_at` datetime(3),
	`ended_by` binary(16),
	CONSTRAINT `instrument_corrections_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `reference_materials` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`name` varchar(120) NOT NULL,
	`for_kind` varchar(20) character set ascii collate ascii_bin NOT NULL,
	`unit` varchar(4) character set ascii collate ascii_bin,
	`nominal_value` decimal(14,6),
	`standard_uncertainty` decimal(14,6),
	`limit_value` decimal(14,6),
	`expected_text` varchar(200) NOT NULL DEFAULT '',
	`source` varchar(300) NOT NULL,
	`condition` varchar(300) NOT NULL DEFAULT '',
	`condition_seen_on` date,
	`is_retired` boolean NOT NULL DEFAULT false,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `reference_materials_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`),
	CONSTRAINT `reference_materials_name` UNIQUE(`laboratory_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `recall_deeds` (
	`laboratory_id` binary(16) NOT NULL,
	`observation_id` binary(16) NOT NULL,
	`failed_check_id` binary(16) NOT NULL,
	`deed` varchar(16) character set ascii collate ascii_bin NOT NULL,
	`reason` varchar(1000) NOT NULL,
	`remeasured_by_id` binary(16),
	`done_at` datetime(3) NOT NULL,
	`done_by` binary(16) NOT NULL,
	CONSTRAINT `recall_deeds_laboratory_id_observation_id_failed_check_id_pk` PRIMARY KEY(`laboratory_id`,`observation_id`,`failed_check_id`)
);
--> statement-breakpoint
CREATE TABLE `parcel_rows` (
	`laboratory_id` binary(16) NOT NULL,
	`parcel_id` binary(16) NOT NULL,
	`position` int NOT NULL,
	`cells` json NOT NULL,
	`ranking` json NOT NULL,
	`stone_id` binary(16),
	CONSTRAINT `parcel_rows_laboratory_id_parcel_id_position_pk` PRIMARY KEY(`laboratory_id`,`parcel_id`,`position`),
	CONSTRAINT `parcel_rows_stone` UNIQUE(`laboratory_id`,`stone_id`)
);
--> statement-breakpoint
CREATE TABLE `parcels` (
	`laboratory_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`name` varchar(120) NOT NULL,
	`item_id` binary(16),
	`columns` json NOT NULL,
	`water_temp_c` decimal(5,2),
	`row_count` smallint NOT NULL,
	`odd_count` smallint NOT NULL,
	`main_species_id` varchar(60) character set ascii collate ascii_bin,
	`main_name` varchar(120) NOT NULL,
	`species_table_version` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`model_version` varchar(24) character set ascii collate ascii_bin NOT NULL,
	`saved_at` datetime(3) NOT NULL,
	`saved_by` binary(16) NOT NULL,
	CONSTRAINT `parcels_laboratory_id_id_pk` PRIMARY KEY(`laboratory_id`,`id`)
);
--> statement-breakpoint
ALTER TABLE `instrument_checks` MODIFY COLUMN `nominal_value` decimal(14,6);--> statement-breakpoint
ALTER TABLE `instrument_checks` MODIFY COLUMN `reading_value` decimal(14,6);--> statement-breakpoint
ALTER TABLE `instrument_checks` MODIFY COLUMN `reading_text` varchar(200) NOT NULL;--> statement-breakpoint
ALTER TABLE `instrument_checks` MODIFY COLUMN `limit_value` decimal(14,6);--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD `reference_material_id` binary(16);--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD `nominal_uncertainty` decimal(14,6);--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD `correction_id` binary(16);--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD `corrected_value` decimal(14,6);--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD `recall_since` datetime(3);--> statement-breakpoint
ALTER TABLE `instruments` ADD `scale_unit` varchar(4) character set ascii collate ascii_bin;--> statement-breakpoint
ALTER TABLE `instruments` ADD `check_days` smallint;--> statement-breakpoint
ALTER TABLE `observation_values` ADD `raw_value` decimal(16,7);--> statement-breakpoint
ALTER TABLE `observations` ADD `instrument_correction_id` binary(16);--> statement-breakpoint
ALTER TABLE `instrument_corrections` ADD CONSTRAINT `instrument_corrections_made_by_users_id_fk` FOREIGN KEY (`made_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instrument_corrections` ADD CONSTRAINT `instrument_corrections_ended_by_users_id_fk` FOREIGN KEY (`ended_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instrument_corrections` ADD CONSTRAINT `instrument_corrections_fk` FOREIGN KEY (`laboratory_id`,`instrument_id`) REFERENCES `instruments`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reference_materials` ADD CONSTRAINT `reference_materials_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `recall_deeds` ADD CONSTRAINT `recall_deeds_done_by_users_id_fk` FOREIGN KEY (`done_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `recall_deeds` ADD CONSTRAINT `recall_deeds_observation_fk` FOREIGN KEY (`laboratory_id`,`observation_id`) REFERENCES `observations`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `recall_deeds` ADD CONSTRAINT `recall_deeds_check_fk` FOREIGN KEY (`laboratory_id`,`failed_check_id`) REFERENCES `instrument_checks`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcel_rows` ADD CONSTRAINT `parcel_rows_fk` FOREIGN KEY (`laboratory_id`,`parcel_id`) REFERENCES `parcels`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcel_rows` ADD CONSTRAINT `parcel_rows_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcels` ADD CONSTRAINT `parcels_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcels` ADD CONSTRAINT `parcels_saved_by_users_id_fk` FOREIGN KEY (`saved_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcels` ADD CONSTRAINT `parcels_item_fk` FOREIGN KEY (`laboratory_id`,`item_id`) REFERENCES `items`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `instrument_corrections_instrument` ON `instrument_corrections` (`laboratory_id`,`instrument_id`,`from_at`);--> statement-breakpoint
CREATE INDEX `recall_deeds_done` ON `recall_deeds` (`laboratory_id`,`done_at`);--> statement-breakpoint
CREATE INDEX `parcels_saved` ON `parcels` (`laboratory_id`,`saved_at`,`id`);--> statement-breakpoint
CREATE INDEX `parcels_item` ON `parcels` (`laboratory_id`,`item_id`,`saved_at`);--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD CONSTRAINT `instrument_checks_reference_fk` FOREIGN KEY (`laboratory_id`,`reference_material_id`) REFERENCES `reference_materials`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instrument_checks` ADD CONSTRAINT `instrument_checks_correction_fk` FOREIGN KEY (`laboratory_id`,`correction_id`) REFERENCES `instrument_corrections`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `observations` ADD CONSTRAINT `observations_correction_fk` FOREIGN KEY (`laboratory_id`,`instrument_correction_id`) REFERENCES `instrument_corrections`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;