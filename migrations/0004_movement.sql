CREATE TABLE `face_movement` (
	`face_id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`choices` json NOT NULL,
	`revision` int NOT NULL,
	`updated_by` char(36) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `face_movement_face_id` PRIMARY KEY(`face_id`)
);
--> statement-breakpoint
CREATE TABLE `shop_movement` (
	`shop_id` char(36) NOT NULL,
	`climate` json NOT NULL,
	`least_gap_um` int NOT NULL,
	`moisture_limit_tenths` smallint NOT NULL,
	`revision` int NOT NULL,
	CONSTRAINT `shop_movement_shop_id` PRIMARY KEY(`shop_id`)
);
--> statement-breakpoint
CREATE TABLE `species` (
	`id` char(36) NOT NULL,
	`shop_id` char(36) NOT NULL,
	`name` varchar(80) NOT NULL,
	`also_called` json NOT NULL,
	`movement` json NOT NULL,
	`source` varchar(300) NOT NULL,
	CONSTRAINT `species_id` PRIMARY KEY(`id`),
	CONSTRAINT `species_shop_name` UNIQUE(`shop_id`,`name`)
);
--> statement-breakpoint
ALTER TABLE `job` ADD `climate` json;--> statement-breakpoint
ALTER TABLE `face_movement` ADD CONSTRAINT `face_movement_face_id_face_id_fk` FOREIGN KEY (`face_id`) REFERENCES `face`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `face_movement` ADD CONSTRAINT `face_movement_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `face_movement` ADD CONSTRAINT `face_movement_updated_by_user_id_fk` FOREIGN KEY (`updated_by`) REFERENCES `user`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `shop_movement` ADD CONSTRAINT `shop_movement_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `species` ADD CONSTRAINT `species_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `face_movement_shop` ON `face_movement` (`shop_id`);