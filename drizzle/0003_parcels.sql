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
ALTER TABLE `parcel_rows` ADD CONSTRAINT `parcel_rows_fk` FOREIGN KEY (`laboratory_id`,`parcel_id`) REFERENCES `parcels`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcel_rows` ADD CONSTRAINT `parcel_rows_stone_fk` FOREIGN KEY (`laboratory_id`,`stone_id`) REFERENCES `stones`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcels` ADD CONSTRAINT `parcels_laboratory_id_laboratories_id_fk` FOREIGN KEY (`laboratory_id`) REFERENCES `laboratories`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcels` ADD CONSTRAINT `parcels_saved_by_users_id_fk` FOREIGN KEY (`saved_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `parcels` ADD CONSTRAINT `parcels_item_fk` FOREIGN KEY (`laboratory_id`,`item_id`) REFERENCES `items`(`laboratory_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `parcels_saved` ON `parcels` (`laboratory_id`,`saved_at`,`id`);--> statement-breakpoint
CREATE INDEX `parcels_item` ON `parcels` (`laboratory_id`,`item_id`,`saved_at`);